/**
 * Sign-in, in one place: sessions by Lucia, secrets by Argon2id. Neither library is maintained upstream any longer;
 * nothing outside this folder knows that they are here.
 */
import { DrizzlePostgreSQLAdapter } from "@lucia-auth/adapter-drizzle";
import { Lucia, TimeSpan } from "lucia";
import { Argon2id } from "oslo/password";
import { emailAddress } from "../../shared/schemas/emailAddress";
import type { Db } from "../db/client";
import { findUserByEmail } from "../db/reads/findUser";
import { sessions } from "../db/tables/sessions";
import { users } from "../db/tables/users";
import type { Actor } from "../policies/actor";
import { hashedSessions } from "./hashedSessions";

declare module "lucia" {
  interface Register {
    Lucia: Lucia<Record<never, never>, { name: string; email: string }>;
    DatabaseUserAttributes: { name: string; email: string };
  }
}

export interface ValidSession {
  sessionId: string;
  actor: Actor;
  /** To be sent along where the session was renewed. */
  cookie: string | null;
}

export interface Auth {
  hashPassword(password: string): Promise<string>;
  /** The person with this address and password; null, after the same work, for any other. */
  checkPassword(email: string, password: string): Promise<Actor | null>;
  /** A new session and the cookie that carries it. */
  openSession(userId: string): Promise<string>;
  /** The session in a Cookie header, renewed where half of its time is over; null where there is none. */
  readSession(cookieHeader: string): Promise<ValidSession | null>;
  /** Ends the session; answers the cookie that takes the old one back. */
  closeSession(sessionId: string): Promise<string>;
  sweepExpired(): Promise<void>;
}

export async function createAuth(db: Db, { hasSecureCookies }: { hasSecureCookies: boolean }): Promise<Auth> {
  const lucia = new Lucia(hashedSessions(new DrizzlePostgreSQLAdapter(db, sessions, users)), {
    sessionExpiresIn: new TimeSpan(30, "d"),
    sessionCookie: {
      name: "tenuity_session",
      attributes: { secure: hasSecureCookies, sameSite: "lax", path: "/" },
    },
    getUserAttributes: ({ name, email }) => ({ name, email }),
  });
  const argon2 = new Argon2id();
  /** Checked where there is no account, so that an unknown address takes as long as a wrong password. */
  const decoyHash = await argon2.hash(crypto.randomUUID());

  return {
    hashPassword: (password) => argon2.hash(password.normalize("NFKC")),

    checkPassword: async (email, password) => {
      const address = emailAddress.safeParse(email);
      const user = address.success ? await findUserByEmail(db, address.data) : undefined;
      const isRight = await argon2.verify(user?.passwordHash ?? decoyHash, password.normalize("NFKC"));
      return user?.passwordHash && isRight ? { id: user.id, name: user.name, email: user.email } : null;
    },

    openSession: async (userId) => {
      const session = await lucia.createSession(userId, {});
      return lucia.createSessionCookie(session.id).serialize();
    },

    readSession: async (cookieHeader) => {
      const sessionId = lucia.readSessionCookie(cookieHeader);
      if (!sessionId) return null;
      const { session, user } = await lucia.validateSession(sessionId);
      if (!session) return null;
      return {
        sessionId,
        actor: { id: user.id, name: user.name, email: user.email },
        cookie: session.fresh ? lucia.createSessionCookie(sessionId).serialize() : null,
      };
    },

    closeSession: async (sessionId) => {
      await lucia.invalidateSession(sessionId);
      return lucia.createBlankSessionCookie().serialize();
    },

    sweepExpired: () => lucia.deleteExpiredSessions(),
  };
}
