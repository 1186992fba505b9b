import { and, asc, eq, isNull } from "drizzle-orm";
import type { Db } from "../client";
import { groups } from "../tables/groups";
import { invitations } from "../tables/invitations";
import { notebooks } from "../tables/notebooks";
import { users } from "../tables/users";

const columns = {
  id: invitations.id,
  groupId: invitations.groupId,
  notebookId: invitations.notebookId,
  email: invitations.email,
  role: invitations.role,
  invitedById: invitations.invitedBy,
  invitedByName: users.name,
  createdAt: invitations.createdAt,
  expiresAt: invitations.expiresAt,
};

type Place = { groupId: string } | { notebookId: string };

const openIn = (place: Place) =>
  and(
    "groupId" in place
      ? eq(invitations.groupId, place.groupId)
      : eq(invitations.notebookId, place.notebookId),
    isNull(invitations.acceptedAt),
    isNull(invitations.revokedAt),
  );

/** Invitations to a place that have no answer yet, lapsed ones too, by address. */
export async function listOpenInvitations(db: Db, place: Place) {
  return db
    .select(columns)
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.invitedBy))
    .where(openIn(place))
    .orderBy(asc(invitations.email));
}

export type OpenInvitationRow = Awaited<ReturnType<typeof listOpenInvitations>>[number];

/** One of them; undefined also where it leads to another place. */
export async function findOpenInvitation(
  db: Db,
  id: string,
  place: Place,
): Promise<OpenInvitationRow | undefined> {
  const [invitation] = await db
    .select(columns)
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.invitedBy))
    .where(and(eq(invitations.id, id), openIn(place)));
  return invitation;
}

/** The invitation whose link has this token, whatever has become of it. */
export async function findInvitationByToken(db: Db, tokenHash: string) {
  const [invitation] = await db
    .select({
      ...columns,
      groupName: groups.name,
      notebookTitle: notebooks.title,
      acceptedAt: invitations.acceptedAt,
      revokedAt: invitations.revokedAt,
    })
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.invitedBy))
    .leftJoin(groups, eq(groups.id, invitations.groupId))
    .leftJoin(notebooks, eq(notebooks.id, invitations.notebookId))
    .where(eq(invitations.tokenHash, tokenHash));
  return invitation;
}

export type InvitationRow = NonNullable<Awaited<ReturnType<typeof findInvitationByToken>>>;
