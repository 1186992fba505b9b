import { Router } from "express";
import { setMailChoiceBody } from "../../shared/schemas/mail";
import { setMailChoice } from "../commands/setMailChoice";
import type { Db } from "../db/client";
import { listKeptMail, listMailChoices } from "../db/reads/mail";
import { notFound } from "../errors";
import { requireActor } from "../middleware/session";
import { presentKeptMail, presentMailChoices } from "../presenters/presentMail";

interface Parts {
  db: Db;
  /** Whether letters are kept in place of being sent, and may be looked at by anyone: in development alone. */
  showsMail: boolean;
}

/** `/account/mail`: which letters one wants; `/development/mail`: what would have been sent. */
export function mailRoutes({ db, showsMail }: Parts): Router {
  const router = Router();

  router.get("/account/mail", async (req, res) => {
    const actor = requireActor(req);
    res.json(presentMailChoices(await listMailChoices(db, actor.id)));
  });

  router.patch("/account/mail", async (req, res) => {
    const actor = requireActor(req);
    const { kind, isWanted } = setMailChoiceBody.parse(req.body);
    await setMailChoice(db, { userId: actor.id, kind, isWanted });
    res.json(presentMailChoices(await listMailChoices(db, actor.id)));
  });

  router.get("/development/mail", async (_req, res) => {
    if (!showsMail) throw notFound("address");
    res.json(presentKeptMail(await listKeptMail(db)));
  });

  return router;
}
