import type { GroupSummary } from "../../../shared/schemas/groups";
import { RadioLine } from "../../ui/RadioLine";

/** Stands for one's own shelf among the ids of groups. */
export const ownShelf = "own";

interface WhereFieldProps {
  groups: readonly GroupSummary[];
  value: string;
  onChange: (value: string) => void;
}

/** Where a new notebook stands: on one's own shelf or in a group in which one may write. */
export function WhereField({ groups, value, onChange }: WhereFieldProps) {
  const open = groups.filter((group) => group.abilities.createNotebook);
  if (open.length === 0) return null;
  const options = [
    { value: ownShelf, label: "my own shelf" },
    ...open.map((group) => ({ value: group.id, label: group.name })),
  ];
  return (
    <div>
      <div className="pb-3 type-label text-ink2">Where it stands</div>
      <RadioLine label="Where it stands" value={value} options={options} onChange={onChange} />
      <p className="pt-4 type-label text-ink3">It is yours alone in either place, until it is shared.</p>
    </div>
  );
}
