/** What can be done to an invitation without an answer: send it again, change its role, take it back. */
import { and, eq, isNull } from "drizzle-orm";
import type { ActName } from "../../shared/schemas/audit";
import type { GroupRole, ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import type { OpenInvitationRow } from "../db/reads/findInvitation";
import { invitations } from "../db/tables/invitations";
import { conflict } from "../errors";
import type { Letter } from "./postLetter";
import { recordAct } from "./recordAct";
import { lapseOf, lockTarget, postInvitation } from "./sendInvitation";

interface Change {
  invitation: OpenInvitationRow;
  actorId: string;
  at: Date;
}

type Changed = Partial<typeof invitations.$inferInsert>;

/** Sends the letter once more, with a new link and new days; the old link opens nothing any more. */
export async function sendInvitationAgain(
  db: Db,
  { tokenHash, letter, ...change }: Change & { tokenHash: string; letter: Letter },
): Promise<void> {
  const { at } = change;
  await apply(db, change, {
    set: { tokenHash, createdAt: at, expiresAt: lapseOf(at) },
    act: { toGroup: "invitation_sent_again", toNotebook: "notebook_invitation_sent_again" },
    andThen: (tx) => postInvitation(tx, letter, at),
  });
}

export async function setInvitedRole(
  db: Db,
  { role, ...change }: Change & { role: GroupRole | ShareRole },
): Promise<void> {
  if (role === change.invitation.role) return;
  await apply(db, change, {
    set: { role },
    act: { toGroup: "invitation_changed", toNotebook: "notebook_invitation_changed" },
    before: change.invitation.role,
  });
}

export async function revokeInvitation(db: Db, change: Change): Promise<void> {
  await apply(db, change, {
    set: { revokedAt: change.at },
    act: { toGroup: "invitation_revoked", toNotebook: "notebook_invitation_revoked" },
  });
}

async function apply(
  db: Db,
  { invitation, actorId, at }: Change,
  what: {
    set: Changed;
    act: { toGroup: ActName; toNotebook: ActName };
    before?: string;
    andThen?: (tx: Db) => Promise<void>;
  },
): Promise<void> {
  const { id, groupId, notebookId } = invitation;
  await db.transaction(async (tx) => {
    const target = await lockTarget(
      tx,
      groupId !== null ? { groupId } : { notebookId: notebookId! },
      actorId,
    );
    const [changed] = await tx
      .update(invitations)
      .set(what.set)
      .where(and(eq(invitations.id, id), isNull(invitations.acceptedAt), isNull(invitations.revokedAt)))
      .returning({ email: invitations.email, role: invitations.role });
    if (!changed) {
      throw conflict(
        "invitation_answered",
        "This invitation was answered or taken back in the meantime. Load the page again to see how things stand.",
      );
    }
    await what.andThen?.(tx);
    await recordAct(tx, {
      ...target,
      at,
      actorId,
      act: target.subject === "group" ? what.act.toGroup : what.act.toNotebook,
      details: {
        with: changed.email,
        role: changed.role,
        ...(what.before === undefined ? {} : { before: what.before }),
      },
    });
  });
}
