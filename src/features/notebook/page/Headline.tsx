import type { HeadlineItem } from "../../../../shared/notebook/summary";
import {
  formatQuantity,
  kilometreScale,
  quantityText,
  type FormattedQuantity,
  type UnitSystem,
} from "../../../lib/format";
import { Rich } from "../../../lib/Rich";
import { ExplainNumber } from "../../../ui/tables/ExplainNumber";

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
            <ExplainedNumber item={item} unitSystem={unitSystem} />
          </dd>
          <dd className="headline-note">{item.note}</dd>
        </div>
      ))}
    </dl>
  );
}

interface HeadlineNumberProps {
  item: HeadlineItem;
  unitSystem: UnitSystem;
}

function ExplainedNumber({ item, unitSystem }: HeadlineNumberProps) {
  const number = <HeadlineNumber item={item} unitSystem={unitSystem} />;
  if (typeof item.value === "string") return number;
  const cut = item.name.indexOf(".");
  const place = { cell: item.name.slice(0, Math.max(0, cut)), name: item.name.slice(cut + 1) };
  return (
    <ExplainNumber place={place} spoken={quantityText(headlineQuantity(item, item.value, unitSystem))}>
      {number}
    </ExplainNumber>
  );
}

/** A number of the headline with its unit, set smaller. */
export function HeadlineNumber({ item, unitSystem }: HeadlineNumberProps) {
  if (typeof item.value === "string") return item.value;
  const { number, unit } = headlineQuantity(item, item.value, unitSystem);
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

function headlineQuantity(
  { log10, unit }: HeadlineItem,
  value: number | null,
  unitSystem: UnitSystem,
): FormattedQuantity {
  const manner = unit === "m" ? { scale: kilometreScale } : { digits: 2 };
  return formatQuantity({ value, log10, unit }, unitSystem, manner);
}
