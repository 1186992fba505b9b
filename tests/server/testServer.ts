import { pino } from "pino";
import request from "supertest";
import { createApp, type AppParts } from "../../server/app";
import { createAuth } from "../../server/auth/auth";
import { evaluateDocument } from "../../server/jobs/evaluateDocument";
import type { Evaluator } from "../../server/jobs/evaluator";
import { createPost } from "../../server/jobs/post";
import { createSummaries } from "../../server/jobs/summaries";
import { createLive } from "../../server/live/live";
import { drawerTransport } from "../../server/mail/transport";
import type { Actor } from "../../server/policies/actor";
import { openTestDatabase } from "./testDatabase";

/** Evaluates here rather than in a thread: the thread has a test of its own. */
const evaluator: Evaluator = {
  evaluate: async (document) => ({ ok: true, outcome: evaluateDocument(document) }),
  close: async () => undefined,
};

const manyTries = { signInPerAccount: 1000, signIn: 1000, signUp: 1000 };

/** The whole server on a database in memory, or on the one given, without listening. */
export async function startTestServer(parts: Partial<AppParts> = {}) {
  const opened = parts.db ? null : await openTestDatabase();
  const db = parts.db ?? opened!.db;
  const logger = pino({ level: "silent" });
  const auth = await createAuth(db, { hasSecureCookies: false });
  const summaries = createSummaries({ db, evaluator, logger });
  const post = parts.post ?? createPost({ db, transport: drawerTransport(db), logger });
  const live = parts.live ?? createLive();
  const app = createApp({
    db,
    auth,
    evaluator,
    summaries,
    post,
    live,
    logger,
    demo: false,
    showsMail: false,
    linkOrigin: () => "https://tenuity.example",
    tries: manyTries,
    ...parts,
  });

  const cookieOf = async (user: Actor): Promise<string> => (await auth.openSession(user.id)).split(";")[0]!;

  return {
    db,
    app,
    auth,
    summaries,
    post,
    live,
    cookieOf,
    signedOut: request(app),
    /** Requests in the name of this person. */
    as: async (user: Actor) => request.agent(app).set("Cookie", await cookieOf(user)),
    close: async () => {
      live.close();
      await summaries.close();
      await post.close();
      await opened?.close();
    },
  };
}

export type TestServer = Awaited<ReturnType<typeof startTestServer>>;
