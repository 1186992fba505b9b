import type { CellResult } from "../../../shared/notebook/result";
import { formatNumber, quantityRich, resultScale, unitSpace, type UnitSystem } from "../../lib/format";
import { formatSpread, formatUncertain, numberSpread, scaleSpread } from "../../lib/formatSpread";
import { Rich } from "../../lib/Rich";
import { plainText, type RichText } from "../../lib/richText";
import { ExplainNumber } from "./ExplainNumber";
import { SpreadRemark } from "./SpreadRemark";
import "./tables.css";
import type { ValueListProps } from "./tableProps";
import { valueLabel, valueLabels } from "./valueLabels";

/** A value with its unit; a Hill radius in radii of its body, which say more than kilometres. */
function shownValue(result: CellResult, name: string, unitSystem: UnitSystem): RichText {
  const { value, unit = "1", spread: watched } = result.values[name]!;
  if (typeof value === "string") return [value.replace(/_/g, " ")];
  const spread = numberSpread(watched);
  const radius = result.values.radius?.value;
  if (name === "hill_radius" && typeof radius === "number" && value !== null) {
    const number = spread
      ? formatSpread(value / radius, scaleSpread(spread, 1 / radius)).whole
      : formatNumber(value / radius);
    return [...number, `${unitSpace}radii`];
  }
  const twin = result.values[name.replace(/([^.]+)$/, "log10_$1")]?.value;
  const log10 = typeof twin === "number" ? twin : null;
  const scale = resultScale(name, unit, unitSystem, value ?? 0);
  return quantityRich(formatUncertain({ value, log10, unit }, spread, unitSystem, { scale }));
}

/** What a cell gives, as labels over their values. */
export function ValueList({ result, unitSystem, names, labels = {}, isQuiet }: ValueListProps) {
  const shown = (names ?? Object.keys(valueLabels)).filter((name) => name in result.values);
  if (shown.length === 0) return null;
  return (
    <>
      <dl className="value-list" data-quiet={isQuiet || undefined} aria-label={`What ${result.name} gives`}>
        {shown.map((name) => {
          const { value, unit } = result.values[name]!;
          const isNumber = typeof value === "number";
          const text = shownValue(result, name, unitSystem);
          return (
            <div key={name}>
              <dt>
                <Rich text={labels[name] ?? [valueLabel(name)]} />
              </dt>
              <dd
                title={
                  isNumber
                    ? `${result.name}.${name} = ${value}${unit && unit !== "1" ? ` ${unit}` : ""}`
                    : undefined
                }
              >
                <ExplainNumber place={{ cell: result.name, name }} spoken={plainText(text)}>
                  <Rich text={text} />
                </ExplainNumber>
              </dd>
            </div>
          );
        })}
      </dl>
      <SpreadRemark values={result.values} names={shown} />
    </>
  );
}
