import { Router, type RequestHandler } from "express";
import { demoSignInBody, signInBody } from "../../shared/schemas/session";
import type { Auth } from "../auth/auth";
import { demoAccounts } from "../auth/demoAccounts";
import type { Db } from "../db/client";
import { findUserByEmail } from "../db/reads/findUser";
import { notFound, wrongCredentials } from "../errors";
import { sessionOf } from "../middleware/session";
import { presentSession } from "../presenters/presentSession";

interface Parts {
  db: Db;
  auth: Auth;
  /** Whether one may look round as a demonstration account. */
  demo: boolean;
  signInLimits: RequestHandler[];
}

/** `/session`: who is signed in; sign in, look round, sign out. */
export function sessionRoutes({ db, auth, demo, signInLimits }: Parts): Router {
  const router = Router();
  const shown = demo ? demoAccounts : null;

  router.get("/session", (req, res) => {
    res.json(presentSession(sessionOf(req)?.actor ?? null, shown));
  });

  router.post("/session", ...signInLimits, async (req, res) => {
    const { email, password } = signInBody.parse(req.body);
    const actor = await auth.checkPassword(email, password);
    if (!actor) throw wrongCredentials();

    const earlier = sessionOf(req);
    if (earlier) await auth.closeSession(earlier.sessionId);
    res.set("Set-Cookie", await auth.openSession(actor.id));
    res.status(201).json(presentSession(actor, shown));
  });

  router.post("/session/demo", async (req, res) => {
    const { email } = demoSignInBody.parse(req.body);
    const isDemo = demo && demoAccounts.some((account) => account.email === email);
    const user = isDemo ? await findUserByEmail(db, email) : undefined;
    // Whoever had the address before the demonstration came has a password, and keeps it.
    if (!user || user.passwordHash !== null) throw notFound("demonstration account");

    const earlier = sessionOf(req);
    if (earlier) await auth.closeSession(earlier.sessionId);
    res.set("Set-Cookie", await auth.openSession(user.id));
    res.status(201).json(presentSession(user, shown));
  });

  router.delete("/session", async (req, res) => {
    const current = sessionOf(req);
    if (current) res.set("Set-Cookie", await auth.closeSession(current.sessionId));
    res.status(204).end();
  });

  return router;
}
