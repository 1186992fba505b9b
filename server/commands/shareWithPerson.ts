import type { ShareRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { notebookShares } from "../db/tables/notebookShares";
import { conflict } from "../errors";
import { lockNotebook } from "./lockNotebook";
import { postLetter, type Letter } from "./postLetter";
import { recordAct } from "./recordAct";

/**
 * Shares a notebook with a person who has an account, and tells them by a letter, if they want such letters.
 *
 * @throws AppError if it is shared with them already
 */
export async function shareWithPerson(
  db: Db,
  share: {
    notebookId: string;
    user: { id: string; name: string };
    role: ShareRole;
    letter: Letter | null;
    actorId: string;
    at: Date;
  },
): Promise<void> {
  const { notebookId, user, role, letter, actorId, at } = share;
  await db.transaction(async (tx) => {
    const { groupId, title } = await lockNotebook(tx, { notebookId, ownerId: actorId });
    const added = await tx
      .insert(notebookShares)
      .values({ notebookId, userId: user.id, role, createdAt: at })
      .onConflictDoNothing()
      .returning({ userId: notebookShares.userId });
    if (added.length === 0) {
      const message = `${user.name} has this notebook already. Change the role in the list.`;
      throw conflict("already_shared", message, [{ path: "email", message, code: "already_shared" }]);
    }
    if (letter) await postLetter(tx, letter, at);
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "notebook_shared",
      subject: "notebook",
      subjectId: notebookId,
      subjectName: title,
      details: { with: user.name, role },
    });
  });
}
