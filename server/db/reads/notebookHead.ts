/** What a list and a page both need of a notebook: all but its document, with what decides about the actor. */
import { and, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { groupMembers } from "../tables/groupMembers";
import { groups } from "../tables/groups";
import { notebooks } from "../tables/notebooks";
import { notebookShares } from "../tables/notebookShares";
import { users } from "../tables/users";

export const owner = alias(users, "owner");

export const notebookHeadColumns = {
  id: notebooks.id,
  title: notebooks.title,
  ownerId: notebooks.ownerId,
  ownerName: owner.name,
  groupId: notebooks.groupId,
  groupName: groups.name,
  groupCode: groups.code,
  groupRole: notebooks.groupRole,
  /** Of the actor in person. */
  shareRole: notebookShares.role,
  actorGroupRole: groupMembers.role,
  revision: notebooks.revision,
  savedAt: notebooks.savedAt,
  lastVersion: notebooks.lastVersion,
  archivedAt: notebooks.archivedAt,
  deletedAt: notebooks.deletedAt,
};

/** Conditions of the joins that bring in the actor's share and membership. */
export const shareOf = (actorId: string) =>
  and(eq(notebookShares.notebookId, notebooks.id), eq(notebookShares.userId, actorId));

export const membershipOf = (actorId: string) =>
  and(eq(groupMembers.groupId, notebooks.groupId), eq(groupMembers.userId, actorId));
