/** Starts the server; on SIGTERM or SIGINT lets the answers under way finish, then closes the database. */
import { existsSync } from "node:fs";
import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import path from "node:path";
import { pino, type Logger } from "pino";
import { createApp } from "./app";
import { createAuth } from "./auth/auth";
import { seedDemo } from "./demo/seedDemo";
import { linkOriginOf, readEnv, type Env } from "./env";
import { createEvaluator } from "./jobs/evaluator";
import { startHousekeeping } from "./jobs/housekeeping";
import { createPost } from "./jobs/post";
import { createSummaries } from "./jobs/summaries";
import { createLive } from "./live/live";
import { drawerTransport, smtpTransport } from "./mail/transport";
import { openData } from "./openData";
import { places } from "./places";

/** How long answers under way may take once the server is told to stop, in ms. */
const drainTime = 10_000;

function listen(server: Server, { port, host }: Env): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) =>
      reject(
        error.code === "EADDRINUSE"
          ? new Error(`Port ${port} is in use. Stop what uses it, or set PORT to another.`)
          : error,
      ),
    );
    server.listen({ port, host }, resolve);
  });
}

function drain(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), drainTime).unref();
  });
}

async function start(env: Env, logger: Logger): Promise<() => Promise<void>> {
  const data = await openData(env);
  const { db } = data;
  const evaluator = createEvaluator();
  const summaries = createSummaries({ db, evaluator, logger });
  const transport = env.smtp ? smtpTransport(env.smtp) : drawerTransport(db);
  const post = createPost({ db, transport, logger });
  const live = createLive();
  const auth = await createAuth(db, { hasSecureCookies: env.origin?.startsWith("https:") ?? false });
  if (env.demo) await seedDemo(db, { evaluator, now: new Date(), linkOrigin: linkOriginOf(env) });

  const hasClient = existsSync(path.join(places.client, "index.html"));
  if (!hasClient) logger.warn({ folder: places.client }, "no built page here; only the API is served");
  const server = createServer();
  const address = (): string =>
    linkOriginOf({ ...env, port: (server.address() as AddressInfo | null)?.port ?? env.port });
  const app = createApp({
    db,
    auth,
    evaluator,
    summaries,
    post,
    live,
    logger,
    demo: env.demo,
    showsMail: env.demo && env.smtp === null,
    linkOrigin: address,
    origin: env.origin,
    proxies: env.proxies,
    clientFolder: hasClient ? places.client : undefined,
  });
  server.on("request", app);
  try {
    await listen(server, env);
  } catch (error) {
    await evaluator.close();
    await data.close();
    throw error;
  }
  const housekeeping = startHousekeeping({ db, auth, logger });
  post.start();
  await summaries.catchUp();
  process.stdout.write(`Tenuity is on ${address()}\n`);

  return async () => {
    housekeeping.stop();
    live.close();
    await drain(server);
    await summaries.close();
    await post.close();
    await evaluator.close();
    await data.close();
  };
}

try {
  const env = readEnv(process.env);
  const stop = await start(env, pino({ level: env.logLevel }));
  let isStopping = false;
  const handleSignal = (signal: NodeJS.Signals): void => {
    if (isStopping) process.exit(1);
    isStopping = true;
    process.stdout.write(`${signal}: finishing what is under way\n`);
    void stop().then(
      () => process.exit(0),
      (error: unknown) => {
        process.stderr.write(`${String(error)}\n`);
        process.exit(1);
      },
    );
  };
  process.on("SIGTERM", handleSignal);
  process.on("SIGINT", handleSignal);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
}
