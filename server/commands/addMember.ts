import type { GroupRole } from "../../shared/schemas/roles";
import type { Db } from "../db/client";
import { findUserByEmail } from "../db/reads/findUser";
import { groupMembers } from "../db/tables/groupMembers";
import { conflict, invalid } from "../errors";

/** Adds the person with this address, who must have an account, to a group. */
export async function addMember(
  db: Db,
  { groupId, email, role, at }: { groupId: string; email: string; role: GroupRole; at: Date },
): Promise<void> {
  const user = await findUserByEmail(db, email);
  if (!user) {
    const message = "Nobody with this address has an account. Ask them to create one first.";
    throw invalid(message, [{ path: "email", message, code: "no_account" }], "no_account");
  }
  const added = await db
    .insert(groupMembers)
    .values({ groupId, userId: user.id, role, joinedAt: at })
    .onConflictDoNothing()
    .returning({ userId: groupMembers.userId });
  if (added.length > 0) return;
  const message = `${user.name} is in the group already. Change the role in the list of members.`;
  throw conflict("already_member", message, [{ path: "email", message, code: "already_member" }]);
}
