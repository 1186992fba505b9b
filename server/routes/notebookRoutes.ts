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
import { renameNotebook } from "../commands/renameNotebook";
import { saveDraft } from "../commands/saveDraft";
import type { Db } from "../db/client";
import { listNotebooks } from "../db/reads/listNotebooks";
import { invalid } from "../errors";
import type { Summaries } from "../jobs/summaries";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts, presentNotebook, presentNotebookListItem } from "../presenters/presentNotebook";
import { authorise, authoriseIn } from "./authorise";
import { fileName } from "./fileName";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";

/** `/notebooks/…`: list, create, import, read, save, rename, export. */
export function notebookRoutes({ db, summaries }: { db: Db; summaries: Summaries }): Router {
  const router = Router();

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
    await authoriseIn(db, groupId, actor);
    res
      .status(201)
      .json(await create(actor, groupId, document ? { ...document, title } : emptyDocument(title)));
  });

  router.post("/notebooks/import", async (req, res) => {
    const actor = requireActor(req);
    const { text, groupId } = importNotebookBody.parse(req.body);
    await authoriseIn(db, groupId, actor);
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
    authorise(actor, notebook, "rename", "rename this notebook");

    await renameNotebook(db, { notebookId: notebook.id, title, actorId: actor.id, at: new Date() });
    summaries.request(notebook.id);
    res.json(await presentFresh(notebook.id, actor));
  });

  router.put("/notebooks/:notebookId/draft", async (req, res) => {
    const actor = requireActor(req);
    const { revision, document } = saveDraftBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "edit", "change this notebook");

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
    authorise(actor, notebook, "export", "export this notebook");

    res.attachment(fileName(notebook.title));
    res.type("text/markdown; charset=utf-8").send(writeNotebookFile(notebook.document));
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
