import { readFile } from "node:fs/promises";
import path from "node:path";
import { inArray } from "drizzle-orm";
import type { NotebookDocument } from "../../shared/notebook/document";
import { readNotebookFile } from "../../shared/notebook/notebookFile";
import type { KeptResult } from "../../shared/schemas/results";
import { demoAccounts } from "../auth/demoAccounts";
import { mentionedIn } from "../../shared/schemas/mentions";
import { addMember } from "../commands/addMember";
import { beginThread } from "../commands/beginThread";
import { createAccount } from "../commands/createAccount";
import { createGroup } from "../commands/createGroup";
import { createNotebook } from "../commands/createNotebook";
import { keepVersion } from "../commands/keepVersion";
import { replyInThread } from "../commands/replyInThread";
import { resolveThread } from "../commands/resolveThread";
import { saveDraft } from "../commands/saveDraft";
import { sendInvitation } from "../commands/sendInvitation";
import { shareWithGroup } from "../commands/shareWithGroup";
import { shareWithPerson } from "../commands/shareWithPerson";
import type { Db } from "../db/client";
import { users } from "../db/tables/users";
import type { Evaluator } from "../jobs/evaluator";
import { newInvitationToken } from "../mail/invitationToken";
import { groupInvitation } from "../mail/templates/groupInvitation";
import { places } from "../places";
import type { DemoThread } from "./demoThreads";
import { demoGroup, demoInvitation, demoNotebooks, type DemoNotebook, type DemoPerson } from "./demoNotebooks";

const day = 86_400_000;

interface PreparedState {
  document: NotebookDocument;
  kept: { message: string; result: KeptResult } | null;
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
    for (const { notebook, states } of histories) {
      await seedNotebook(tx, { notebook, states, groupId, idOf, now });
    }
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
    const { result } = answer.outcome;
    states.push({ document, kept: { message, result }, by, at: new Date(now.getTime() - daysAgo * day) });
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
    now: Date;
  },
): Promise<void> {
  const { notebook, states, groupId, idOf, now } = parts;
  const [first] = states;
  const { document, at } = first!;
  const { id: notebookId } = await createNotebook(tx, { ownerId: idOf(notebook.owner), groupId, document, at });
  let revision = 1;
  for (const state of states) {
    const actorId = idOf(state.by);
    ({ revision } = await saveDraft(tx, { notebookId, revision, document: state.document, actorId, at: state.at }));
    if (state.kept) await keepVersion(tx, { notebookId, revision, ...state.kept, actorId, at: state.at });
  }
  const share = { notebookId, letter: null, actorId: idOf(notebook.owner), at };
  await shareWithGroup(tx, { ...share, role: notebook.groupRole });
  for (const [person, role] of notebook.shares) {
    await shareWithPerson(tx, { ...share, user: { id: idOf(person), name: nameOf(person) }, role });
  }
  for (const thread of notebook.threads ?? []) {
    await seedThread(tx, { thread, notebookId, document: states.at(-1)!.document, idOf, now });
  }
}

/** A thread as its writers would have written it, with notices and without letters. */
async function seedThread(
  tx: Db,
  parts: {
    thread: DemoThread;
    notebookId: string;
    document: NotebookDocument;
    idOf: (person: DemoPerson) => string;
    now: Date;
  },
): Promise<void> {
  const { thread, notebookId, document, idOf, now } = parts;
  const cell = document.cells.find(({ name }) => name === thread.cell);
  if (!cell) throw new Error(`No cell of the demonstration is called ${thread.cell}`);
  const people = demoPeople(idOf);
  const threadId = crypto.randomUUID();
  const before = new Set<string>();
  let last = now;
  for (const [index, { by, hoursAgo, text }] of thread.comments.entries()) {
    const actorId = idOf(by);
    last = new Date(now.getTime() - (hoursAgo * day) / 24);
    const mentions = mentionedIn(text, people);
    const told = [
      ...mentions.map(({ id }) => ({ userId: id, kind: "mention" as const, letter: null })),
      ...people
        .filter(({ id }) => before.has(id) && !mentions.some((one) => one.id === id))
        .map(({ id }) => ({ userId: id, kind: "reply" as const, letter: null })),
    ].filter(({ userId }) => userId !== actorId);
    const comment = { threadId, notebookId, text, mentions, told, actorId, at: last };
    if (index === 0) await beginThread(tx, { ...comment, version: null, cell });
    else await replyInThread(tx, comment);
    before.add(actorId);
  }
  if (thread.resolvedBy === undefined) return;
  const actorId = idOf(thread.resolvedBy);
  await resolveThread(tx, { notebookId, threadId, isResolved: true, actorId, at: last });
}

const demoPeople = (idOf: (person: DemoPerson) => string) =>
  demoAccounts.map(({ email, name }) => ({ id: idOf(email.split("@")[0] as DemoPerson), name }));

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
