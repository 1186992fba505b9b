import { Router, type Request } from "express";
import type { Cell } from "../../shared/notebook/document";
import {
  beginThreadBody,
  commentBody,
  seenBody,
  setResolutionBody,
  threadListQuery,
} from "../../shared/schemas/comments";
import { beginThread } from "../commands/beginThread";
import { deleteComment, editComment } from "../commands/changeComment";
import { markSeen } from "../commands/markSeen";
import { replyInThread } from "../commands/replyInThread";
import { resolveThread } from "../commands/resolveThread";
import type { Db } from "../db/client";
import type { NotebookRow } from "../db/reads/findNotebook";
import { findThread, listThreads, type CommentRow, type ThreadRow } from "../db/reads/findThreads";
import { findVersion } from "../db/reads/findVersion";
import { archived, conflict, forbidden, notFound } from "../errors";
import type { Post } from "../jobs/post";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { mayResolve } from "../policies/threadPolicy";
import { notebookFacts } from "../presenters/presentNotebook";
import { presentThread } from "../presenters/presentThread";
import { authorise } from "./authorise";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";
import { asPerson, mentionsOf, readersAround, toldOf } from "./mentions";

interface Parts {
  db: Db;
  post: Post;
  /** Where links in letters lead. */
  linkOrigin: () => string;
}

const commentHere = "comment on this notebook";

