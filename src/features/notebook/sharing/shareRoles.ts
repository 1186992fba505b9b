import type { ShareRole } from "../../../../shared/schemas/roles";

/** Each role by which a notebook is shared, with what it lets one do today, from most to least. */
export const shareRoleOptions: readonly { value: ShareRole; label: string; hint: string }[] = [
  { value: "co-author", label: "co-author", hint: "reads, exports, writes; keeps and restores versions" },
  { value: "commenter", label: "commenter", hint: "reads, exports, duplicates" },
  { value: "reader", label: "reader", hint: "reads, exports, duplicates" },
];

/** "A reader reads, exports, duplicates." */
export function roleSentence(role: ShareRole): string {
  return `A ${role} ${shareRoleOptions.find(({ value }) => value === role)!.hint}.`;
}
