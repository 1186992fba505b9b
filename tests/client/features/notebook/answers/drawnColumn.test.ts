import { expect, it } from "vitest";
import { drawnColumn } from "../../../../../src/features/notebook/cells/drawnColumn";
import { cellNamed, evaluatedHalo, haloCells } from "./haloNotebook";

const coupledCells = haloCells.map(([kind, name, text]) =>
  kind === "escape" ? ([kind, name, "column = dayside"] as const) : ([kind, name, text] as const),
);
const open = evaluatedHalo();
const coupled = evaluatedHalo(coupledCells);
const at = (profiles: Record<string, number[]>, key: string) => profiles[key]!.at(-1)!;

it("is the gas at rest where no escape cell is solved with its flux", () => {
  const dayside = cellNamed(open, "dayside");
  expect(drawnColumn(dayside, open)).toEqual({
    profiles: dayside.result.profiles,
    strip: dayside.strip,
    escape: null,
  });
});

it("is the column that the first coupled escape cell leaves, with its exobase and less of what escapes", () => {
  const drawn = drawnColumn(cellNamed(coupled, "dayside"), coupled)!;
  const atRest = cellNamed(coupled, "dayside").result.profiles!;
  const leak = cellNamed(coupled, "leak").result.values;
  expect(drawn.escape).toBe("leak");
  expect(drawn.strip.column).toBe("dayside");
  expect(drawn.strip.exobase).toBe(leak["exobase.altitude"]!.value);
  expect(at(drawn.profiles, "H.number_density")).toBeLessThan(0.9 * at(atRest, "H.number_density"));
});

it("is the same object for the same evaluations, and null where there is no answer", () => {
  const dayside = cellNamed(coupled, "dayside");
  expect(drawnColumn(dayside, new Map(coupled))).toBe(drawnColumn(dayside, coupled));
  expect(drawnColumn(cellNamed(coupled, "ilmara"), coupled)).toBeNull();
  expect(drawnColumn(undefined, coupled)).toBeNull();
});
