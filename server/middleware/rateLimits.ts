import type { Request, RequestHandler } from "express";
import { ipKeyGenerator, rateLimit } from "express-rate-limit";
import { AppError } from "../errors";

/** How often one may try, per quarter of an hour. */
export interface Tries {
  /** Failed sign-ins to one account from one address. */
  signInPerAccount: number;
  /** Failed sign-ins from one address. */
  signIn: number;
  /** New accounts from one address. */
  signUp: number;
}

export const usualTries: Tries = { signInPerAccount: 10, signIn: 100, signUp: 30 };

const quarterHour = 15 * 60_000;

const addressOf = (req: Request): string => ipKeyGenerator(req.ip ?? "unknown");

function limit(
  tries: number,
  options: { countsOnlyFailures: boolean; key: (req: Request) => string },
): RequestHandler {
  return rateLimit({
    windowMs: quarterHour,
    limit: tries,
    standardHeaders: "draft-8",
    legacyHeaders: false,
    skipSuccessfulRequests: options.countsOnlyFailures,
    keyGenerator: options.key,
    handler: (_req, res, next) => {
      const minutes = Math.ceil(Number(res.getHeader("Retry-After") ?? 900) / 60);
      const detail = `Too many tries. Wait ${minutes === 1 ? "a minute" : `${minutes} minutes`} and try again.`;
      next(new AppError(429, "too_many_tries", "Too many tries", detail));
    },
  });
}

export function rateLimits(tries: Tries): { signIn: RequestHandler[]; signUp: RequestHandler[] } {
  const accountOf = (req: Request): string => {
    const { email } = (req.body ?? {}) as { email?: unknown };
    return `${addressOf(req)} ${typeof email === "string" ? email.trim().toLowerCase().slice(0, 320) : ""}`;
  };
  return {
    signIn: [
      limit(tries.signIn, { countsOnlyFailures: true, key: addressOf }),
      limit(tries.signInPerAccount, { countsOnlyFailures: true, key: accountOf }),
    ],
    signUp: [limit(tries.signUp, { countsOnlyFailures: false, key: addressOf })],
  };
}
