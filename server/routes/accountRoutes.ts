import { Router, type RequestHandler } from "express";
import { createAccountBody } from "../../shared/schemas/accounts";
import type { Auth } from "../auth/auth";
import { demoAccounts } from "../auth/demoAccounts";
import { passwordIssues } from "../auth/passwordIssues";
import { acceptInvitation } from "../commands/acceptInvitation";
import { createAccount } from "../commands/createAccount";
import type { Db } from "../db/client";
import { invalid } from "../errors";
import { hashOfToken } from "../mail/invitationToken";
import { sessionOf } from "../middleware/session";
import { presentSession } from "../presenters/presentSession";

interface Parts {
  db: Db;
  auth: Auth;
  demo: boolean;
  signUpLimits: RequestHandler[];
}

/** `/accounts`: create one, by an invitation or without, and be signed in. */
export function accountRoutes({ db, auth, demo, signUpLimits }: Parts): Router {
  const router = Router();

  router.post("/accounts", ...signUpLimits, async (req, res) => {
    const { name, email, password, invitation } = createAccountBody.parse(req.body);
    const [guessable] = passwordIssues({ name, email, password });
    if (guessable) throw invalid(guessable.message, [guessable]);

    const passwordHash = await auth.hashPassword(password);
    const at = new Date();
    const user = await db.transaction(async (tx) => {
      const created = await createAccount(tx, { name, email, passwordHash, at });
      if (invitation) await acceptInvitation(tx, { tokenHash: hashOfToken(invitation), user: created, at });
      return created;
    });
    const earlier = sessionOf(req);
    if (earlier) await auth.closeSession(earlier.sessionId);
    res.set("Set-Cookie", await auth.openSession(user.id));
    res.status(201).json(presentSession(user, demo ? demoAccounts : null));
  });

  return router;
}
