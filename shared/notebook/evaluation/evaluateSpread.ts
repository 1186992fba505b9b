import { largestSobolDimension } from "../../physics";
import { spreadLimits } from "../kinds/spread";
import { fault } from "../language/notes";
import { readQuantity } from "../language/readQuantity";
import { refused } from "../language/reading";
import type { CellAnswer } from "./cellAnswer";
import { checkName } from "./checkName";
import { requireEntries, type OpenCell } from "./openCell";
import { readEntry } from "./readEntries";
import { answerPlan, planKey, readWatched } from "./taskPlan";
import type { Trace } from "./traceResults";

export function evaluateSpread(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  const watched = readWatched(cell);
  const samples = readWhole(cell, "samples", 4096);
  const seed = readWhole(cell, "seed", 1);
  if (!watched || samples === undefined || seed === undefined) return {};

  const { names, trace } = watched;
  if (!hasInputs(cell, trace)) return {};
  if (samples < spreadLimits.sparseSamples) {
    const message = `From fewer than ${spreadLimits.sparseSamples} draws the outer quantiles, 2.5 and 97.5 %, are rough.`;
    cell.say("caution", "few_draws", message, cell.entry("samples"));
  }
  const key = planKey(cell, trace);
  return answerPlan(cell, { kind: "spread", key, points: samples, watch: names, trace, seed });
}

/** A whole number within the bounds of the schema; what is left out acts by default. */
function readWhole(cell: OpenCell, key: string, standard: number): number | undefined {
  if (!cell.entry(key)) {
    cell.actByDefault(key);
    return standard;
  }
  const schema = cell.schema.entries.find((entry) => entry.key === key);
  return readEntry(cell, key, (node) => {
    const expected = { kind: "number", name: `*${key}*`, ...schema?.bounds } as const;
    const read = readQuantity(node, expected, cell.surroundings);
    if (!read.ok) return read;
    const { value } = read.value;
    if (Number.isInteger(value)) return { ok: true, value, notes: [] };
    return refused(fault("whole_number", node.range, `*${key}* must be a whole number.`));
  });
}

function hasInputs(cell: OpenCell, { inputs }: Trace): boolean {
  if (inputs.length === 0) {
    const message =
      "Nothing that is watched rests on an uncertain entry, so there is no spread. Write one as uncertain, such as 240 ± 30 K.";
    cell.say("fault", "nothing_uncertain", message, cell.entry("watch"));
    return false;
  }
  if (inputs.length <= largestSobolDimension) return true;
  const message = `What is watched rests on ${inputs.length} uncertain entries; there may be ${largestSobolDimension} at most.`;
  cell.say("fault", "too_many", message, cell.entry("watch"));
  return false;
}
