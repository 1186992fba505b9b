import { Router } from "express";
import { auditQuery, type AuditResponse } from "../../shared/schemas/audit";
import type { Db } from "../db/client";
import { countActs, listActs, type ActRow } from "../db/reads/listActs";
import { listNotebookHeads } from "../db/reads/listNotebookHeads";
import { forbidden } from "../errors";
import { requireActor } from "../middleware/session";
import type { Actor } from "../policies/actor";
import { groupPolicy } from "../policies/groupPolicy";
import { notebookPolicy } from "../policies/notebookPolicy";
import { presentAct, presentAuditTable } from "../presenters/presentAudit";
import { notebookFacts } from "../presenters/presentNotebook";
import { loadGroup } from "./loadGroup";

/** Lines on a page of the trail. */
const pageLength = 50;

/** `/groups/…/audit`: the group's trail for its leads, page by page or whole as a table. */
export function auditRoutes({ db }: { db: Db }): Router {
  const router = Router();

  const present = async (rows: ActRow[], actor: Actor) => {
    const ids = rows.filter(({ subject }) => subject === "notebook").map(({ subjectId }) => subjectId);
    const heads = await listNotebookHeads(db, [...new Set(ids)], actor.id);
    const visible = new Set(
      heads.filter((head) => notebookPolicy.read(actor, notebookFacts(head))).map(({ id }) => id),
    );
    return rows.map((row) => presentAct(row, visible));
  };

  router.get("/groups/:groupId/audit", async (req, res) => {
    const actor = requireActor(req);
    const query = auditQuery.parse(req.query);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.seeAudit(actor, group)) throw forbidden("see what has happened in this group");

    const rows = await listActs(db, { groupId: group.id, query, limit: pageLength + 1 });
    const page = rows.slice(0, pageLength);
    const answer: AuditResponse = {
      lines: await present(page, actor),
      total: await countActs(db, group.id, query),
      next: rows.length > pageLength ? page.at(-1)!.id : null,
    };
    res.json(answer);
  });

  router.get("/groups/:groupId/audit.csv", async (req, res) => {
    const actor = requireActor(req);
    const query = auditQuery.parse(req.query);
    const group = await loadGroup(db, req, actor);
    if (!groupPolicy.seeAudit(actor, group)) throw forbidden("see what has happened in this group");

    const rows = await listActs(db, { groupId: group.id, query, limit: null });
    res.attachment(`${group.code.toLowerCase()}-audit-trail.csv`);
    res.type("text/csv; charset=utf-8").send(presentAuditTable(await present(rows, actor)));
  });

  return router;
}
