import { and, desc, eq, isNull, ne, or, sql, type SQL } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { partsOfPin } from "../../../shared/notebook/language/readPin";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { publishedReferences } from "../tables/publishedReferences";
import { users } from "../tables/users";

const publisher = alias(users, "publisher");

/** The newest edition that stands, or where all were withdrawn the newest. */
const newest = sql<number>`(
  select coalesce(max(edition) filter (where withdrawn_at is null), max(edition))
  from published_references as other
  where other.group_id = ${publishedReferences.groupId} and other.number = ${publishedReferences.number}
)`.mapWith(Number);

const headColumns = {
  id: publishedReferences.id,
  groupId: publishedReferences.groupId,
  groupName: groups.name,
  groupCode: groups.code,
  number: publishedReferences.number,
  edition: publishedReferences.edition,
  title: publishedReferences.title,
  summary: publishedReferences.summary,
  authors: publishedReferences.authors,
  publishedAt: publishedReferences.publishedAt,
  isPublic: publishedReferences.isPublic,
  withdrawnAt: publishedReferences.withdrawnAt,
  withdrawnReason: publishedReferences.withdrawnReason,
  /** Of the person who asks; null outside and signed out. */
  actorGroupRole: groupMembers.role,
  newest,
};

const nobody = "00000000-0000-0000-0000-000000000000";

const membership = (personId: string | null) =>
  and(eq(groupMembers.groupId, publishedReferences.groupId), eq(groupMembers.userId, personId ?? nobody));

function selectWhole(db: Db, personId: string | null, condition: SQL | undefined) {
  return db
    .select({
      ...headColumns,
      licence: publishedReferences.licence,
      document: publishedReferences.document,
      result: publishedReferences.result,
      bodies: publishedReferences.bodies,
      restsOn: publishedReferences.restsOn,
      engine: publishedReferences.engine,
      contentHash: publishedReferences.contentHash,
      checks: publishedReferences.checks,
      notebookId: publishedReferences.notebookId,
      publishedByName: publisher.name,
      isVettedByOwner: publishedReferences.isVettedByOwner,
      doi: publishedReferences.doi,
      recomputedAt: publishedReferences.recomputedAt,
      recomputedEngine: publishedReferences.recomputedEngine,
      drift: publishedReferences.drift,
    })
    .from(publishedReferences)
    .innerJoin(groups, eq(groups.id, publishedReferences.groupId))
    .innerJoin(publisher, eq(publisher.id, publishedReferences.publishedBy))
    .leftJoin(groupMembers, membership(personId))
    .where(condition);
}

const isPinned = (pin: string): SQL | undefined => {
  const parts = partsOfPin(pin);
  if (!parts) return undefined;
  const { code, number, edition } = parts;
  return and(
    eq(groups.code, code),
    eq(publishedReferences.number, number),
    eq(publishedReferences.edition, edition),
  );
};

/** The editions with these pins; whether the person may read each is for the policy. */
export async function findPinned(db: Db, pins: readonly string[], personId: string | null) {
  const conditions = pins.flatMap((pin) => isPinned(pin) ?? []);
  return conditions.length === 0 ? [] : selectWhole(db, personId, or(...conditions));
}

/** All editions of one reference, newest first, without what they hold. */
export async function listEditions(db: Db, of: { groupId: string; number: number }, personId: string | null) {
  const condition = and(eq(publishedReferences.groupId, of.groupId), eq(publishedReferences.number, of.number));
  return listHeads(db, personId, condition);
}

/** Every edition, or those of one group, newest first; whether the person may read each is for the policy. */
export async function listReferences(db: Db, personId: string | null, groupId?: string) {
  return listHeads(db, personId, groupId === undefined ? undefined : eq(publishedReferences.groupId, groupId));
}

/** The editions that use one. */
export async function listBuiltUpon(db: Db, pin: string, personId: string | null) {
  return listHeads(db, personId, sql`${publishedReferences.restsOn}::jsonb ? ${pin}`);
}

function listHeads(db: Db, personId: string | null, condition: SQL | undefined) {
  return db
    .select(headColumns)
    .from(publishedReferences)
    .innerJoin(groups, eq(groups.id, publishedReferences.groupId))
    .leftJoin(groupMembers, membership(personId))
    .where(condition)
    .orderBy(desc(publishedReferences.publishedAt), desc(publishedReferences.number), desc(publishedReferences.edition));
}

/** Editions published with another engine that this one has not computed yet. */
export async function listToRecompute(db: Db, engine: string) {
  const isBehind = or(
    isNull(publishedReferences.recomputedEngine),
    ne(publishedReferences.recomputedEngine, engine),
  );
  return db
    .select({
      id: publishedReferences.id,
      document: publishedReferences.document,
      result: publishedReferences.result,
      restsOn: publishedReferences.restsOn,
    })
    .from(publishedReferences)
    .where(and(ne(publishedReferences.engine, engine), isBehind));
}

/** Pins of everything that these pins rest on, through however many references, themselves included. */
export async function allRestedOn(db: Db, pins: readonly string[]): Promise<string[]> {
  const found = new Set<string>();
  for (let left = [...pins]; left.length > 0; ) {
    left.forEach((pin) => found.add(pin));
    const rows = await findPinned(db, left, null);
    left = rows.flatMap(({ restsOn }) => restsOn).filter((pin) => !found.has(pin));
  }
  return [...found];
}

export type ReferenceHeadRow = Awaited<ReturnType<typeof listHeads>>[number];
export type ReferenceRow = Awaited<ReturnType<typeof findPinned>>[number];
