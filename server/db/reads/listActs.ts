import { and, count, desc, eq, gte, inArray, lt, sql } from "drizzle-orm";
import { actKinds, type ActName, type AuditQuery } from "../../../shared/schemas/audit";
import type { Db } from "../client";
import { acts } from "../tables/acts";
import { users } from "../tables/users";

/** Lines of a group's trail under filters, latest first; `limit` null answers every one. */
export async function listActs(
  db: Db,
  { groupId, query, limit }: { groupId: string; query: AuditQuery; limit: number | null },
) {
  const { before } = query;
  const lines = db
    .select({
      id: acts.id,
      at: acts.at,
      actorId: acts.actorId,
      actorName: users.name,
      act: acts.act,
      subject: acts.subject,
      subjectId: acts.subjectId,
      subjectName: acts.subjectName,
      details: acts.details,
    })
    .from(acts)
    .leftJoin(users, eq(users.id, acts.actorId))
    .where(and(under(groupId, query), before === undefined ? undefined : earlierThan(before)))
    .orderBy(desc(acts.at), desc(acts.id));
  return limit === null ? lines : lines.limit(limit);
}

/** Of lines of one moment the later written stands first. */
const earlierThan = (id: number) =>
  sql`(${acts.at}, ${acts.id}) < (select line.at, line.id from acts as line where line.id = ${id})`;

export type ActRow = Awaited<ReturnType<typeof listActs>>[number];

/** How many lines there are under the filters, wherever the page begins. */
export async function countActs(db: Db, groupId: string, query: AuditQuery): Promise<number> {
  const [counted] = await db.select({ lines: count() }).from(acts).where(under(groupId, query));
  return counted?.lines ?? 0;
}

function under(groupId: string, { person, kind, from, to }: AuditQuery) {
  return and(
    eq(acts.groupId, groupId),
    person ? eq(acts.actorId, person) : undefined,
    kind ? inArray(acts.act, actKinds[kind] as readonly ActName[]) : undefined,
    from ? gte(acts.at, new Date(from)) : undefined,
    to ? lt(acts.at, new Date(to)) : undefined,
  );
}
