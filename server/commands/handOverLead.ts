import type { Db } from "../db/client";
import { conflict } from "../errors";
import { lockMembership } from "./lockMembership";
import { recordAct } from "./recordAct";
import { storeRole } from "./setMemberRole";

/** Makes another member lead in the actor's place, who stays as a researcher. */
export async function handOverLead(
  db: Db,
  { groupId, userId, actorId, at }: { groupId: string; userId: string; actorId: string; at: Date },
): Promise<void> {
  await db.transaction(async (tx) => {
    const { role, name } = await lockMembership(tx, { groupId, userId, newRole: "lead", actorId });
    if (role === "lead") {
      const message = `${name} is a lead already. To stop being one yourself, change your own role.`;
      throw conflict("already_lead", message);
    }
    await storeRole(tx, { groupId, userId, role: "lead" });
    await storeRole(tx, { groupId, userId: actorId, role: "researcher" });
    await recordAct(tx, {
      at,
      groupId,
      actorId,
      act: "lead_handed_over",
      subject: "person",
      subjectId: userId,
      subjectName: name,
      details: { before: role },
    });
  });
}
