import type { GroupResponse, GroupSummary } from "../../shared/schemas/groups";
import type { GroupMemberRow, GroupRow } from "../db/reads/findGroup";
import type { Actor } from "../policies/actor";
import { groupAbilitiesOf } from "../policies/groupPolicy";

export function presentGroupSummary(row: GroupRow, actor: Actor): GroupSummary {
  if (row.actorRole === null) throw new Error(`Group ${row.id} was presented to someone outside`);
  return {
    id: row.id,
    name: row.name,
    code: row.code,
    role: row.actorRole,
    members: row.members,
    abilities: groupAbilitiesOf(actor, row),
  };
}

export function presentGroup(row: GroupRow, members: GroupMemberRow[], actor: Actor): GroupResponse {
  return {
    ...presentGroupSummary(row, actor),
    foundedAt: row.createdAt.toISOString(),
    memberList: members.map(({ userId, name, role, joinedAt }) => ({
      user: { id: userId, name },
      role,
      joinedAt: joinedAt.toISOString(),
    })),
  };
}
