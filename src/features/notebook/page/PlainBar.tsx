import { Link } from "react-router-dom";
import { Mark } from "../../../ui/Mark";

/** The bar where there is no notebook to speak of, or only its title. */
export function PlainBar({ title, children }: { title?: string; children?: React.ReactNode }) {
  return (
    <header className="notebook-bar" data-print="never">
      <Link to="/notebooks" className="flex-none" aria-label="All notebooks">
        <Mark size={28} />
      </Link>
      {title && <span className="notebook-bar-title">{title}</span>}
      <span className="notebook-bar-space" />
      {children}
    </header>
  );
}
