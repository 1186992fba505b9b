import type { HeadlineItem } from "../../../../shared/notebook/summary";
import {
  displayScale,
  formatQuantity,
  formatUnit,
  kilometreScale,
  quantityText,
  thinSpace,
  type DisplayScale,
  type FormattedQuantity,
  type UnitSystem,
} from "../../../lib/format";
import {
  formatSpread,
  formatUncertain,
  scaleSpread,
  type FormattedSpread,
  type NumberSpread,
} from "../../../lib/formatSpread";
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
          <dd className="headline-note">
            <HeadlineNote item={item} unitSystem={unitSystem} />
          </dd>
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

const scaleOf = (unit: string, value: number, unitSystem: UnitSystem): DisplayScale =>
  unit === "m" ? kilometreScale : displayScale(unit, unitSystem, value);

function headlineSpread(
  { unit, spread }: { unit: string; spread: NumberSpread },
  value: number,
  unitSystem: UnitSystem,
): FormattedSpread {
  const { factor } = scaleOf(unit, value, unitSystem);
  return formatSpread(value * factor, scaleSpread(spread, factor));
}

/** The convention; where a spread watches the number, whose draws it rests on, and what does not fit beside it. */
function HeadlineNote({ item, unitSystem }: HeadlineNumberProps) {
  const { note, spread, value, unit } = item;
  if (!spread || typeof value !== "number") return note;
  const shown = headlineSpread({ unit, spread }, value, unitSystem);
  const scale = scaleOf(unit, value, unitSystem);
  return (
    <>
      {note};{" "}
      {!shown.isShort && (
        <>
          <Rich text={shown.alone} /> <Rich text={formatUnit(scale.unit)} />,{" "}
        </>
      )}
      68{thinSpace}% by <i>{spread.cell}</i>
      {spread.isPartial && ", stopped early"}
    </>
  );
}

function headlineQuantity(
  { log10, unit, spread }: HeadlineItem,
  value: number | null,
  unitSystem: UnitSystem,
): FormattedQuantity {
  const manner = unit === "m" ? { scale: kilometreScale } : { digits: 2 };
  const plain = formatQuantity({ value, log10, unit }, unitSystem, manner);
  if (value === null || !spread || !headlineSpread({ unit, spread }, value, unitSystem).isShort) return plain;
  return formatUncertain({ value, log10, unit }, spread, unitSystem, manner);
}
