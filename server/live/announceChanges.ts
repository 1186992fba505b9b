import type { RequestHandler } from "express";
import type { Logger } from "pino";
import type { ChangedPart } from "../../shared/schemas/live";
import { sessionOf } from "../middleware/session";
import type { Live } from "./live";

/**
 * Tells open pages of every change that was accepted, whichever route took it, so that no route can forget to; and ends
 * the streams of those whom the change has shut out.
 */
export function announceChanges({ live, logger }: { live: Live; logger: Logger }): RequestHandler {
  const recheck = (notebookId?: string): void => {
    live
      .recheck(notebookId === undefined ? {} : { notebookId })
      .catch((error: unknown) =>
        logger.error({ err: error }, "who may still see a notebook was not checked"),
      );
  };

  return (req, res, next) => {
    if (req.method === "GET" || req.method === "HEAD") return next();
    const { path } = req;
    const actor = sessionOf(req)?.actor;
    res.on("finish", () => {
      if (res.statusCode >= 400) return;
      const [, notebookId, rest = ""] = /^\/notebooks\/([0-9a-f-]{36})(\/.*)?$/i.exec(path) ?? [];
      // Groups, invitations and sign-outs decide about many notebooks at once.
      if (notebookId === undefined) return recheck();
      const part = changedPart(rest);
      if (part === null) return;
      if (actor) live.tell(notebookId.toLowerCase(), { part, by: { id: actor.id, name: actor.name } });
      if (part === "notebook") recheck(notebookId.toLowerCase());
    });
    next();
  };
}

/** What a change below a notebook's address has changed for others; null: nothing. */
function changedPart(rest: string): ChangedPart | null {
  if (rest === "/presence" || rest.endsWith("/seen")) return null;
  if (rest === "/draft") return "draft";
  return rest.startsWith("/threads") ? "threads" : "notebook";
}
