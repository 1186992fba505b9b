import type { Db } from "../db/client";
import { groupMembers } from "../db/tables/groupMembers";
import { groups } from "../db/tables/groups";
import { conflict } from "../errors";
import { recordAct } from "./recordAct";

/** Founds a group whose first lead is the founder. */
export async function createGroup(
  db: Db,
  { name, code, founderId, at }: { name: string; code: string; founderId: string; at: Date },
): Promise<{ id: string }> {
  return db.transaction(async (tx) => {
    const [group] = await tx
      .insert(groups)
      .values({ name, code, createdAt: at })
      .onConflictDoNothing({ target: groups.code })
      .returning({ id: groups.id });
    if (!group) {
      const message = `Another group has the code ${code}. Choose another; it stands in each reference and stays.`;
      throw conflict("code_taken", message, [{ path: "code", message, code: "code_taken" }]);
    }
    await tx
      .insert(groupMembers)
      .values({ groupId: group.id, userId: founderId, role: "lead", joinedAt: at });
    await recordAct(tx, {
      at,
      groupId: group.id,
      actorId: founderId,
      act: "group_founded",
      subject: "group",
      subjectId: group.id,
      subjectName: name,
    });
    return group;
  });
}
