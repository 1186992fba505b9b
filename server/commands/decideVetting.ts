import { and, eq, isNull, max } from "drizzle-orm";
import { pinOf } from "../../shared/notebook/language/readPin";
import { pinsOf, type SuppliedReference } from "../../shared/notebook/references";
import type { VettingCheck } from "../../shared/schemas/vettings";
import type { Db } from "../db/client";
import { findVersion } from "../db/reads/findVersion";
import { findVettingFacts } from "../db/reads/findVetting";
import { groups } from "../db/tables/groups";
import { notebooks } from "../db/tables/notebooks";
import { publishedReferences } from "../db/tables/publishedReferences";
import { users } from "../db/tables/users";
import { vettings } from "../db/tables/vettings";
import { conflict, notFound } from "../errors";
import { lockGroup } from "./lockGroup";
import { postLetter, type Letter } from "./postLetter";
import { recordAct, type Act } from "./recordAct";
import { refuseCircle } from "./requestVetting";

interface Decision {
  vettingId: string;
  groupId: string;
  actorId: string;
  at: Date;
}

/** Sends a version back to whoever asked, with what is asked for. */
export async function returnVetting(
  db: Db,
  { remarks, letters, ...decision }: Decision & { remarks: string; letters: readonly Letter[] },
): Promise<void> {
  const { vettingId, actorId, at } = decision;
  await db.transaction(async (tx) => {
    const { vetting, line } = await lockOpen(tx, decision);
    await tx
      .update(vettings)
      .set({ state: "returned", remarks, decidedBy: actorId, decidedAt: at })
      .where(eq(vettings.id, vettingId));
    for (const letter of letters) await postLetter(tx, letter, at);
    await recordAct(tx, { ...line, groupId: vetting.groupId, act: "vetting_returned" });
  });
}

/** Sets which answers to cautions the lead accepts. */
export async function acceptAnswers(
  db: Db,
  { accepted, ...decision }: Decision & { accepted: readonly string[] },
): Promise<void> {
  await db.transaction(async (tx) => {
    await lockOpen(tx, decision);
    await tx
      .update(vettings)
      .set({ accepted: [...accepted] })
      .where(eq(vettings.id, decision.vettingId));
  });
}

/**
 * Approves a version and publishes it, in one transaction: as the next number of the group, or as the next edition.
 * The version is published, whatever the draft has become. What it was published from stays.
 *
 * @throws AppError if another lead has decided meanwhile, or it has become the lead's own work alone
 */
export async function approveVetting(
  db: Db,
  approval: Decision & {
    checks: VettingCheck[];
    /** Answers accepted when the checks were made. */
    accepted: readonly string[];
    bodies: SuppliedReference["bodies"];
    isPublic: boolean;
    doi: string | null;
    letters: (pin: string) => readonly Letter[];
  },
): Promise<{ pin: string }> {
  const { vettingId, groupId, checks, accepted, bodies, isPublic, doi, letters, actorId, at } = approval;
  return db.transaction(async (tx) => {
    const { vetting, ownerId, line } = await lockOpen(tx, approval);
    if (JSON.stringify(vetting.accepted) !== JSON.stringify(accepted))
      throw conflict("checks_moved", "Which answers are accepted has changed meanwhile. Look at the checks again.");
    const { isOwnersAlone, groupLeads } = await findVettingFacts(tx, vetting.notebookId, groupId);
    const isOwn = isOwnersAlone && ownerId === actorId;
    if (isOwn && groupLeads > 1)
      throw conflict("own_alone", "It is your own work alone. Ask another lead of the group to vet it.");

    const version = await findVersion(tx, vetting.notebookId, vetting.versionNumber);
    const restsOn = pinsOf(version!.document);
    if (vetting.editionOf !== null) await refuseCircle(tx, { groupId, number: vetting.editionOf, pins: restsOn });
    const { number, edition } = await nextPlace(tx, groupId, vetting.editionOf);
    const [group] = await tx.select({ code: groups.code }).from(groups).where(eq(groups.id, groupId));
    const pin = pinOf({ code: group!.code, number, edition });
    const { document, result, engine, contentHash } = version!;
    const { notebookId, versionNumber, summary, authors, licence } = vetting;
    await tx.insert(publishedReferences).values({
      groupId,
      number,
      edition,
      notebookId,
      versionNumber,
      title: document.title,
      summary,
      authors,
      licence,
      document,
      result,
      bodies,
      restsOn,
      engine,
      contentHash,
      checks,
      publishedAt: at,
      publishedBy: actorId,
      isVettedByOwner: isOwn,
      isPublic,
      doi,
    });
    await tx
      .update(vettings)
      .set({ state: "approved", decidedBy: actorId, decidedAt: at, checks })
      .where(eq(vettings.id, vettingId));
    await tx.update(notebooks).set({ isReferenced: true }).where(eq(notebooks.id, notebookId));
    for (const letter of letters(pin)) await postLetter(tx, letter, at);
    await recordAct(tx, { ...line, groupId, act: "vetting_approved", details: { with: pin } });
    return { pin };
  });
}

