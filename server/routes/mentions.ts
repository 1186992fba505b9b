/** Whom a comment speaks to, and who is told of it. */
import { mentionedIn } from "../../shared/schemas/mentions";
import type { Person } from "../../shared/schemas/people";
import type { CommentNotice } from "../commands/tellOfComment";
import type { Db } from "../db/client";
import type { NotebookRow } from "../db/reads/findNotebook";
import { listPeopleAround, type PersonAroundRow } from "../db/reads/listPeopleAround";
import { invalid } from "../errors";
import { commentLetter } from "../mail/templates/commentLetter";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";

/** People around a notebook, parted by whether they may see it. */
export async function readersAround(db: Db, notebook: NotebookRow, actor: Actor) {
  const around = await listPeopleAround(db, {
    notebookId: notebook.id,
    groupId: notebook.groupId,
    actorId: actor.id,
  });
  const maySee = (row: PersonAroundRow) =>
    notebookPolicy.read(row, {
      ...notebookFacts(notebook),
      shareRole: row.shareRole,
      actorGroupRole: row.actorGroupRole,
    });
  return { readers: around.filter(maySee), others: around.filter((row) => !maySee(row)) };
}

type Reader = PersonAroundRow;

/**
 * The readers whom a text speaks to.
 *
 * @throws AppError if it speaks to someone who may not see the notebook, and so would never read it
 */
export function mentionsOf(text: string, people: { readers: Reader[]; others: Reader[] }): Reader[] {
  const mentioned = mentionedIn(text, people.readers);
  const names = new Set(mentioned.map(({ name }) => name.toLowerCase()));
  const unseeing = mentionedIn(text, people.others).find(({ name }) => !names.has(name.toLowerCase()));
  if (unseeing) {
    const message = `${unseeing.name} may not see this notebook and would not read this. Share it with them first, or write the name without @.`;
    throw invalid(message, [{ path: "text", message, code: "mention_unseen" }], "mention_unseen");
  }
  return mentioned;
}

export const asPerson = ({ id, name }: Person): Person => ({ id, name });

/** Those to be told: the mentioned of a mention; of a reply, those who wrote in the thread before. Never the writer. */
export function toldOf(comment: {
  mentioned: readonly Reader[];
  /** Who wrote in the thread; who may not see the notebook any longer is not among the readers and is not told. */
  writers: ReadonlySet<string>;
  readers: readonly Reader[];
  actor: Actor;
  title: string;
  cell: string;
  text: string;
  href: string;
}): CommentNotice[] {
  const { mentioned, writers, readers, actor, title, cell, text, href } = comment;
  const tell =
    (kind: "mention" | "reply") =>
    (reader: Reader): CommentNotice => ({
      userId: reader.id,
      kind,
      letter: commentLetter(
        { address: reader.email, userId: reader.id },
        { kind, title, cell, text, writtenBy: actor.name, href },
      ),
    });
  const others = readers.filter(({ id }) => id !== actor.id);
  const isMentioned = new Set(mentioned.map(({ id }) => id));
  return [
    ...others.filter(({ id }) => isMentioned.has(id)).map(tell("mention")),
    ...others.filter(({ id }) => !isMentioned.has(id) && writers.has(id)).map(tell("reply")),
  ];
}
