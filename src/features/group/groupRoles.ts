import type { GroupRole } from "../../../shared/schemas/roles";

/** Each role of a group with what it may do today, from most to least. */
export const groupRoleOptions: readonly { value: GroupRole; label: string; hint: string }[] = [
  {
    value: "lead",
    label: "lead",
    hint: "invites, sets roles, removes; sees what has happened; writes notebooks here",
  },
  {
    value: "researcher",
    label: "researcher",
    hint: "writes notebooks here; sees members and what is shared with the group",
  },
  {
    value: "guest",
    label: "guest",
    hint: "sees members and what is shared with the group; writes nothing here",
  },
];
