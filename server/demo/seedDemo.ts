import { readFile } from "node:fs/promises";
import path from "node:path";
import { inArray } from "drizzle-orm";
import type { NotebookDocument } from "../../shared/notebook/document";
import { readNotebookFile } from "../../shared/notebook/notebookFile";
import { openLicences } from "../../shared/schemas/licences";
import { demoAccounts } from "../auth/demoAccounts";
import { answeredCautions } from "../../shared/notebook/cautionAnswers";
import { addMember } from "../commands/addMember";
import { createAccount } from "../commands/createAccount";
import { acceptAnswers, approveVetting } from "../commands/decideVetting";
import { createGroup } from "../commands/createGroup";
import { createNotebook } from "../commands/createNotebook";
import { keepVersion } from "../commands/keepVersion";
import { requestVetting } from "../commands/requestVetting";
import { saveDraft } from "../commands/saveDraft";
import { sendInvitation } from "../commands/sendInvitation";
import { shareWithGroup } from "../commands/shareWithGroup";
import { shareWithPerson } from "../commands/shareWithPerson";
import type { Db } from "../db/client";
import { users } from "../db/tables/users";
import { findVersion } from "../db/reads/findVersion";
import type { EvaluationOutcome, Evaluator } from "../jobs/evaluator";
import { newInvitationToken } from "../mail/invitationToken";
import { groupInvitation } from "../mail/templates/groupInvitation";
import { places } from "../places";
import { examine } from "../vetting/examine";
import { compareToTheBit } from "../vetting/recompute";
import {
  demoGroup,
  demoInvitation,
  demoNotebooks,
  type DemoNotebook,
  type DemoPerson,
  type DemoVetting,
} from "./demoNotebooks";

const day = 86_400_000;

interface PreparedState {
  document: NotebookDocument;
  kept: { message: string; outcome: EvaluationOutcome } | null;
  by: DemoPerson;
  at: Date;
}

/**
 * Puts the demonstration in place, all or nothing: an invented group, its people, their notebooks with kept
 * versions. Acts for the people it invents. Answers false, and changes nothing, where any of them is there already.
 */
export async function seedDemo(
  db: Db,
  { evaluator, now, linkOrigin }: { evaluator: Evaluator; now: Date; linkOrigin: string },
): Promise<boolean> {
  const addresses = demoAccounts.map(({ email }) => email);
  const present = await db.select({ id: users.id }).from(users).where(inArray(users.email, addresses));
  if (present.length > 0) return false;

  const histories = await Promise.all(
    demoNotebooks.map(async (notebook) => ({ notebook, states: await prepare(notebook, evaluator, now) })),
  );
  await db.transaction(async (tx) => {
    const { groupId, idOf } = await seedPeople(tx, now);
    const put: PutVetting[] = [];
    for (const { notebook, states } of histories) {
      const notebookId = await seedNotebook(tx, { notebook, states, groupId, idOf });
      const kept = states.flatMap((state) => state.kept ?? []);
      for (const vetting of notebook.vettings ?? [])
        put.push({ vetting, notebookId, notebook, outcome: kept[vetting.version - 1]!.outcome });
    }
    const oldestFirst = put.toSorted((one, other) => other.vetting.daysAgo - one.vetting.daysAgo);
    for (const one of oldestFirst) await seedVetting(tx, one, { groupId, idOf, now });
    await seedInvitation(tx, { groupId, actorId: idOf(demoGroup.lead), now, linkOrigin });
  });
  return true;
}

/** The states that a notebook went through, oldest first, with the results of those that were kept. */
async function prepare(notebook: DemoNotebook, evaluator: Evaluator, now: Date): Promise<PreparedState[]> {
  const text = await readFile(path.join(places.demoNotebooks, notebook.file), "utf8");
  const final = readDocument(notebook.file, text);
  const states: PreparedState[] = [];
  for (const { message, by, daysAgo, differences } of notebook.versions) {
    const document = asItWas(final, notebook.file, differences);
    const answer = await evaluator.evaluate(document);
    if (!answer.ok) throw new Error(`${notebook.file} could not be evaluated: ${answer.reason}`);
    const { outcome } = answer;
    states.push({ document, kept: { message, outcome }, by, at: new Date(now.getTime() - daysAgo * day) });
  }
  const savedAt = new Date(now.getTime() - (notebook.hoursAgo * day) / 24);
  return [...states, { document: final, kept: null, by: notebook.owner, at: savedAt }];
}

function readDocument(file: string, text: string): NotebookDocument {
  const reading = readNotebookFile(text, () => crypto.randomUUID());
  if (reading.ok) return reading.document;
  throw new Error(`${file}: ${reading.notes.map(({ line, message }) => `line ${line}: ${message}`).join(" ")}`);
}

/** A document before its later changes; its cells keep their ids. */
function asItWas(final: NotebookDocument, file: string, differences: [string, string][]): NotebookDocument {
  const cells = final.cells.map((cell) => ({ ...cell }));
  for (const [now, then] of differences) {
    const cell = cells.find(({ text }) => text.includes(now));
    if (!cell) throw new Error(`${file}: no cell says ${JSON.stringify(now)}`);
    cell.text = cell.text.replace(now, () => then);
  }
  return { ...final, cells };
}

