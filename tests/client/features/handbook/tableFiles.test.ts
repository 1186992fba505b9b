import { describe, expect, it } from "vitest";
import { engineVersion } from "../../../../shared/notebook/engine";
import { findBody, references } from "../../../../shared/physics";
import { tableCsv, tableJson } from "../../../../src/features/handbook/tableFiles";
import { bodiesSection } from "../../../../src/features/handbook/tables/bodiesSection";
import { collisionsSection } from "../../../../src/features/handbook/tables/collisionsSection";
import { constantsSection } from "../../../../src/features/handbook/tables/constantsSection";

const lines = (text: string): string[] => text.split("\r\n");

describe("files of a table", () => {
  it("hold every digit in SI, whatever the page shows", () => {
    const [head = "", ...rows] = lines(tableCsv(bodiesSection.tables[0]!));
    expect(head.split(",").slice(0, 3)).toEqual(["body", "gm (m^3 s^-2)", "radius (m)"]);
    const mars = rows.find((row) => row.startsWith("Mars,"))!;
    expect(mars.split(",")[1]).toBe(String(findBody("Mars")!.gravitationalParameter));
    expect(mars).toContain("Archinal");
  });

  it("say which law of a pair acts and what a constant's unit and uncertainty are", () => {
    const [head = "", ...rows] = lines(tableCsv(collisionsSection(false).tables[0]!));
    const acts = head.split(",").indexOf("acts");
    const pair = rows.filter((row) => row.startsWith("H2 in N2,")).map((row) => row.split(",")[acts]);
    expect(pair).toEqual(["yes", "no", "no"]);
    const constants = lines(tableCsv(constantsSection.tables[0]!));
    expect(constants[0]).toContain("value,value_uncertainty,value_unit");
    expect(constants.find((line) => line.startsWith("Newtonian"))).toContain("1.5e-15,m^3 kg^-1 s^-2");
  });

  it("name the engine and cite every source in full", () => {
    const table = JSON.parse(tableJson(bodiesSection.tables[0]!)) as {
      engine: string;
      references: Record<string, string>;
      rows: { name: string; values: Record<string, { value: number; unit: string; sources: object[] }> }[];
    };
    expect(table.engine).toBe(engineVersion);
    expect(table.references["NaifGM"]).toBe(references["NaifGM"]);
    const mars = table.rows.find(({ name }) => name === "Mars")!;
    expect(mars.values["radius"]).toMatchObject({
      value: 3_389_500,
      unit: "m",
      sources: [{ source: "Archinal2018", mark: "from memory" }],
    });
  });
});
