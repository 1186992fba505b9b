import express, { type Express } from "express";
import type { Logger } from "pino";
import type { Auth } from "./auth/auth";
import type { Db } from "./db/client";
import { notFound } from "./errors";
import type { Evaluator } from "./jobs/evaluator";
import type { Post } from "./jobs/post";
import type { Summaries } from "./jobs/summaries";
import { announceChanges } from "./live/announceChanges";
import type { Live } from "./live/live";
import { clientFiles } from "./middleware/clientFiles";
import { errorHandler } from "./middleware/errorHandler";
import { rateLimits, usualTries, type Tries } from "./middleware/rateLimits";
import { requestLog } from "./middleware/requestLog";
import { sameOrigin } from "./middleware/sameOrigin";
import { securityHeaders } from "./middleware/securityHeaders";
import { session } from "./middleware/session";
import { accountRoutes } from "./routes/accountRoutes";
import { auditRoutes } from "./routes/auditRoutes";
import { groupInvitationRoutes } from "./routes/groupInvitationRoutes";
import { groupRoutes } from "./routes/groupRoutes";
import { healthRoutes } from "./routes/healthRoutes";
import { invitationRoutes } from "./routes/invitationRoutes";
import { keepingRoutes } from "./routes/keepingRoutes";
import { liveRoutes } from "./routes/liveRoutes";
import { mailRoutes } from "./routes/mailRoutes";
import { notebookRoutes } from "./routes/notebookRoutes";
import { noticeRoutes } from "./routes/noticeRoutes";
import { sessionRoutes } from "./routes/sessionRoutes";
import { shareRoutes } from "./routes/shareRoutes";
import { threadRoutes } from "./routes/threadRoutes";
import { versionRoutes } from "./routes/versionRoutes";

export interface AppParts {
  db: Db;
  auth: Auth;
  evaluator: Evaluator;
  summaries: Summaries;
  post: Post;
  live: Live;
  logger: Logger;
  demo: boolean;
  /** Whether letters are kept to be looked at by anyone, in place of being sent. */
  showsMail: boolean;
  /** Where links in letters lead, without a slash at its end. */
  linkOrigin: () => string;
  /** Public origin, where it is not the address that requests name. */
  origin?: string | undefined;
  proxies?: number;
  /** Folder of the built page; left out, only the API is served. */
  clientFolder?: string | undefined;
  tries?: Tries;
  /** Between two signs of life on a stream of events, in ms. */
  heartbeat?: number;
}

/** The whole server but its listening: what every request passes, the routes, the page, the answer to failures. */
export function createApp(parts: AppParts): Express {
  const { db, auth, evaluator, summaries, post, logger, demo, origin, proxies = 0, clientFolder } = parts;
  const { showsMail, linkOrigin, live, heartbeat = 15_000 } = parts;
  const limits = rateLimits(parts.tries ?? usualTries);
  const app = express();
  app.disable("x-powered-by");
  app.set("trust proxy", proxies);
  app.use(requestLog(logger), ...securityHeaders({ isHttps: origin?.startsWith("https:") ?? false }));
  app.use(healthRoutes({ db }));

  const api = express.Router();
  api.use((_req, res, next) => {
    res.set("Cache-Control", "no-store");
    next();
  });
  api.use(sameOrigin(origin), express.json({ limit: "8mb" }), session(auth));
  api.use(announceChanges({ live, logger }));
  api.use(sessionRoutes({ db, auth, demo, signInLimits: limits.signIn }));
  api.use(accountRoutes({ db, auth, demo, signUpLimits: limits.signUp }));
  api.use(invitationRoutes({ db }));
  api.use(mailRoutes({ db, showsMail }));
  api.use(groupRoutes({ db }));
  api.use(groupInvitationRoutes({ db, post, linkOrigin }));
  api.use(auditRoutes({ db }));
  api.use(notebookRoutes({ db, summaries }));
  api.use(keepingRoutes({ db, summaries }));
  api.use(shareRoutes({ db, post, linkOrigin }));
  api.use(versionRoutes({ db, evaluator, summaries }));
  api.use(threadRoutes({ db, post, linkOrigin }));
  api.use(noticeRoutes({ db }));
  api.use(liveRoutes({ db, auth, live, heartbeat }));
  api.use(() => {
    throw notFound("address");
  });
  app.use("/api", api);

  if (clientFolder) app.use(clientFiles(clientFolder));
  app.use(() => {
    throw notFound("page");
  });
  app.use(errorHandler);
  return app;
}
