import { Router, type Request, type Response } from "express";
import { setPresenceBody, type LiveEvent } from "../../shared/schemas/live";
import type { Auth } from "../auth/auth";
import type { Db } from "../db/client";
import { findNotebook } from "../db/reads/findNotebook";
import { notFound } from "../errors";
import type { Live } from "../live/live";
import { requireActor } from "../middleware/session";
import { notebookPolicy } from "../policies/notebookPolicy";
import { notebookFacts } from "../presenters/presentNotebook";
import { readId } from "./ids";
import { loadNotebook } from "./loadNotebook";

interface Parts {
  db: Db;
  auth: Auth;
  live: Live;
  /** Between two signs of life on a stream, in ms; each also asks whether it may stay open. */
  heartbeat: number;
}

/** `/notebooks/…/events`: a stream of what happens to a notebook; `/notebooks/…/presence`: where in it one is. */
export function liveRoutes({ db, auth, live, heartbeat }: Parts): Router {
  const router = Router();

  router.get("/notebooks/:notebookId/events", async (req, res) => {
    const actor = requireActor(req);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const cookie = req.headers.cookie ?? "";

    const maySee = async (): Promise<boolean> => {
      const session = await auth.readSession(cookie);
      if (session?.actor.id !== actor.id) return false;
      const now = await findNotebook(db, notebook.id, actor.id);
      return now !== undefined && notebookPolicy.read(actor, notebookFacts(now));
    };

    openStream(res);
    const connectionId = crypto.randomUUID();
    const leave = live.join({
      connectionId,
      notebookId: notebook.id,
      person: { id: actor.id, name: actor.name },
      send: (event) => writeEvent(res, event),
      end: () => res.end(),
      maySee,
    });
    const timer = setInterval(() => {
      res.write(": here\n\n");
      void live.recheck({ connectionId });
    }, heartbeat);
    res.on("close", () => {
      clearInterval(timer);
      leave();
    });
  });

  router.put("/notebooks/:notebookId/presence", async (req, res) => {
    const actor = requireActor(req);
    const { connectionId, cellId } = setPresenceBody.parse(req.body);
    const notebook = await loadNotebook(db, notebookId(req), actor);
    const place = { notebookId: notebook.id, connectionId, personId: actor.id, cellId };
    if (!live.moveTo(place)) throw notFound("connection");
    res.status(204).end();
  });

  return router;
}

const notebookId = (req: Request): string => readId(req, "notebookId", "notebook");

/** Wait before a page connects again, in ms. */
const retry = 2_000;

function openStream(res: Response): void {
  res.set({
    "Content-Type": "text/event-stream; charset=utf-8",
    // Proxies must pass each event on as it comes.
    "Cache-Control": "no-store, no-transform",
    "X-Accel-Buffering": "no",
  });
  res.flushHeaders();
  res.write(`retry: ${retry}\n\n`);
}

/** JSON holds no line end, so an event can't be broken in two or carry another. */
function writeEvent(res: Response, event: LiveEvent): void {
  if (!res.writableEnded) res.write(`event: ${event.type}\ndata: ${JSON.stringify(event)}\n\n`);
}
