import type { HeadlineItem } from "../../../shared/notebook/summary";
import { formatGas, formatQuantity, resultScale } from "../../lib/format";
import { formatSpread, scaleSpread } from "../../lib/formatSpread";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";

/** One number of a notebook's headline, small enough for a list. Lists speak SI. */
export function HeadlineValue({ item }: { item: HeadlineItem }) {
  return (
    <div className="min-w-0 only:col-span-2">
      <div className="truncate font-sans text-[12.5px]/[17px] text-ink2" title={item.note || undefined}>
        {item.label}
      </div>
      <div className="font-serif text-[18px]/[26px] tabular-nums">
        {item.gas && <GasSample gas={item.gas} />}
        {typeof item.value === "string" ? (
          <span className="text-[15px]/[20px] text-ink2">{item.value}</span>
        ) : (
          <HeadlineNumber item={item} value={item.value} />
        )}
      </div>
    </div>
  );
}

function HeadlineNumber({ item, value }: { item: HeadlineItem; value: number | null }) {
  if (value === null && item.log10 === null) return <span className="text-ink3">—</span>;
  const scale = resultScale(item.name, item.unit, "SI", value ?? 0);
  const { number, unit } = formatQuantity({ value, log10: item.log10, unit: item.unit }, "SI", {
    digits: 2,
    scale,
  });
  const spread =
    item.spread && value !== null
      ? formatSpread(value * scale.factor, scaleSpread(item.spread, scale.factor))
      : null;
  if (spread)
    return (
      <span title={`68 % by ${item.spread!.cell}${item.spread!.isPartial ? ", stopped early" : ""}`}>
        <span className="whitespace-nowrap">
          <Rich text={spread.isShort ? spread.whole : number} />{" "}
          <small className="text-[14px] text-ink2">
            <Rich text={unit} />
          </small>
        </span>
        {!spread.isShort && (
          <small className="block text-[12.5px]/[17px] text-ink2">
            <Rich text={spread.alone} />
          </small>
        )}
      </span>
    );
  return (
    <span className="whitespace-nowrap">
      <Rich text={number} />{" "}
      <small className="text-[14px] text-ink2">
        <Rich text={unit} />
      </small>
    </span>
  );
}

/** A short length of the gas's curve, then its formula. */
function GasSample({ gas }: { gas: string }) {
  const style = gasStyle(gas);
  return (
    <span className="mr-8 whitespace-nowrap">
      <svg
        className="mr-7 inline-block align-[.18em]"
        width="21"
        height="8"
        viewBox="0 0 21 8"
        aria-hidden="true"
      >
        <line
          x2="21"
          y1="4"
          y2="4"
          style={{ stroke: style.colour }}
          strokeWidth={style.width}
          strokeDasharray={style.dash}
        />
      </svg>
      <Rich text={formatGas(gas)} />
    </span>
  );
}
