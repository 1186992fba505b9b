/** What can be done to a share with one person: change its role, take it back, give it up. */
import { and, eq } from "drizzle-orm";
import type { ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { notebooks } from "../db/tables/notebooks";
import { notebookShares } from "../db/tables/notebookShares";
import { users } from "../db/tables/users";
import { notFound } from "../errors";
import { lockNotebook } from "./lockNotebook";
import { recordAct } from "./recordAct";

interface ShareChange {
  notebookId: string;
  userId: string;
  actorId: string;
  at: Date;
}

const ofShare = ({ notebookId, userId }: ShareChange) =>
  and(eq(notebookShares.notebookId, notebookId), eq(notebookShares.userId, userId));

/** @throws AppError if the notebook is not shared with this person */
async function findShare(tx: Db, change: ShareChange): Promise<{ role: ShareRole; name: string }> {
  const [share] = await tx
    .select({ role: notebookShares.role, name: users.name })
    .from(notebookShares)
    .innerJoin(users, eq(users.id, notebookShares.userId))
    .where(ofShare(change));
  if (!share) throw notFound("share");
  return share;
}

export async function setShareRole(
  db: Db,
  { role, ...change }: ShareChange & { role: ShareRole },
): Promise<void> {
  const { notebookId, actorId, at } = change;
  await db.transaction(async (tx) => {
    const { groupId, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    const before = await findShare(tx, change);
    if (before.role === role) return;
    await tx.update(notebookShares).set({ role }).where(ofShare(change));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "share_changed",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
      details: { with: before.name, role, before: before.role },
    });
  });
}

export async function takeBackShare(db: Db, change: ShareChange): Promise<void> {
  const { notebookId, actorId, at } = change;
  await db.transaction(async (tx) => {
    const { groupId, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    const { role, name } = await findShare(tx, change);
    await tx.delete(notebookShares).where(ofShare(change));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "share_taken_back",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
      details: { with: name, before: role },
    });
  });
}

/** Gives up one's own share in another's notebook. */
export async function giveUpShare(
  db: Db,
  { notebookId, actorId, at }: Omit<ShareChange, "userId">,
): Promise<void> {
  const change = { notebookId, userId: actorId, actorId, at };
  await db.transaction(async (tx) => {
    const { role } = await findShare(tx, change);
    const [notebook] = await tx
      .select({ groupId: notebooks.groupId, title: notebooks.title })
      .from(notebooks)
      .where(eq(notebooks.id, notebookId));
    await tx.delete(notebookShares).where(ofShare(change));
    await recordAct(tx, {
      at,
      groupId: notebook!.groupId,
      actorId,
      act: "share_given_up",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: notebook!.title,
      details: { before: role },
    });
  });
}
