import { and, eq, isNull } from "drizzle-orm";
import type { Recomputation, RequestVettingBody } from "../../shared/schemas/vettings";
import { pinsOf } from "../../shared/notebook/references";
import { pinOf, partsOfPin } from "../../shared/notebook/language/readPin";
import type { Db } from "../db/client";
import { allRestedOn } from "../db/reads/findReference";
import { findVersion } from "../db/reads/findVersion";
import { groups } from "../db/tables/groups";
import { notebooks } from "../db/tables/notebooks";
import { publishedReferences } from "../db/tables/publishedReferences";
import { vettings } from "../db/tables/vettings";
import { archived, conflict, invalid, notFound } from "../errors";
import { postLetter, type Letter } from "./postLetter";
import { recordAct } from "./recordAct";

/**
 * Puts a version before the leads of its group, and tells them by letter.
 *
 * @throws AppError if the notebook is in no group, has a request already, or what it would become is not possible
 */
export async function requestVetting(
  db: Db,
  request: RequestVettingBody & {
    notebookId: string;
    versionNumber: number;
    recomputed: Recomputation;
    letters: readonly Letter[];
    actorId: string;
    at: Date;
  },
): Promise<{ id: string }> {
  const { notebookId, versionNumber, message, summary, authors, licence, editionOf, recomputed, letters, actorId, at } =
    request;
  return db.transaction(async (tx) => {
    const [notebook] = await tx
      .select({ groupId: notebooks.groupId, title: notebooks.title, archivedAt: notebooks.archivedAt })
      .from(notebooks)
      .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
      .for("update");
    if (!notebook) throw notFound("notebook");
    if (notebook.archivedAt !== null) throw archived();
    if (notebook.groupId === null) throw ownShelf();
    const { groupId } = notebook;
    const version = await findVersion(tx, notebookId, versionNumber);
    if (!version) throw notFound("version");
    if (editionOf !== null) {
      await requireNumber(tx, groupId, editionOf);
      await refuseCircle(tx, { groupId, number: editionOf, pins: pinsOf(version.document) });
    }
    const added = await tx
      .insert(vettings)
      .values({
        groupId,
        notebookId,
        versionNumber,
        message,
        summary,
        authors,
        licence,
        editionOf,
        recomputed,
        accepted: [],
        requestedBy: actorId,
        requestedAt: at,
      })
      .onConflictDoNothing()
      .returning({ id: vettings.id });
    const [created] = added;
    if (!created)
      throw conflict("in_vetting", "A version of this notebook is in vetting. Take that request back first.");
    for (const letter of letters) await postLetter(tx, letter, at);
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "vetting_requested",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: notebook.title,
    });
    return created;
  });
}

export const ownShelf = () =>
  conflict("no_group", "This notebook is on its owner’s own shelf. Move it to a group, whose lead can vet it.");

async function requireNumber(tx: Db, groupId: string, number: number): Promise<void> {
  const [known] = await tx
    .select({ id: publishedReferences.id })
    .from(publishedReferences)
    .where(and(eq(publishedReferences.groupId, groupId), eq(publishedReferences.number, number)))
    .limit(1);
  if (known) return;
  const message = `The group has no reference ${number}. Choose one of its references, or none for a new one.`;
  throw invalid(message, [{ path: "editionOf", message, code: "unknown_reference" }]);
}

/**
 * A reference that rests on itself, if only through others and in an earlier edition, would have numbers that vet
 * themselves.
 *
 * @throws AppError if one of the pins leads back to the reference
 */
export async function refuseCircle(
  tx: Db,
  { groupId, number, pins }: { groupId: string; number: number; pins: readonly string[] },
): Promise<void> {
  const [group] = await tx.select({ code: groups.code }).from(groups).where(eq(groups.id, groupId));
  const code = group!.code;
  const circle = (await allRestedOn(tx, pins)).find((pin) => {
    const parts = partsOfPin(pin);
    return parts?.code === code && parts.number === number;
  });
  if (circle === undefined) return;
  const next = pinOf({ code, number, edition: partsOfPin(circle)!.edition });
  throw conflict(
    "rests_on_itself",
    `It would rest on itself: what it uses leads back to ${next}. Take that out, or publish it as a new reference.`,
  );
}
