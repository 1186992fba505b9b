import { Router } from "express";
import { readNoticesBody } from "../../shared/schemas/notices";
import { readNotices } from "../commands/readNotices";
import type { Db } from "../db/client";
import { listNotices } from "../db/reads/listNotices";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";
import { presentNotices } from "../presenters/presentNotices";

/** `/notices`: what one is told of, and that it was read. */
export function noticeRoutes({ db }: { db: Db }): Router {
  const router = Router();

  // What was taken away since is not told of any longer.
  const presentFresh = async (actor: Actor) => {
    const rows = await listNotices(db, actor.id);
    return presentNotices(rows.filter(({ notebook }) => notebookPolicy.read(actor, notebookFacts(notebook))));
  };

  router.get("/notices", async (req, res) => {
    const actor = requireActor(req);
    res.json(await presentFresh(actor));
  });

  router.post("/notices/read", async (req, res) => {
    const actor = requireActor(req);
    const { ids } = readNoticesBody.parse(req.body);
    await readNotices(db, { userId: actor.id, ids, at: new Date() });
    res.json(await presentFresh(actor));
  });

  return router;
}
