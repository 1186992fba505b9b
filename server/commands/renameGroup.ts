import { eq } from "drizzle-orm";
import type { Db } from "../db/client";
import { groups } from "../db/tables/groups";
import { lockGroup } from "./lockGroup";
import { recordAct } from "./recordAct";

/** Gives a group another name; its code stays. */
export async function renameGroup(
  db: Db,
  { groupId, name, actorId, at }: { groupId: string; name: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const before = (await lockGroup(tx, { groupId, actorId })).name;
    if (before === name) return;
    await tx.update(groups).set({ name }).where(eq(groups.id, groupId));
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "group_renamed",
      subject: "group",
      subjectId: groupId,
      subjectName: name,
      details: { before },
    });
  });
}