/** `/notebooks/…/threads/…`: read, begin, reply, edit, delete, resolve; and who may be spoken to. */
export function threadRoutes({ db, post, linkOrigin }: Parts): Router {
  const router = Router();

  const loadThread = async (req: Request, notebook: NotebookRow, actor: Actor): Promise<ThreadRow> => {
    const threadId = readId(req, "threadId", "thread");
    const thread = await findThread(db, { notebookId: notebook.id, threadId, actorId: actor.id });
    if (!thread) throw notFound("thread");
    return thread;
  };

  const presentFresh = async (notebook: NotebookRow, threadId: string, actor: Actor) => {
    const thread = await findThread(db, { notebookId: notebook.id, threadId, actorId: actor.id });
    if (!thread) throw notFound("thread");
    return presentThread(thread, notebook, actor);
  };

  const cellOf = async (notebook: NotebookRow, version: number | null, cellId: string): Promise<Cell> => {
    const kept = version === null ? null : await findVersion(db, notebook.id, version);
    if (kept === undefined) throw notFound("version");
    const cell = (kept ?? notebook).document.cells.find(({ id }) => id === cellId);
    if (!cell) throw cellGone(version);
    return cell;
  };

  const hrefOf = (notebook: NotebookRow, version: number | null, threadId: string): string => {
    const place = version === null ? "" : `/versions/${version}`;
    return `${linkOrigin()}/notebooks/${notebook.id}${place}#thread-${threadId}`;
  };

  router.get("/notebooks/:notebookId/readers", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "seeShares", "see who else sees this notebook");
    const { readers } = await readersAround(db, notebook, actor);
    res.json(readers.map(asPerson));
  });

  router.get("/notebooks/:notebookId/threads", async (req, res) => {
    const actor = requireActor(req);
    const { version = null } = threadListQuery.parse(req.query);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const threads = await listThreads(db, { notebookId: notebook.id, version, actorId: actor.id });
    res.json(threads.map((thread) => presentThread(thread, notebook, actor)));
  });

  router.post("/notebooks/:notebookId/threads", async (req, res) => {
    const actor = requireActor(req);
    const { cellId, version, text } = beginThreadBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "comment", commentHere);

    const cell = await cellOf(notebook, version, cellId);
    const people = await readersAround(db, notebook, actor);
    const mentioned = mentionsOf(text, people);
    const threadId = crypto.randomUUID();
    const told = toldOf({
      mentioned,
      writers: new Set(),
      readers: people.readers,
      actor,
      title: notebook.title,
      cell: cellWords(cell),
      text,
      href: hrefOf(notebook, version, threadId),
    });
    await beginThread(db, {
      threadId,
      notebookId: notebook.id,
      version,
      cell,
      text,
      mentions: mentioned.map(asPerson),
      told,
      actorId: actor.id,
      at: new Date(),
    });
    post.request();
    res.status(201).json(await presentFresh(notebook, threadId, actor));
  });

  router.post("/notebooks/:notebookId/threads/:threadId/comments", async (req, res) => {
    const actor = requireActor(req);
    const { text } = commentBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const thread = await loadThread(req, notebook, actor);
    authorise(actor, notebook, "comment", commentHere);

    const people = await readersAround(db, notebook, actor);
    const mentioned = mentionsOf(text, people);
    const told = toldOf({
      mentioned,
      writers: new Set(thread.comments.map(({ authorId }) => authorId)),
      readers: people.readers,
      actor,
      title: notebook.title,
      cell: cellWords({ kind: thread.cellKind, name: thread.cellName }),
      text,
      href: hrefOf(notebook, thread.version, thread.id),
    });
    await replyInThread(db, {
      notebookId: notebook.id,
      threadId: thread.id,
      text,
      mentions: mentioned.map(asPerson),
      told,
      actorId: actor.id,
      at: new Date(),
    });
    post.request();
    res.status(201).json(await presentFresh(notebook, thread.id, actor));
  });

  router.patch("/notebooks/:notebookId/threads/:threadId/comments/:commentId", async (req, res) => {
    const actor = requireActor(req);
    const { text } = commentBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const thread = await loadThread(req, notebook, actor);
    const comment = commentOf(req, thread);
    authorise(actor, notebook, "comment", commentHere);
    if (comment.authorId !== actor.id) throw forbidden("change what someone else has written");

    const people = await readersAround(db, notebook, actor);
    const mentioned = mentionsOf(text, people);
    // Who was spoken to before has been told already.
    const before = new Set(comment.mentions.map(({ id }) => id));
    const told = toldOf({
      mentioned: mentioned.filter(({ id }) => !before.has(id)),
      writers: new Set(),
      readers: people.readers,
      actor,
      title: notebook.title,
      cell: cellWords({ kind: thread.cellKind, name: thread.cellName }),
      text,
      href: hrefOf(notebook, thread.version, thread.id),
    });
    await editComment(db, {
      notebookId: notebook.id,
      threadId: thread.id,
      commentId: comment.id,
      text,
      mentions: mentioned.map(asPerson),
      told,
      at: new Date(),
    });
    post.request();
    res.json(await presentFresh(notebook, thread.id, actor));
  });

  router.delete("/notebooks/:notebookId/threads/:threadId/comments/:commentId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const thread = await loadThread(req, notebook, actor);
    const comment = commentOf(req, thread);
    authorise(actor, notebook, "comment", commentHere);
    if (comment.authorId !== actor.id) throw forbidden("delete what someone else has written");

    await deleteComment(db, {
      notebookId: notebook.id,
      threadId: thread.id,
      commentId: comment.id,
      at: new Date(),
    });
    res.status(204).end();
  });

  router.put("/notebooks/:notebookId/threads/:threadId/resolution", async (req, res) => {
    const actor = requireActor(req);
    const { isResolved } = setResolutionBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const thread = await loadThread(req, notebook, actor);
    const facts = notebookFacts(notebook);
    const begun = { begunBy: thread.createdBy };
    if (!mayResolve(actor, facts, begun)) {
      if (mayResolve(actor, { ...facts, isArchived: false }, begun)) throw archived();
      throw forbidden("resolve this thread: who began it may, and whoever may edit the notebook");
    }

    const resolution = { notebookId: notebook.id, threadId: thread.id, isResolved };
    await resolveThread(db, { ...resolution, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(notebook, thread.id, actor));
  });

  router.put("/notebooks/:notebookId/threads/:threadId/seen", async (req, res) => {
    const actor = requireActor(req);
    const { commentId } = seenBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const thread = await loadThread(req, notebook, actor);
    const last = thread.comments.find(({ id }) => id === commentId);
    if (!last) throw notFound("comment");
    await markSeen(db, { threadId: thread.id, userId: actor.id, until: last.createdAt, at: new Date() });
    res.status(204).end();
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");

function commentOf(req: Request, thread: ThreadRow): CommentRow {
  const id = readId(req, "commentId", "comment");
  const comment = thread.comments.find((row) => row.id === id && row.deletedAt === null);
  if (!comment) throw notFound("comment");
  return comment;
}

const cellWords = ({ kind, name }: { kind: string; name: string }): string =>
  name === "" ? `a ${kind} cell` : `${kind} ${name}`;

const cellGone = (version: number | null) =>
  conflict(
    "cell_gone",
    version === null
      ? "This cell is not in the draft as it is saved. It may have been removed, or not be saved yet."
      : "This version has no such cell. Load the page again.",
  );
