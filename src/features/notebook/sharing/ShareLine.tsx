import type { ShareRole } from "../../../../shared/schemas/roles";
import { WordMenu } from "../../../ui/WordMenu";
import { shareRoleOptions } from "./shareRoles";

interface ShareLineProps {
  name: string;
  about: React.ReactNode;
  role: ShareRole | "owner" | null;
  /** null where the role is not this person's to change. */
  onRole: ((role: ShareRole) => void) | null;
  /** Verbs, at the end. */
  acts?: React.ReactNode;
}

/** One line of who may see a notebook: who, by which role, and what can be done about it. */
export function ShareLine({ name, about, role, onRole, acts }: ShareLineProps) {
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-18 gap-y-4 py-9 mid:grid-cols-[minmax(0,1fr)_130px_160px]">
      <span className="col-span-2 min-w-0 mid:col-span-1">
        <span className="block font-serif text-[18px]/[25px] [overflow-wrap:anywhere]">{name}</span>
        <span className="block type-meta text-ink2">{about}</span>
      </span>
      <span className="font-sans text-[15px]/[24px]">
        {onRole && role !== "owner" && role !== null ? (
          <WordMenu
            label={`Role of ${name}`}
            value={role}
            options={shareRoleOptions}
            onChange={(next) => next !== role && onRole(next)}
          />
        ) : (
          role
        )}
      </span>
      <span className="flex flex-wrap justify-end gap-x-18 gap-y-2">{acts}</span>
    </li>
  );
}
