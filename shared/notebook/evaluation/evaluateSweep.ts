import { sweepLimits } from "../kinds/sweep";
import { formatPlainNumber } from "../language/formatQuantity";
import { nearestName } from "../language/nearestName";
import { changeTo } from "../language/notes";
import { readVariation, type Variation } from "../language/readVariation";
import type { CellAnswer } from "./cellAnswer";
import { checkName } from "./checkName";
import { requireEntries, type OpenCell } from "./openCell";
import { readEntry } from "./readEntries";
import { answerPlan, planKey, readWatched } from "./taskPlan";
import type { Trace } from "./traceResults";

export function evaluateSweep(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  const watched = readWatched(cell);
  const varied = readVaried(cell, "vary");
  const against = cell.entry("against") ? readVaried(cell, "against") : null;
  if (!varied || against === undefined || !areDifferent(cell, varied, against)) return {};
  const axes = against ? [varied, against] : [varied];
  const points = axes.reduce((product, { steps }) => product * (steps + 1), 1);
  if (!isWithinLimit(cell, points) || !watched) return {};

  const { names, trace } = watched;
  sayWhatChangesNothing(cell, axes, trace);
  return answerPlan(cell, { kind: "sweep", key: planKey(cell, trace), points, watch: names, trace, axes });
}

/** An entry of a `values` cell, varied. */
function readVaried(cell: OpenCell, key: "vary" | "against"): Variation | undefined {
  const { surroundings } = cell;
  const variation = readEntry(cell, key, (node) => readVariation(node, sweepLimits.points - 1, surroundings));
  if (!variation) return undefined;
  const { name, nameRange } = variation;
  if (surroundings.valuesEntry(name)) {
    const found = surroundings.lookup(name);
    if (typeof found === "object" && "dimension" in found) return variation;
    const message = `*${name}* has a fault; put that right first.`;
    cell.say("fault", "unavailable", message, nameRange);
    return undefined;
  }
  const isKnown = surroundings.lookup(name) !== undefined;
  const entries = surroundings.names().filter((candidate) => surroundings.valuesEntry(candidate) !== null);
  const nearest = isKnown ? undefined : nearestName(name, entries);
  const message = isKnown
    ? `*${name}* is no entry of a values cell, and only such can be varied. Give the number a name in a values cell, and use that name where it acts.`
    : `No entry of a values cell above is called *${name}*.${nearest === undefined ? "" : ` The nearest is *${nearest}*.`}`;
  const remedy = nearest === undefined ? undefined : changeTo(nameRange, nearest);
  cell.say("fault", "not_an_entry", message, nameRange, remedy);
  return undefined;
}

function areDifferent(cell: OpenCell, varied: Variation, against: Variation | null): boolean {
  if (varied.name !== against?.name) return true;
  const message = `*${against.name}* is varied by *vary* already; *against* takes another quantity.`;
  cell.say("fault", "varied_twice", message, against.nameRange);
  return false;
}

function isWithinLimit(cell: OpenCell, points: number): boolean {
  if (points <= sweepLimits.points) return true;
  const [limit, asked] = [sweepLimits.points, points].map((count) => formatPlainNumber(count, 9));
  const message = `A sweep may have ${limit} points at most; these are ${asked} together.`;
  cell.say("fault", "too_many", message, cell.entry("against"));
  return false;
}

function sayWhatChangesNothing(cell: OpenCell, axes: readonly Variation[], { nodes }: Trace): void {
  for (const { name, nameRange } of axes) {
    if (nodes.some(({ entry }) => entry === name)) continue;
    const message = `Nothing that is watched rests on *${name}*, so varying it changes nothing.`;
    cell.say("caution", "changes_nothing", message, nameRange);
  }
}
