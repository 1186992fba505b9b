import { and, asc, count, desc, eq, inArray, type SQL } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { users } from "../tables/users";
import { versions } from "../tables/versions";
import { vettings } from "../tables/vettings";

const owner = alias(users, "vetting_owner");
const requester = alias(users, "vetting_requester");
const decider = alias(users, "vetting_decider");

function selectVettings(db: Db, condition: SQL | undefined) {
  return db
    .select({
      vetting: vettings,
      title: versions.document,
      ownerId: notebooks.ownerId,
      ownerName: owner.name,
      groupName: groups.name,
      groupCode: groups.code,
      requesterName: requester.name,
      requesterEmail: requester.email,
      deciderName: decider.name,
    })
    .from(vettings)
    .innerJoin(notebooks, eq(notebooks.id, vettings.notebookId))
    .innerJoin(versions, and(eq(versions.notebookId, vettings.notebookId), eq(versions.number, vettings.versionNumber)))
    .innerJoin(groups, eq(groups.id, vettings.groupId))
    .innerJoin(owner, eq(owner.id, notebooks.ownerId))
    .innerJoin(requester, eq(requester.id, vettings.requestedBy))
    .leftJoin(decider, eq(decider.id, vettings.decidedBy))
    .where(condition);
}

export async function findVetting(db: Db, id: string): Promise<VettingRow | undefined> {
  const [row] = await selectVettings(db, eq(vettings.id, id));
  return row;
}

/** Those of one notebook, newest first. */
export async function listNotebookVettings(db: Db, notebookId: string): Promise<VettingRow[]> {
  return selectVettings(db, eq(vettings.notebookId, notebookId)).orderBy(desc(vettings.requestedAt));
}

/** What waits for a person as lead, longest waiting first. */
export async function listQueue(db: Db, leadId: string): Promise<VettingRow[]> {
  const led = db
    .select({ id: groupMembers.groupId })
    .from(groupMembers)
    .where(and(eq(groupMembers.userId, leadId), eq(groupMembers.role, "lead")));
  return selectVettings(db, and(inArray(vettings.groupId, led), eq(vettings.state, "requested"))).orderBy(
    asc(vettings.requestedAt),
  );
}

/** Whose work a notebook is, and how many leads its group has. */
export async function findVettingFacts(db: Db, notebookId: string, groupId: string) {
  const coAuthors = await db
    .select({ userId: notebookShares.userId })
    .from(notebookShares)
    .where(and(eq(notebookShares.notebookId, notebookId), eq(notebookShares.role, "co-author")))
    .limit(1);
  const [notebook] = await db
    .select({ groupRole: notebooks.groupRole })
    .from(notebooks)
    .where(eq(notebooks.id, notebookId));
  const [leads] = await db
    .select({ count: count() })
    .from(groupMembers)
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.role, "lead")));
  return {
    isOwnersAlone: coAuthors.length === 0 && notebook?.groupRole !== "co-author",
    groupLeads: leads?.count ?? 0,
  };
}

/** Leads of a group with their addresses, for letters. */
export async function listLeads(db: Db, groupId: string) {
  return db
    .select({ id: users.id, name: users.name, email: users.email })
    .from(groupMembers)
    .innerJoin(users, eq(users.id, groupMembers.userId))
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.role, "lead")));
}

export type VettingRow = Awaited<ReturnType<typeof selectVettings>>[number];
