import { expect, it } from "vitest";
import { compareDocuments } from "../../../../../src/features/notebook/compare/compareDocuments";
import { entrySentence } from "../../../../../src/features/notebook/compare/comparisonWords";
import { aCell, aNotebook, withTexts } from "../aNotebook";

const older = aNotebook();

it("names each entry that differs, with what both states have, and counts the others", () => {
  const newer = withTexts(older, {
    air: "body = ilmara\nbase = 90 km\npressure = 0.42 Pa\ngases = CO2: rest, N2: 3 %\ntemperature = 300 K\neddy = 1e6 cm^2/s",
  });
  const { cells, fields, sameCells } = compareDocuments(older, newer);
  expect(fields).toEqual([]);
  expect(sameCells).toBe(2);
  expect(cells).toEqual([
    {
      id: "air",
      kind: "column",
      name: "dayside",
      change: "changed",
      same: 4,
      differences: [
        { label: "base", older: "base = 80 km", newer: "base = 90 km" },
        { label: "eddy", older: null, newer: "eddy = 1e6 cm^2/s" },
      ],
    },
  ]);
  expect(entrySentence(compareDocuments(older, newer))).toBe("One entry differs; one entry is new.");
});

it("tells cells that are new, gone, renamed or moved", () => {
  const [text, body, air] = older.cells;
  const newer = aNotebook({ cells: [air!, { ...body!, name: "planet" }, aCell({ id: "new" })] });
  const { cells, fields } = compareDocuments(older, newer);
  expect(cells.map(({ id, change }) => [id, change])).toEqual([
    [text!.id, "gone"],
    [body!.id, "changed"],
    ["new", "new"],
  ]);
  expect(cells[1]!.differences).toEqual([{ label: "name", older: "ilmara", newer: "planet" }]);
  expect(fields).toEqual([{ label: "order", older: "ilmara, dayside", newer: "dayside, planet" }]);
});

it("knows cells of a file that was read anew by kind and name", () => {
  const anew = aNotebook({ cells: older.cells.map((cell, index) => ({ ...cell, id: `anew-${index}` })) });
  expect(compareDocuments(older, anew)).toEqual({ fields: [], cells: [], sameCells: 3 });
  expect(entrySentence(compareDocuments(older, anew))).toBe("The two say the same.");
});

it("does not mind spaces at the ends, and compares what the notebook itself says", () => {
  const newer = { ...withTexts(older, { body: "mass = 0.41 earth_mass\nradius = 4943 km\n" }), authors: [] };
  const { cells, fields } = compareDocuments(older, newer);
  expect(cells).toEqual([]);
  expect(fields).toEqual([{ label: "authors", older: "Tamsin Orevale", newer: null }]);
});
