import { describe, expect, it } from "vitest";

import { addHandbookCell } from "../../../shared/notebook/addHandbookCell";
import {
  constantCell,
  gasCell,
  pairCells,
  referringBodyCell,
  writtenBodyCell,
  type HandbookCell,
} from "../../../shared/notebook/handbookCells";
import { collisionPairs, lumpedRows } from "../../../shared/notebook/handbookPairs";
import {
  codata2022,
  collisionParameter,
  collisionRows,
  findBody,
  findGas,
  handbookBodies,
  handbookGases,
  iau,
} from "../../../shared/physics";
import { evaluateCells, notebookOf, numberIn, resultOf, type WrittenCell } from "./evaluateCells";

const written = ({ kind, name, text }: HandbookCell): WrittenCell => [kind, name, text];
const faultsOf = (...cells: HandbookCell[]) =>
  evaluateCells(cells.map(written)).flatMap(({ result }) =>
    result.notes.filter(({ level }) => level === "fault").map(({ message }) => `${result.name}: ${message}`),
  );

const pairs = collisionPairs(handbookGases);

describe("cells of the handbook", () => {
  it("are all understood", () => {
    expect(faultsOf(...handbookBodies.map(referringBodyCell))).toEqual([]);
    expect(faultsOf(...handbookBodies.map(writtenBodyCell))).toEqual([]);
    expect(faultsOf(...handbookGases.map(gasCell))).toEqual([]);
    for (const pair of pairs) for (const cell of pairCells(pair)) expect(faultsOf(cell)).toEqual([]);
    for (const constant of [...codata2022, ...iau]) expect(faultsOf(constantCell(constant))).toEqual([]);
  });

  it.each(handbookBodies.map(({ name }) => name))(
    "give %s the same numbers written out as by name",
    (name) => {
      const body = findBody(name)!;
      const [byName, byNumber] = [referringBodyCell, writtenBodyCell].map((write) =>
        resultOf(written(write(body))),
      );
      expect(Object.keys(byNumber!.values)).toEqual(Object.keys(byName!.values));
      for (const key of Object.keys(byName!.values))
        expect(numberIn(byNumber!, key) / numberIn(byName!, key)).toBeCloseTo(1, 12);
    },
  );

  it("leave a column as it is, and say that they act in it", () => {
    const column: WrittenCell = [
      "column",
      "air",
      "body = mars\nbase = 100 km\npressure = 0.1 Pa\ngases = CO2: rest, H2: 1 %\ntemperature = 200 K\neddy = 1e3 m^2/s",
    ];
    const mars: WrittenCell = ["body", "mars", "like = handbook(Mars)"];
    const gases = ["CO2", "H2"].map((formula) => written(gasCell(findGas(formula)!)));
    const plain = resultOf(mars, column);
    const overridden = resultOf(mars, ...gases, column);
    for (const key of ["top.altitude", "base.number_density"])
      expect(numberIn(overridden, key) / numberIn(plain, key)).toBeCloseTo(1, 9);
    const acting = overridden.notes
      .filter(({ code }) => code === "gas_cell_acts")
      .map(({ message }) => message);
    expect(acting).toHaveLength(2);
    expect(acting[0]).toContain("from the gas cell *CO2*");
    expect(plain.notes.some(({ code }) => code === "gas_cell_acts")).toBe(false);
  });

  it("carry every source as a remark, and say what was written from memory", () => {
    const text = writtenBodyCell(findBody("Mars")!).text;
    for (const line of text.split("\n")) expect(line).toMatch(/ {2}# \S/);
    expect(text).toMatch(/radius .*# Archinal et al\. 2018, mean radius, from memory/);
    expect(gasCell(findGas("D")!).text).toMatch(/thermal_diffusion .*, that of H, by analogy/);
  });

  it("give the constants their unit and their uncertainty", () => {
    const gravitation = codata2022.find(({ symbol }) => symbol === "G")!;
    expect(constantCell(gravitation).text).toBe(
      "Newtonian_constant_of_gravitation = 6.6743e-11 ± 1.5e-15 m^3/(kg s^2)  # Tiesinga et al. 2024",
    );
    const value = resultOf(written(constantCell(codata2022.find(({ symbol }) => symbol === "e")!)));
    // One coulomb is one ampere second (SI Brochure, 9th edition).
    expect(value.values["elementary_charge"]?.value).toBe(1.602176634e-19);
  });
});

describe("pairs", () => {
  it("are all there, each with what acts and what else is published", () => {
    expect(pairs).toHaveLength((handbookGases.length * (handbookGases.length - 1)) / 2);
    for (const { gases, acting, row } of pairs) {
      expect(acting).toEqual(collisionParameter(findGas(gases[0])!, findGas(gases[1])!));
      expect(row?.coefficient).toBe(acting.isEstimate ? undefined : acting.coefficient);
    }
    const shown = pairs.flatMap(({ row, others }) => (row ? [row, ...others] : others));
    expect(new Set([...shown, ...lumpedRows(handbookGases)])).toEqual(new Set(collisionRows));
    expect(shown.length + lumpedRows(handbookGases).length).toBe(collisionRows.length);
  });
});

describe("putting a cell in", () => {
  const notebook = notebookOf([
    ["values", "given", "mars = 3 K"],
    ["gas", "H", "thermal_diffusion = -0.3"],
    ["column", "air", ""],
  ]);

  it("takes a name that nothing else has", () => {
    const added = addHandbookCell(notebook, [referringBodyCell(findBody("Mars")!)], "new", "end");
    expect(added.ok && added.document.cells.at(-1)).toMatchObject({ id: "new", name: "mars_2" });
  });

  it("puts a gas over the columns where it is to act", () => {
    const added = addHandbookCell(notebook, [gasCell(findGas("O")!)], "new", "aboveColumns");
    expect(added.ok && added.document.cells.map(({ name }) => name)).toEqual(["given", "H", "O", "air"]);
  });

  it("takes the other gas of a pair where the first has a cell, and refuses where both have", () => {
    const pair = pairs.find(({ gases }) => gases.join() === "H,CO2")!;
    const added = addHandbookCell(notebook, pairCells(pair), "new", "end");
    expect(added.ok && added.cell.name).toBe("CO2");
    const refused = addHandbookCell(
      notebookOf([
        ["gas", "H", ""],
        ["gas", "CO2", ""],
      ]),
      pairCells(pair),
      "new",
      "end",
    );
    expect(refused).toMatchObject({ ok: false, message: expect.stringContaining("H and CO2 already") });
  });

  it("gives a constant a name of its own the second time", () => {
    const cell = constantCell(codata2022[0]!);
    const once = addHandbookCell(notebookOf([]), [cell], "a", "end");
    const twice = once.ok ? addHandbookCell(once.document, [cell], "b", "end") : once;
    expect(twice.ok && twice.cell.name).toBe("constants_2");
    expect(twice.ok && twice.cell.text).toMatch(/^Boltzmann_constant_2 = /);
  });
});
