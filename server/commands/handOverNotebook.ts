import { and, eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { notebooks } from "../db/tables/notebooks";
import { notebookShares } from "../db/tables/notebookShares";
import { users } from "../db/tables/users";
import { conflict, notFound } from "../errors";
import { lockNotebook } from "./lockNotebook";
import { recordAct } from "./recordAct";

/**
 * Makes another person the owner; the one before stays as a co-author. It goes to someone whom it is shared with, or
 * who may write notebooks in its group.
 *
 * @throws AppError if the person has no such tie, or may not have notebooks in its group
 */
export async function handOverNotebook(
  db: Db,
  { notebookId, userId, actorId, at }: { notebookId: string; userId: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { groupId, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    const heir = await findTied(tx, { notebookId, groupId, userId });
    if (!heir || userId === actorId) throw notFound("person who may take this notebook over");
    if (groupId !== null && heir.groupRole !== "lead" && heir.groupRole !== "researcher") {
      throw conflict(
        "not_in_group",
        `${heir.name} may not have notebooks in this group. Move the notebook to your own shelf first.`,
      );
    }
    await tx.update(notebooks).set({ ownerId: userId }).where(eq(notebooks.id, notebookId));
    await tx
      .delete(notebookShares)
      .where(and(eq(notebookShares.notebookId, notebookId), eq(notebookShares.userId, userId)));
    await tx.insert(notebookShares).values({ notebookId, userId: actorId, role: "co-author", createdAt: at });
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "notebook_handed_over",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
      details: { with: heir.name },
    });
  });
}

async function findTied(
  tx: Db,
  { notebookId, groupId, userId }: { notebookId: string; groupId: string | null; userId: string },
) {
  const [person] = await tx
    .select({ name: users.name, shareRole: notebookShares.role })
    .from(users)
    .leftJoin(
      notebookShares,
      and(eq(notebookShares.notebookId, notebookId), eq(notebookShares.userId, users.id)),
    )
    .where(eq(users.id, userId));
  if (!person) return null;
  const groupRole = groupId === null ? undefined : await findMembership(tx, groupId, userId);
  return person.shareRole !== null || groupRole ? { name: person.name, groupRole } : null;
}
