import { Router, type Request } from "express";
import { duplicateNotebookBody } from "../../shared/schemas/notebooks";
import { moveNotebookBody } from "../../shared/schemas/shares";
import { archiveNotebook } from "../commands/archiveNotebook";
import { deleteNotebook } from "../commands/deleteNotebook";
import { duplicateNotebook } from "../commands/duplicateNotebook";
import { moveNotebook } from "../commands/moveNotebook";
import { restoreFromBin } from "../commands/restoreFromBin";
import type { Db } from "../db/client";
import type { Summaries } from "../jobs/summaries";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { presentNotebook } from "../presenters/presentNotebook";
import { authorise, authoriseIn } from "./authorise";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";

/** `/notebooks/…`: keeping house: duplicate, move, archive, delete, and take back. */
export function keepingRoutes({ db, summaries }: { db: Db; summaries: Summaries }): Router {
  const router = Router();

  const presentFresh = async (id: string, actor: Actor) =>
    presentNotebook(await loadNotebook(db, id, actor), actor);

  router.post("/notebooks/:notebookId/duplicate", async (req, res) => {
    const actor = requireActor(req);
    const { groupId } = duplicateNotebookBody.parse(req.body);
    const original = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, original, "duplicate", "duplicate this notebook");
    await authoriseIn(db, groupId, actor);

    const { id } = await duplicateNotebook(db, { original, groupId, actorId: actor.id, at: new Date() });
    summaries.request(id);
    res.status(201).json(await presentFresh(id, actor));
  });

  router.post("/notebooks/:notebookId/move", async (req, res) => {
    const actor = requireActor(req);
    const { groupId } = moveNotebookBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "move", "move this notebook");
    await authoriseIn(db, groupId, actor);

    await moveNotebook(db, { notebookId: notebook.id, groupId, actorId: actor.id, at: new Date() });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.post("/notebooks/:notebookId/archive", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "archive", "archive this notebook");

    await archiveNotebook(db, {
      notebookId: notebook.id,
      isArchived: true,
      actorId: actor.id,
      at: new Date(),
    });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.post("/notebooks/:notebookId/unarchive", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(
      actor,
      notebook,
      "unarchive",
      "take this notebook out of the archive: it is not there, or not yours",
    );

    await archiveNotebook(db, {
      notebookId: notebook.id,
      isArchived: false,
      actorId: actor.id,
      at: new Date(),
    });
    res.json(await presentFresh(notebook.id, actor));
  });

  router.delete("/notebooks/:notebookId", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    authorise(actor, notebook, "delete", "delete this notebook");

    await deleteNotebook(db, { notebookId: notebook.id, actorId: actor.id, at: new Date() });
    res.status(204).end();
  });

  router.post("/notebooks/:notebookId/restore-from-bin", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor, { orInBin: true });
    authorise(
      actor,
      notebook,
      "restoreFromBin",
      "take this notebook out of the bin: it is not there, or not yours",
    );

    await restoreFromBin(db, { notebookId: notebook.id, actorId: actor.id, at: new Date() });
    summaries.request(notebook.id);
    res.json(await presentFresh(notebook.id, actor));
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");