async function seedPeople(tx: Db, now: Date) {
  const at = new Date(now.getTime() - demoGroup.daysAgo * day);
  const ids = new Map<string, string>();
  for (const { name, email } of demoAccounts) {
    const { id } = await createAccount(tx, { name, email, passwordHash: null, at });
    ids.set(email, id);
  }
  const addressOf = (person: DemoPerson): string => `${person}@carrow.example`;
  const idOf = (person: DemoPerson): string => ids.get(addressOf(person))!;
  const { name, code, lead, members } = demoGroup;
  const { id: groupId } = await createGroup(tx, { name, code, founderId: idOf(lead), at });
  for (const [person, role] of members) await addMember(tx, { groupId, userId: idOf(person), role, at });
  return { groupId, idOf };
}

async function seedNotebook(
  tx: Db,
  parts: {
    notebook: DemoNotebook;
    states: PreparedState[];
    groupId: string;
    idOf: (person: DemoPerson) => string;
  },
): Promise<string> {
  const { notebook, states, groupId, idOf } = parts;
  const [first] = states;
  const { document, at } = first!;
  const { id: notebookId } = await createNotebook(tx, { ownerId: idOf(notebook.owner), groupId, document, at });
  let revision = 1;
  for (const state of states) {
    const actorId = idOf(state.by);
    ({ revision } = await saveDraft(tx, { notebookId, revision, document: state.document, actorId, at: state.at }));
    if (!state.kept) continue;
    const { message, outcome } = state.kept;
    await keepVersion(tx, { notebookId, revision, message, result: outcome.result, actorId, at: state.at });
  }
  const share = { notebookId, letter: null, actorId: idOf(notebook.owner), at };
  await shareWithGroup(tx, { ...share, role: notebook.groupRole });
  for (const [person, role] of notebook.shares) {
    await shareWithPerson(tx, { ...share, user: { id: idOf(person), name: nameOf(person) }, role });
  }
  return notebookId;
}

interface PutVetting {
  vetting: DemoVetting;
  notebookId: string;
  notebook: DemoNotebook;
  /** Of the version. */
  outcome: EvaluationOutcome;
}

/** A version put before the lead; where it was approved, with its answers accepted and its reference published. */
async function seedVetting(
  tx: Db,
  { vetting, notebookId, notebook, outcome }: PutVetting,
  { groupId, idOf, now }: { groupId: string; idOf: (person: DemoPerson) => string; now: Date },
): Promise<void> {
  const { version: versionNumber, by, message, summary, authors, editionOf, approvedDaysAgo, isPublic } = vetting;
  const recomputed = compareToTheBit(outcome.result, { ok: true, outcome });
  const at = new Date(now.getTime() - vetting.daysAgo * day);
  const body = { message, summary, authors, licence: openLicences[0], editionOf };
  const { id: vettingId } = await requestVetting(tx, {
    ...body,
    notebookId,
    versionNumber,
    recomputed,
    letters: [],
    actorId: idOf(by),
    at,
  });
  if (approvedDaysAgo === null) return;
  const version = (await findVersion(tx, notebookId, versionNumber))!;
  const actorId = idOf(demoGroup.lead);
  const decision = { vettingId, groupId, actorId, at: new Date(now.getTime() - approvedDaysAgo * day) };
  const accepted = answeredCautions(version.document, version.result.cells).map(({ key }) => key);
  await acceptAnswers(tx, { ...decision, accepted });
  const checks = examine({
    version,
    recomputed,
    accepted,
    openThreads: 0,
    isOwnersAlone: false,
    groupLeads: 1,
    ownerId: idOf(notebook.owner),
    ownerName: nameOf(notebook.owner),
    leadId: actorId,
  });
  const failing = checks.find(({ verdict }) => verdict !== "holds");
  if (failing) throw new Error(`${notebook.file} is published, but: ${failing.reason}`);
  const { bodies } = outcome;
  await approveVetting(tx, { ...decision, checks, accepted, bodies, isPublic, doi: null, letters: () => [] });
}

const nameOf = (person: DemoPerson): string =>
  demoAccounts.find(({ email }) => email.startsWith(`${person}@`))!.name;

/** Someone who has not answered yet. */
async function seedInvitation(
  tx: Db,
  parts: { groupId: string; actorId: string; now: Date; linkOrigin: string },
): Promise<void> {
  const { groupId, actorId, now, linkOrigin } = parts;
  const { email, role, daysAgo } = demoInvitation;
  const { token, tokenHash } = newInvitationToken();
  const letter = groupInvitation(
    { address: email, userId: null },
    { group: demoGroup.name, role, invitedBy: nameOf(demoGroup.lead), href: `${linkOrigin}/invitation#${token}` },
  );
  const at = new Date(now.getTime() - daysAgo * day);
  await sendInvitation(tx, { to: { groupId, role }, email, tokenHash, letter, actorId, at });
}
