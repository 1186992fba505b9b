import { randomUUID } from "node:crypto";
import type { IncomingMessage } from "node:http";
import type { Logger } from "pino";
import { pinoHttp } from "pino-http";

/** Gives each request an id, also in the answer, and logs what was asked and how it ended; no bodies, no cookies. */
export function requestLog(logger: Logger) {
  return pinoHttp<IncomingMessage>({
    logger,
    genReqId: (_req, res) => {
      const id = randomUUID();
      res.setHeader("X-Request-Id", id);
      return id;
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? "error" : "info"),
    autoLogging: { ignore: (req) => req.url === "/healthz" || !req.url?.startsWith("/api/") },
    serializers: {
      req: ({ id, method, url }: { id: string; method: string; url: string }) => ({ id, method, url }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  });
}
