import { Router, type Request } from "express";
import { keepVersionBody, restoreVersionBody } from "../../shared/schemas/versions";
import { keepVersion } from "../commands/keepVersion";
import { saveDraft } from "../commands/saveDraft";
import type { Db } from "../db/client";
import { findVersion, listVersions } from "../db/reads/findVersion";
import { evaluationFailed, notFound, staleRevision } from "../errors";
import type { Evaluator } from "../jobs/evaluator";
import type { Summaries } from "../jobs/summaries";
import { requireActor } from "../middleware/session";
import { draftStateOf, presentNotebook } from "../presenters/presentNotebook";
import { presentVersion, presentVersionSummary } from "../presenters/presentVersion";
import { supplyReferences } from "../references/supplyReferences";
import { authorise } from "./authorise";
import { readId, readOrdinal } from "./ids";
import { loadNotebook } from "./loadNotebook";

/** `/notebooks/…/versions/…`: list, keep, read, restore. */
export function versionRoutes(parts: { db: Db; evaluator: Evaluator; summaries: Summaries }): Router {
  const { db, evaluator, summaries } = parts;
  const router = Router();

  router.get("/notebooks/:notebookId/versions", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const versions = await listVersions(db, notebook.id);
    res.json(versions.map(presentVersionSummary));
  });

  router.post("/notebooks/:notebookId/versions", async (req, res) => {
    const actor = requireActor(req);
    const { message, revision } = keepVersionBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "keepVersion", "keep a version of this notebook");
    if (notebook.revision !== revision) throw staleRevision(draftStateOf(notebook));

    const answer = await evaluator.evaluate(notebook.document, {
      isKept: true,
      references: await supplyReferences(db, notebook.document, actor.id),
    });
    if (!answer.ok) throw evaluationFailed(`The version was not kept. ${answer.reason}`);
    const { result } = answer.outcome;
    const { number } = await keepVersion(db, {
      notebookId: notebook.id,
      revision,
      message,
      result,
      actorId: actor.id,
      at: new Date(),
    });
    const kept = await findVersion(db, notebook.id, number);
    res.status(201).json(presentVersionSummary(kept!));
  });

  router.get("/notebooks/:notebookId/versions/:number", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const version = await findVersion(db, notebook.id, versionNumber(req));
    if (!version) throw notFound("version");
    res.json(presentVersion(version));
  });

  router.post("/notebooks/:notebookId/versions/:number/restore", async (req, res) => {
    const actor = requireActor(req);
    const { revision } = restoreVersionBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const version = await findVersion(db, notebook.id, versionNumber(req));
    if (!version) throw notFound("version");
    authorise(actor, notebook, "restoreVersion", "restore versions of this notebook");

    const { document } = version;
    await saveDraft(db, { notebookId: notebook.id, revision, document, actorId: actor.id, at: new Date() });
    summaries.request(notebook.id);
    res.json(presentNotebook(await loadNotebook(db, notebook.id, actor), actor));
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");
const versionNumber = (req: Request): number => readOrdinal(req, "number", "version");