/** Under the lock on the group, which makes the numbers follow one another without gaps. */
async function nextPlace(tx: Db, groupId: string, editionOf: number | null) {
  if (editionOf === null) {
    const [last] = await tx
      .select({ number: max(publishedReferences.number) })
      .from(publishedReferences)
      .where(eq(publishedReferences.groupId, groupId));
    return { number: (last?.number ?? 0) + 1, edition: 1 };
  }
  const [last] = await tx
    .select({ edition: max(publishedReferences.edition) })
    .from(publishedReferences)
    .where(and(eq(publishedReferences.groupId, groupId), eq(publishedReferences.number, editionOf)));
  return { number: editionOf, edition: (last?.edition ?? 0) + 1 };
}

/** An open request, with group and row locked: of two leads at once, the second is told who was first. */
async function lockOpen(tx: Db, { vettingId, groupId, actorId, at }: Decision) {
  await lockGroup(tx, { groupId, actorId });
  const [vetting] = await tx.select().from(vettings).where(eq(vettings.id, vettingId)).for("update");
  if (!vetting) throw notFound("request");
  await refuseDecided(tx, vetting);
  const [notebook] = await tx
    .select({ title: notebooks.title, ownerId: notebooks.ownerId, groupId: notebooks.groupId })
    .from(notebooks)
    .where(and(eq(notebooks.id, vetting.notebookId), isNull(notebooks.deletedAt)))
    .for("update");
  if (!notebook || notebook.groupId !== groupId)
    throw conflict("left_group", "The notebook has left the group or was deleted meanwhile.");
  const line: Omit<Act, "groupId" | "act"> = {
    at,
    actorId,
    subject: "notebook",
    subjectId: vetting.notebookId,
    subjectName: notebook.title,
  };
  return { vetting, ownerId: notebook.ownerId, line };
}

async function refuseDecided(tx: Db, { state, decidedBy }: typeof vettings.$inferSelect): Promise<void> {
  if (state === "requested") return;
  if (state === "taken_back" || decidedBy === null)
    throw conflict("vetting_over", "The request was taken back meanwhile.");
  const [by] = await tx.select({ name: users.name }).from(users).where(eq(users.id, decidedBy));
  const did = state === "approved" ? "approved and published it" : "returned it with remarks";
  throw conflict("vetting_over", `${by!.name} ${did} already.`);
}

/** Takes a request back before it is decided. */
export async function takeBackVetting(
  db: Db,
  { vettingId, actorId, at }: Pick<Decision, "vettingId" | "actorId" | "at">,
): Promise<void> {
  await db.transaction(async (tx) => {
    const [vetting] = await tx.select().from(vettings).where(eq(vettings.id, vettingId)).for("update");
    if (!vetting) throw notFound("request");
    await refuseDecided(tx, vetting);
    await tx
      .update(vettings)
      .set({ state: "taken_back", decidedBy: actorId, decidedAt: at })
      .where(eq(vettings.id, vettingId));
    const [notebook] = await tx
      .select({ title: notebooks.title })
      .from(notebooks)
      .where(eq(notebooks.id, vetting.notebookId));
    await recordAct(tx, {
      at,
      groupId: vetting.groupId,
      actorId,
      act: "vetting_taken_back",
      subject: "notebook",
      subjectId: vetting.notebookId,
      subjectName: notebook!.title,
    });
  });
}
