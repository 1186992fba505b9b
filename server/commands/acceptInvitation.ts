import { and, eq, isNull } from "drizzle-orm";
import type { AcceptedInvitation } from "../../shared/schemas/invitations";
import type { GroupRole, ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { groups } from "../db/tables/groups";
import { invitations } from "../db/tables/invitations";
import { notebooks } from "../db/tables/notebooks";
import { notebookShares } from "../db/tables/notebookShares";
import {
  invitationForAnother,
  invitationLapsed,
  invitationRevoked,
  invitationUnknown,
  invitationUsed,
} from "../errors";
import { addMember } from "./addMember";
import { recordAct } from "./recordAct";

type Invitation = typeof invitations.$inferSelect;

/**
 * Accepts the invitation with this token, for the person whose address it is for. It is good once: its row is locked,
 * so that of two who use it at once the second finds it used.
 *
 * @throws AppError if there is none, or it is used, taken back, over, or for another address
 */
export async function acceptInvitation(
  db: Db,
  { tokenHash, user, at }: { tokenHash: string; user: { id: string; email: string }; at: Date },
): Promise<AcceptedInvitation> {
  return db.transaction(async (tx) => {
    const [invitation] = await tx
      .select()
      .from(invitations)
      .where(eq(invitations.tokenHash, tokenHash))
      .for("update");
    if (!invitation) throw invitationUnknown();
    refuseClosed(invitation, at);
    if (invitation.email !== user.email) throw invitationForAnother(invitation.email);

    const accepted =
      invitation.groupId !== null
        ? await joinGroup(tx, { invitation, groupId: invitation.groupId, userId: user.id, at })
        : await openNotebook(tx, { invitation, notebookId: invitation.notebookId!, userId: user.id, at });
    await tx.update(invitations).set({ acceptedAt: at }).where(eq(invitations.id, invitation.id));
    return accepted;
  });
}

/** @throws AppError if the invitation cannot be answered any more, with the reason */
export function refuseClosed(
  { acceptedAt, revokedAt, expiresAt }: Pick<Invitation, "acceptedAt" | "revokedAt" | "expiresAt">,
  at: Date,
): void {
  if (acceptedAt !== null) throw invitationUsed();
  if (revokedAt !== null) throw invitationRevoked();
  if (expiresAt <= at) throw invitationLapsed();
}

interface Acceptance {
  invitation: Invitation;
  userId: string;
  at: Date;
}

async function joinGroup(
  tx: Db,
  { invitation, groupId, userId, at }: Acceptance & { groupId: string },
): Promise<AcceptedInvitation> {
  const [group] = await tx.select({ name: groups.name }).from(groups).where(eq(groups.id, groupId));
  await addMember(tx, { groupId, userId, role: invitation.role as GroupRole, at });
  await recordAct(tx, {
    at,
    groupId,
    actorId: userId,
    act: "invitation_accepted",
    subject: "group",
    subjectId: groupId,
    subjectName: group!.name,
    details: { role: invitation.role },
  });
  return { to: "group", id: groupId };
}

async function openNotebook(
  tx: Db,
  { invitation, notebookId, userId, at }: Acceptance & { notebookId: string },
): Promise<AcceptedInvitation> {
  const [notebook] = await tx
    .select({ title: notebooks.title, groupId: notebooks.groupId, ownerId: notebooks.ownerId })
    .from(notebooks)
    .where(and(eq(notebooks.id, notebookId), isNull(notebooks.deletedAt)))
    .for("update");
  if (!notebook) throw invitationRevoked();
  if (notebook.ownerId !== userId) {
    await tx
      .insert(notebookShares)
      .values({ notebookId, userId, role: invitation.role as ShareRole, createdAt: at })
      .onConflictDoNothing();
  }
  await recordAct(tx, {
    at,
    groupId: notebook.groupId,
    actorId: userId,
    act: "notebook_invitation_accepted",
    subject: "notebook",
    subjectId: notebookId,
    subjectName: notebook.title,
    details: { role: invitation.role },
  });
  return { to: "notebook", id: notebookId };
}
