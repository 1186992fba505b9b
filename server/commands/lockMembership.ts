import { and, count, eq } from "drizzle-orm";
import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { groupMembers } from "../db/tables/groupMembers";
import { groups } from "../db/tables/groups";
import { conflict, notFound } from "../errors";

/**
 * The role of a member, with the group's row locked so that two leads cannot step down past one another.
 * Call it first in a transaction that takes the role away.
 *
 * @throws AppError if the person is no member, or the last lead
 */
export async function lockMembership(
  tx: Db,
  { groupId, userId, newRole }: { groupId: string; userId: string; newRole: GroupRole | null },
): Promise<GroupRole> {
  await tx.select({ id: groups.id }).from(groups).where(eq(groups.id, groupId)).for("update");
  const role = await findMembership(tx, groupId, userId);
  if (!role) throw notFound("member");
  if (role !== "lead" || newRole === "lead") return role;

  const [others] = await tx
    .select({ leads: count() })
    .from(groupMembers)
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.role, "lead")));
  if (others && others.leads > 1) return role;
  throw conflict("last_lead", "A group keeps at least one lead. Make someone else a lead first.");
}
