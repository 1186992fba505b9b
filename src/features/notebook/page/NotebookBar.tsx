import { Link } from "react-router-dom";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { UnitSystem } from "../../../lib/format";
import { Mark } from "../../../ui/Mark";
import { TwoWay } from "../../../ui/TwoWay";

interface NotebookBarProps {
  title: string;
  /** Who may see it, in words; or which version this is. */
  about: React.ReactNode;
  /** Who else has it open. */
  others?: React.ReactNode;
  status: React.ReactNode;
  unitSystem: UnitSystem;
  onUnitSystem: (system: UnitSystem) => void;
  /** Verbs: the main one, then the menu. */
  acts: React.ReactNode;
}

const unitOptions: readonly { value: NotebookDocument["unitSystem"]; label: string }[] = [
  { value: "SI", label: "SI" },
  { value: "cgs", label: "cgs" },
];

/** The bar of a notebook: which it is, who sees it, whether it is saved, and what can be done with it as a whole. */
export function NotebookBar({
  title,
  about,
  others,
  status,
  unitSystem,
  onUnitSystem,
  acts,
}: NotebookBarProps) {
  return (
    <header className="notebook-bar" data-print="never">
      <Link to="/notebooks" className="flex-none" aria-label="All notebooks">
        <Mark size={28} />
      </Link>
      <span className="notebook-bar-title">{title}</span>
      <span className="notebook-bar-about">{about}</span>
      <span className="notebook-bar-space" />
      {others}
      {status}
      <TwoWay
        className="notebook-bar-units"
        label="Units"
        value={unitSystem}
        options={unitOptions}
        onChange={onUnitSystem}
      />
      {acts}
    </header>
  );
}
