import type { DisplayUnit, UnitSystem } from "./formatQuantity";
import {
  displayUnit,
  formatFixed,
  formatPlainNumber,
  formatQuantity,
  leadingPower,
  withUnit,
} from "./formatQuantity";
import { isDimensionless, measureOf, valueInSi } from "./measure";
import type { Quantity } from "./quantity";
import type { UnitNode, ValueNode } from "./syntax";

/** SI value of one of the unit; null where it is no unit, or a compound that is shown otherwise anyway. */
function sizeOf(unit: UnitNode): number | null {
  const measure = measureOf(unit);
  return "level" in measure ? null : valueInSi(1, measure);
}

const alike = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-12 * Math.abs(b);

const isLiteral = (node: ValueNode): boolean =>
  node.type === "number" || (node.type === "negative" && isLiteral(node.operand));

const isMeasuredLiteral = (node: ValueNode): boolean =>
  node.type === "negative"
    ? isMeasuredLiteral(node.operand)
    : node.type === "measured" && isLiteral(node.operand);

/** The unit that stands at the end of an uncertain value. */
function lastUnit(node: ValueNode): UnitNode | null {
  if (node.type === "negative") return lastUnit(node.operand);
  if (node.type === "measured") return node.unit;
  if (node.type !== "uncertain") return null;
  if (node.form === "factor") return lastUnit(node.first);
  return lastUnit(node.first) ?? lastUnit(node.second);
}

/** A pure number keeps the percent or ppm in which it is written. */
function unitFor(
  node: ValueNode,
  quantity: Quantity,
  unitSystem: UnitSystem,
  magnitude: number,
): DisplayUnit {
  const written = lastUnit(node);
  if (isDimensionless(quantity.dimension) && written) {
    const size = sizeOf(written);
    if (size !== null) return { text: written.text, size };
  }
  return displayUnit(quantity.dimension, unitSystem, magnitude);
}

/** "4.1 to 9.2 mW m⁻²": both ends with as many decimals as the narrower of start and width needs for two digits. */
function formatRange(lower: number, upper: number, unit: DisplayUnit): string {
  const from = lower / unit.size;
  const to = upper / unit.size;
  const width = to - from;
  const largest = Math.max(Math.abs(from), Math.abs(to));
  if (width === 0 || largest >= 1e6 || largest < 1e-3)
    return withUnit(`${formatPlainNumber(from, 3)} to ${formatPlainNumber(to, 3)}`, unit.text);
  const needed = (value: number): number => (value === 0 ? 0 : 1 - leadingPower(value, 2));
  const decimals = Math.min(9, Math.max(0, needed(from), needed(width)));
  return withUnit(`${formatFixed(from, decimals)} to ${formatFixed(to, decimals)}`, unit.text);
}

/** Whether the unit written is the one that would be shown, so that showing it says nothing. */
function isShownAsWritten(node: ValueNode, quantity: Quantity, unitSystem: UnitSystem): boolean {
  const written = lastUnit(node);
  if (written === null) return true;
  const size = sizeOf(written);
  if (size === null || isDimensionless(quantity.dimension)) return true;
  return [quantity.value, 1e-2 * quantity.value, 1e2 * quantity.value].some((magnitude) =>
    alike(size, displayUnit(quantity.dimension, unitSystem, magnitude).size),
  );
}

/**
 * What was understood of an entry, where that says something that the entry does not: a converted unit, a computed
 * number, a range, the centre that acts. Otherwise null.
 */
export function understoodText(
  node: ValueNode,
  quantity: Quantity,
  { unitSystem }: { unitSystem: UnitSystem },
): string | null {
  const shown = (): string => formatQuantity(quantity.value, quantity.dimension, { unitSystem });
  if (node.type === "number" || node.type === "list" || node.type === "broken") return null;
  if (isLiteral(node)) return null;
  if (isMeasuredLiteral(node)) return isShownAsWritten(node, quantity, unitSystem) ? null : shown();

  const { uncertainty } = quantity;
  if (node.type !== "uncertain" || !uncertainty) return shown();
  switch (uncertainty.form) {
    case "uniform": {
      const centre = (uncertainty.lower + uncertainty.upper) / 2;
      const unit = unitFor(node, quantity, unitSystem, centre);
      return `acts as ${withUnit(formatPlainNumber(centre / unit.size), unit.text)}`;
    }
    case "log_normal": {
      const upper = uncertainty.median * uncertainty.factor;
      return formatRange(
        uncertainty.median / uncertainty.factor,
        upper,
        unitFor(node, quantity, unitSystem, upper),
      );
    }
    case "normal": {
      const isRelative = node.second.type === "measured" && node.second.unit.text === "%";
      const saysMore = isRelative && !isDimensionless(quantity.dimension);
      if (
        !saysMore &&
        lastUnit(node.first) === null &&
        isLiteral(node.first) &&
        isShownAsWritten(node, quantity, unitSystem)
      )
        return null;
      if (!saysMore && lastUnit(node.first) !== null && isShownAsWritten(node, quantity, unitSystem))
        return null;
      const upper = uncertainty.mean + uncertainty.deviation;
      return formatRange(
        uncertainty.mean - uncertainty.deviation,
        upper,
        unitFor(node, quantity, unitSystem, upper),
      );
    }
  }
}
