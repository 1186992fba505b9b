import { and, count, eq } from "drizzle-orm";
import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { findMembership } from "../db/reads/findGroup";
import { groupMembers } from "../db/tables/groupMembers";
import { users } from "../db/tables/users";
import { conflict, notFound } from "../errors";
import { lockGroup, lockGroupRow } from "./lockGroup";

/**
 * The role and the name of a member, with the group's row locked so that two leads cannot step down past one another.
 * Call it first in a transaction that takes the role away.
 *
 * @throws AppError if the person is no member, or the last lead; or if the actor, changing another's part, is no lead
 */
export async function lockMembership(
  tx: Db,
  {
    groupId,
    userId,
    newRole,
    actorId,
  }: { groupId: string; userId: string; newRole: GroupRole | null; actorId: string },
): Promise<{ role: GroupRole; name: string }> {
  if (actorId === userId && newRole === null) await lockGroupRow(tx, groupId);
  else await lockGroup(tx, { groupId, actorId });
  const role = await findMembership(tx, groupId, userId);
  if (!role) throw notFound("member");
  const [user] = await tx.select({ name: users.name }).from(users).where(eq(users.id, userId));
  const membership = { role, name: user!.name };
  if (role !== "lead" || newRole === "lead") return membership;

  const [others] = await tx
    .select({ leads: count() })
    .from(groupMembers)
    .where(and(eq(groupMembers.groupId, groupId), eq(groupMembers.role, "lead")));
  if (others && others.leads > 1) return membership;
  throw conflict("last_lead", "A group keeps at least one lead. Make someone else a lead first.");
}
