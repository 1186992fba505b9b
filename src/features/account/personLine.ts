import type { GroupSummary } from "../../../shared/schemas/groups";

/** Who is signed in, as the bar says it: the name, and the group where there is but one. */
export function personLine(name: string, groups: readonly Pick<GroupSummary, "name" | "role">[]): string {
  const [group] = groups;
  if (groups.length !== 1 || !group) return name;
  return group.role === "lead" ? `${name}, lead of ${group.name}` : `${name}, ${group.name}`;
}
