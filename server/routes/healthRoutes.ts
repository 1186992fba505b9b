import { Router } from "express";
import { sql } from "drizzle-orm";
import type { Db } from "../db/client";

/** `/healthz`: whether the server and its database answer. */
export function healthRoutes({ db }: { db: Db }): Router {
  const router = Router();
  router.get("/healthz", async (_req, res) => {
    await db.execute(sql`select 1`);
    res.set("Cache-Control", "no-store").json({ status: "ok" });
  });
  return router;
}
