import type { HeadlineItem } from "../../../../shared/notebook/summary";
import { formatQuantity, kilometreScale, type UnitSystem } from "../../../lib/format";
import { Rich } from "../../../lib/Rich";

interface HeadlineProps {
  items: readonly HeadlineItem[];
  unitSystem: UnitSystem;
  /** Numbers that are being computed anew are not shown. */
  isLate: boolean;
}

/** Up to three numbers under the title, each with its convention. */
export function Headline({ items, unitSystem, isLate }: HeadlineProps) {
  if (items.length === 0) return null;
  return (
    <dl className="headline" aria-busy={isLate} data-late={isLate || undefined}>
      {items.map((item) => (
        <div key={item.name}>
          <dt>{item.label}</dt>
          <dd className="headline-number">
            <HeadlineNumber item={item} unitSystem={unitSystem} />
          </dd>
          <dd className="headline-note">{item.note}</dd>
        </div>
      ))}
    </dl>
  );
}

/** A number of the headline with its unit, set smaller. */
export function HeadlineNumber({ item, unitSystem }: { item: HeadlineItem; unitSystem: UnitSystem }) {
  if (typeof item.value === "string") return item.value;
  const isAltitude = item.unit === "m";
  const { number, unit } = formatQuantity(
    { value: item.value, log10: item.log10, unit: item.unit },
    unitSystem,
    isAltitude ? { scale: kilometreScale } : { digits: 2 },
  );
  return (
    <>
      <Rich text={number} />{" "}
      {unit.length > 0 && (
        <small>
          <Rich text={unit} />
        </small>
      )}
    </>
  );
}
