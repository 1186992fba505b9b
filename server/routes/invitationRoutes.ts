import { Router } from "express";
import { invitationTokenBody } from "../../shared/schemas/invitations";
import { acceptInvitation, refuseClosed } from "../commands/acceptInvitation";
import type { Db } from "../db/client";
import { findInvitationByToken } from "../db/reads/findInvitation";
import { invitationUnknown } from "../errors";
import { hashOfToken } from "../mail/invitationToken";
import { requireActor } from "../middleware/session";
import { presentInvitation } from "../presenters/presentInvitation";

/**
 * `/invitations/…`: see what a link offers, accept it. Whoever holds a link may see what it offers, signed in or not:
 * the token is the key. It comes in the body, so that it stands in no log.
 */
export function invitationRoutes({ db }: { db: Db }): Router {
  const router = Router();

  router.post("/invitations/look", async (req, res) => {
    const { token } = invitationTokenBody.parse(req.body);
    const invitation = await findInvitationByToken(db, hashOfToken(token));
    if (!invitation) throw invitationUnknown();
    refuseClosed(invitation, new Date());
    res.json(presentInvitation(invitation));
  });

  router.post("/invitations/accept", async (req, res) => {
    const actor = requireActor(req);
    const { token } = invitationTokenBody.parse(req.body);
    res.json(await acceptInvitation(db, { tokenHash: hashOfToken(token), user: actor, at: new Date() }));
  });

  return router;
}
