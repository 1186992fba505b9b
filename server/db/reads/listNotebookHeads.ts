import { eq, inArray } from "drizzle-orm";
import type { Db } from "../client";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { membershipOf, notebookHeadColumns, owner, shareOf } from "./notebookHead";

/** The heads of these notebooks, in the bin or not, for the policy to say which of them the actor may see. */
export async function listNotebookHeads(db: Db, ids: readonly string[], actorId: string) {
  if (ids.length === 0) return [];
  return db
    .select(notebookHeadColumns)
    .from(notebooks)
    .innerJoin(owner, eq(owner.id, notebooks.ownerId))
    .leftJoin(groups, eq(groups.id, notebooks.groupId))
    .leftJoin(notebookShares, shareOf(actorId))
    .leftJoin(groupMembers, membershipOf(actorId))
    .where(inArray(notebooks.id, [...ids]));
}
