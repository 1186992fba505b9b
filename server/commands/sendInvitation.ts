import { and, eq, isNull } from "drizzle-orm";
import { invitationDays } from "../../shared/schemas/invitations";
import type { GroupRole, ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { findUserByEmail } from "../db/reads/findUser";
import { invitations } from "../db/tables/invitations";
import { conflict } from "../errors";
import { lockGroup } from "./lockGroup";
import { lockNotebook } from "./lockNotebook";
import { postLetter, type Letter } from "./postLetter";
import { recordAct } from "./recordAct";

/** Where an invitation leads, and with which role. */
export type InvitedTo = { groupId: string; role: GroupRole } | { notebookId: string; role: ShareRole };

export interface NewInvitation {
  to: InvitedTo;
  email: string;
  tokenHash: string;
  letter: Letter;
  actorId: string;
  at: Date;
}

/** The moment from which an invitation of this moment is over. */
export const lapseOf = (at: Date): Date => new Date(at.getTime() + invitationDays * 86_400_000);

/**
 * Invites an address to a group or a notebook, with the letter that tells of it.
 *
 * @throws AppError if the address is in the group or invited already, or takes no such letters
 */
export async function sendInvitation(db: Db, invitation: NewInvitation): Promise<void> {
  const { to, email, tokenHash, letter, actorId, at } = invitation;
  await db.transaction(async (tx) => {
    const target = await lockTarget(tx, to, actorId);
    if ("groupId" in to) await refuseMember(tx, to.groupId, email);
    await makeRoom(tx, { to, email, at });
    await tx.insert(invitations).values({
      ...to,
      email,
      tokenHash,
      invitedBy: actorId,
      createdAt: at,
      expiresAt: lapseOf(at),
    });
    await postInvitation(tx, letter, at);
    await recordAct(tx, {
      ...target,
      at,
      actorId,
      act: "groupId" in to ? "invitation_sent" : "notebook_invitation_sent",
      details: { with: email, role: to.role },
    });
  });
}

/** What an invitation leads to, locked, as a line of the trail names it. */
export async function lockTarget(
  tx: Db,
  to: { groupId: string } | { notebookId: string },
  actorId: string,
): Promise<{
  groupId: string | null;
  subject: "group" | "notebook";
  subjectId: string;
  subjectName: string;
}> {
  if ("groupId" in to) {
    const { name } = await lockGroup(tx, { groupId: to.groupId, actorId });
    return { groupId: to.groupId, subject: "group", subjectId: to.groupId, subjectName: name };
  }
  const { groupId, title } = await lockNotebook(tx, { notebookId: to.notebookId, ownerId: actorId });
  return { groupId, subject: "notebook", subjectId: to.notebookId, subjectName: title };
}

/** @throws AppError if the person has switched such letters off: without the letter nobody can answer */
export async function postInvitation(tx: Db, letter: Letter, at: Date): Promise<void> {
  if (await postLetter(tx, letter, at)) return;
  const message =
    "This person takes no invitations by e-mail. Ask them to switch the letters on, on their account page.";
  throw conflict("mail_switched_off", message, [{ path: "email", message, code: "mail_switched_off" }]);
}

async function refuseMember(tx: Db, groupId: string, email: string): Promise<void> {
  const user = await findUserByEmail(tx, email);
  if (!user || !(await findMembership(tx, groupId, user.id))) return;
  const message = `${user.name} is in the group already. Change the role in the list of members.`;
  throw conflict("already_member", message, [{ path: "email", message, code: "already_member" }]);
}

/** An address has one open invitation to a place. A lapsed one makes room; one that can be answered does not. */
async function makeRoom(
  tx: Db,
  { to, email, at }: { to: InvitedTo; email: string; at: Date },
): Promise<void> {
  const [open] = await tx
    .select({ id: invitations.id, expiresAt: invitations.expiresAt })
    .from(invitations)
    .where(
      and(
        "groupId" in to ? eq(invitations.groupId, to.groupId) : eq(invitations.notebookId, to.notebookId),
        eq(invitations.email, email),
        isNull(invitations.acceptedAt),
        isNull(invitations.revokedAt),
      ),
    );
  if (!open) return;
  if (open.expiresAt > at) {
    const message = `${email} is invited already and has not answered yet. Send the letter again, or take it back.`;
    throw conflict("already_invited", message, [{ path: "email", message, code: "already_invited" }]);
  }
  await tx.update(invitations).set({ revokedAt: at }).where(eq(invitations.id, open.id));
}
