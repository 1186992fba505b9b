import { Router, type Request } from "express";
import type { NotebookDocument } from "../../shared/notebook/document";
import { readNotebookFile, writeNotebookFile } from "../../shared/notebook/notebookFile";
import {
  createNotebookBody,
  type ImportNotebookResponse,
  importNotebookBody,
  notebookListQuery,
  renameNotebookBody,
  saveDraftBody,
  savedDocument,
} from "../../shared/schemas/notebooks";
import { createNotebook } from "../commands/createNotebook";
import { deleteNotebook } from "../commands/deleteNotebook";
import { renameNotebook } from "../commands/renameNotebook";
import { restoreFromBin } from "../commands/restoreFromBin";
import { saveDraft } from "../commands/saveDraft";
import type { Db } from "../db/client";
import { findGroup } from "../db/reads/findGroup";
import { listNotebooks } from "../db/reads/listNotebooks";
import { forbidden, invalid, notFound } from "../errors";
import type { Summaries } from "../jobs/summaries";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts, presentNotebook, presentNotebookListItem } from "../presenters/presentNotebook";
import { fileName } from "./fileName";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";

/** `/notebooks/…`: list, create, import, read, save, rename, export, delete and take back. */
export function notebookRoutes({ db, summaries }: { db: Db; summaries: Summaries }): Router {
  const router = Router();

  /** @throws AppError if the actor may not create notebooks in the group */
  const authoriseIn = async (groupId: string | null, actor: Actor): Promise<void> => {
    if (groupId === null) return;
    const group = await findGroup(db, groupId, actor.id);
    if (!group || !groupPolicy.see(actor, group)) throw notFound("group");
    if (!groupPolicy.createNotebook(actor, group)) throw forbidden("create notebooks in this group");
  };

  const create = async (actor: Actor, groupId: string | null, document: NotebookDocument) => {
    const { id } = await createNotebook(db, { ownerId: actor.id, groupId, document, at: new Date() });
    summaries.request(id);
    return presentFresh(id, actor);
  };

  const presentFresh = async (id: string, actor: Actor) =>
    presentNotebook(await loadNotebook(db, id, actor), actor);

  router.get("/notebooks", async (req, res) => {
    const actor = requireActor(req);
    const query = notebookListQuery.parse(req.query);
    const rows = await listNotebooks(db, actor.id, query);
    const rule = query.place === "bin" ? notebookPolicy.restoreFromBin : notebookPolicy.read;
    const visible = rows.filter((row) => rule(actor, notebookFacts(row)));
    res.json({ notebooks: visible.map((row) => presentNotebookListItem(row, actor)) });
  });

  router.post("/notebooks", async (req, res) => {
    const actor = requireActor(req);
    const { title, groupId, document } = createNotebookBody.parse(req.body);
    await authoriseIn(groupId, actor);
    res
      .status(201)
      .json(await create(actor, groupId, document ? { ...document, title } : emptyDocument(title)));
  });

  router.post("/notebooks/import", async (req, res) => {
    const actor = requireActor(req);
    const { text, groupId } = importNotebookBody.parse(req.body);
    await authoriseIn(groupId, actor);
    const { document, notes } = readImport(text);
    const imported: ImportNotebookResponse = { ...(await create(actor, groupId, document)), notes };
    res.status(201).json(imported);
  });

  router.get("/notebooks/:notebookId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    res.json(presentNotebook(notebook, actor));
  });

  router.patch("/notebooks/:notebookId", async (req, res) => {
    const actor = requireActor(req);
    const { title } = renameNotebookBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    if (!notebookPolicy.rename(actor, notebookFacts(notebook))) throw forbidden("rename this notebook");

    await renameNotebook(db, { notebookId: notebook.id, title, actorId: actor.id, at: new Date() });
    summaries.request(notebook.id);
    res.json(await presentFresh(notebook.id, actor));
  });

  router.put("/notebooks/:notebookId/draft", async (req, res) => {
    const actor = requireActor(req);
    const { revision, document } = saveDraftBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    if (!notebookPolicy.edit(actor, notebookFacts(notebook))) throw forbidden("change this notebook");

    const saved = await saveDraft(db, {
      notebookId: notebook.id,
      revision,
      document,
      actorId: actor.id,
      at: new Date(),
    });
    summaries.request(notebook.id);
    res.json(saved);
  });

  router.get("/notebooks/:notebookId/file", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    if (!notebookPolicy.export(actor, notebookFacts(notebook))) throw forbidden("export this notebook");

    res.attachment(fileName(notebook.title));
    res.type("text/markdown; charset=utf-8").send(writeNotebookFile(notebook.document));
  });

  router.delete("/notebooks/:notebookId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    if (!notebookPolicy.delete(actor, notebookFacts(notebook))) throw forbidden("delete this notebook");

    await deleteNotebook(db, { notebookId: notebook.id, at: new Date() });
    res.status(204).end();
  });

  router.post("/notebooks/:notebookId/restore-from-bin", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor, { orInBin: true });
    if (!notebookPolicy.restoreFromBin(actor, notebookFacts(notebook)))
      throw forbidden("take this notebook out of the bin: it is not there, or not yours");

    await restoreFromBin(db, { notebookId: notebook.id });
    summaries.request(notebook.id);
    res.json(await presentFresh(notebook.id, actor));
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");

const emptyDocument = (title: string): NotebookDocument => ({
  format: 1,
  title,
  unitSystem: "SI",
  headline: [],
  authors: [],
  cells: [],
});

/** @throws AppError naming each line of the file that stands in the way; nothing is half-imported */
function readImport(text: string) {
  const reading = readNotebookFile(text, () => crypto.randomUUID());
  if (reading.ok) return { document: savedDocument.parse(reading.document), notes: reading.notes };
  const issues = reading.notes
    .filter(({ level }) => level === "fault")
    .map(({ line, message, code }) => ({ path: `line ${line ?? 1}`, message, code }));
  const [first] = issues;
  throw invalid(
    `The file cannot be imported. ${first ? `${first.path}: ${first.message}` : ""}`.trim(),
    issues,
  );
}
