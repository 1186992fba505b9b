import type { Request, RequestHandler } from "express";
import type { Auth, ValidSession } from "../auth/auth";
import { signedOut } from "../errors";
import type { Actor } from "../policies/actor";

const sessionsByRequest = new WeakMap<Request, ValidSession>();

/** Finds out on whose behalf a request acts, and renews the cookie where due. */
export function session(auth: Auth): RequestHandler {
  return async (req, res, next) => {
    const header = req.headers.cookie;
    const found = header ? await auth.readSession(header) : null;
    if (found) {
      sessionsByRequest.set(req, found);
      if (found.cookie) res.append("Set-Cookie", found.cookie);
    }
    next();
  };
}

export const sessionOf = (req: Request): ValidSession | null => sessionsByRequest.get(req) ?? null;

/** @throws AppError if nobody is signed in */
export function requireActor(req: Request): Actor {
  const found = sessionOf(req);
  if (!found) throw signedOut();
  return found.actor;
}
