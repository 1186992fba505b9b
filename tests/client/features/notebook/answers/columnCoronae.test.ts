import { describe, expect, it } from "vitest";
import type { CellEvaluation } from "../../../../../shared/notebook/result";
import { columnCoronae, columnOf } from "../../../../../src/features/notebook/cells/columnCoronae";
import { exobaseSpread } from "../../../../../src/features/notebook/page/exobaseSpread";
import { cellNamed, evaluatedHalo, haloCells } from "./haloNotebook";

const cells = evaluatedHalo();

describe("coronae of a column", () => {
  it("are found by the escape cell that they rest on", () => {
    const [halo, ...others] = columnCoronae("dayside", cells);
    expect(others).toEqual([]);
    expect(halo).toMatchObject({ gas: "H", cell: "halo" });
    const leak = cellNamed(cells, "leak").result.values;
    expect(halo!.densityBelow).toBe(leak["H.number_density"]!.value);
    expect(halo!.altitude[0]).toBe(leak["exobase.altitude"]!.value);
    expect(columnCoronae("nightside", cells)).toEqual([]);
  });

  it("are none where the corona has no answer", () => {
    const faulty = haloCells.map(([kind, name, text]) =>
      kind === "corona" ? ([kind, name, "escape = leak\ngas = Xe"] as const) : ([kind, name, text] as const),
    );
    expect(columnCoronae("dayside", evaluatedHalo(faulty))).toEqual([]);
  });

  it("are the same list as long as nothing changed, so that no figure is drawn anew", () => {
    const again = new Map([...cells].map(([id, cell]) => [id, cell]));
    expect(columnCoronae("dayside", again)).toBe(columnCoronae("dayside", cells));
    expect(columnCoronae("dayside", evaluatedHalo())).not.toBe(columnCoronae("dayside", cells));
  });

  it("rest on the same column as all that names their escape cell", () => {
    for (const name of ["dayside", "leak", "halo", "hot"])
      expect(columnOf(cellNamed(cells, name), cells)).toBe("dayside");
    expect(columnOf(cellNamed(cells, "ilmara"), cells)).toBeNull();
  });
});

describe("the spread of the exobase that a strip marks", () => {
  const strip = cellNamed(cells, "dayside").strip!;
  const watched = (lower: number, upper: number, criterion?: string): ReadonlyMap<string, CellEvaluation> =>
    new Map(
      [...cells].map(([id, cell]) => {
        if (cell.result.name !== "leak") return [id, cell];
        const altitude = cell.result.values["exobase.altitude"]!;
        const value = Number(altitude.value);
        const ends = { median: value, lower: value - lower, upper: value + upper, q2_5: null, q97_5: null };
        const values = {
          ...cell.result.values,
          "exobase.altitude": { ...altitude, spread: { ...ends, cell: "how_sure" } },
        };
        const convention = { coupling: "open" as const, criterion: criterion ?? cell.convention!.criterion };
        return [id, { ...cell, convention, result: { ...cell.result, values } }];
      }),
    );

  it("is that of an escape cell on the column, about the mark", () => {
    const spread = exobaseSpread("dayside", strip.exobase!, watched(23e3, 30e3))!;
    expect(strip.exobase! - spread.lower).toBeCloseTo(23e3, -2);
    expect(spread.upper - strip.exobase!).toBeCloseTo(30e3, -2);
  });

  it("is none where nothing watches it, or by another criterion, or of an exobase elsewhere", () => {
    expect(exobaseSpread("dayside", strip.exobase!, cells)).toBeNull();
    expect(exobaseSpread("dayside", strip.exobase!, watched(23e3, 30e3, "unit depth"))).toBeNull();
    expect(exobaseSpread("dayside", strip.exobase! + 8e3, watched(23e3, 30e3))).toBeNull();
    expect(exobaseSpread("nightside", strip.exobase!, watched(23e3, 30e3))).toBeNull();
  });
});
