import type { ColumnInput, PhysicsNote } from "../types";
import type { Homopause } from "./findHomopauses";

/** What the reader of a column has to know beside its numbers. */
export function columnNotes(
  input: ColumnInput,
  topAltitude: number,
  homopauses: readonly Homopause[],
  isCutShort: boolean,
): PhysicsNote[] {
  const notes: PhysicsNote[] = [];
  if (input.temperature.kind === "points") {
    notes.push(...extrapolation("temperature", input.temperature.altitudes, input.baseAltitude, topAltitude));
  }
  if (input.eddy.kind === "points") {
    notes.push(...extrapolation("eddy", input.eddy.altitudes, input.baseAltitude, topAltitude));
  }
  homopauses.forEach(({ otherAltitudes }, i) => {
    if (otherAltitudes.length > 0) notes.push(severalHomopauses(input.gases[i].formula, otherAltitudes));
  });
  if (isCutShort) notes.push(cutShort(topAltitude));
  return notes;
}

const named = { temperature: "temperature", eddy: "eddy coefficient" } as const;

function extrapolation(
  what: keyof typeof named,
  altitudes: Float64Array,
  base: number,
  top: number,
): PhysicsNote[] {
  const first = altitudes[0];
  const last = altitudes[altitudes.length - 1];
  if (base >= first && top <= last) return [];
  return [
    {
      level: "caution",
      code: `${what}_extrapolated`,
      message:
        `The points of the ${named[what]} reach from ${kilometres(first)} to ${kilometres(last)}, the column ` +
        `from ${kilometres(base)} to ${kilometres(top)}. Beyond the points the ${named[what]} is held constant.`,
    },
  ];
}

function severalHomopauses(formula: string, others: number[]): PhysicsNote {
  return {
    level: "caution",
    code: "several_homopauses",
    message:
      `The diffusion coefficient of ${formula} passes the eddy coefficient more than once; also at ` +
      `${others.map(kilometres).join(", ")}. The homopause given is the last passage from mixed to separated.`,
  };
}

function cutShort(topAltitude: number): PhysicsNote {
  return {
    level: "caution",
    code: "column_cut_short",
    message:
      `The column ends at ${kilometres(topAltitude)}, below the top asked for: above it the pressure is below ` +
      "1e-280 Pa. Set the top lower.",
  };
}

function kilometres(altitude: number): string {
  return `${Number((altitude / 1000).toPrecision(6))} km`;
}
