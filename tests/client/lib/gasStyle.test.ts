import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { colourDistance, contrast, sights } from "../../../src/lib/colour";
import { gasStyle, gasStyles, papers, tokenInks } from "../../../src/lib/gasStyle";

const css = readFileSync(path.resolve(import.meta.dirname, "../../../src/styles.css"), "utf8");

function leastDistance(colours: readonly string[], sight: (typeof sights)[number]): number {
  const pairs = colours.flatMap((a, i) => colours.slice(0, i).map((b) => colourDistance(a, b, sight)));
  return Math.min(...pairs);
}

describe("colours of the ten gases", () => {
  it.each(Object.entries(tokenInks))(
    "has for %s the values of the page's own token",
    (gas, { light, dark }) => {
      expect(css).toContain(`--g-${gas}: light-dark(${light}, ${dark});`);
    },
  );

  // The palette was chosen for these distances (OKLab × 100, dichromats after Machado et al. 2009), given to one
  // decimal; 0.15 allows for their rounding and for another rendering of the simulation.
  it.each([
    ["light", "full", 8.7],
    ["light", "deuteranopia", 7.2],
    ["light", "protanopia", 6.3],
    ["dark", "full", 7.5],
    ["dark", "deuteranopia", 6.7],
    ["dark", "protanopia", 7.7],
  ] as const)("keeps any two apart in %s with %s sight", (light, sight, least) => {
    const colours = Object.values(tokenInks).map((ink) => ink[light]);
    expect(leastDistance(colours, sight)).toBeGreaterThanOrEqual(least - 0.15);
  });

  it.each(["light", "dark"] as const)("is legible as text on %s paper", (light) => {
    for (const ink of Object.values(tokenInks)) {
      expect(contrast(ink[light], papers[light])).toBeGreaterThanOrEqual(4.5);
    }
  });
});

describe("gases beyond the ten", () => {
  const inksOf = (colour: string) =>
    /light-dark\((#\w+), (#\w+)\)/.exec(colour)!.slice(1) as [string, string];

  it.each([
    [["CO2", "H2O", "O"], "H2O"],
    [["N2", "CH4", "HCN", "C2H6", "H2", "H"], "HCN"],
    [["SO2", "O2", "S2"], "SO2"],
    [["H", "H2", "He", "CH4", "O", "N2", "CO", "O2", "Ar", "CO2", "Ne"], "Ne"],
  ])("stand in %j as far from the others as the ten do, or nearly", (gases, newcomer) => {
    const [light, dark] = inksOf(gasStyle(newcomer, gases).colour);
    const others = gases.filter((gas) => gas in tokenInks);
    // Eleven in one figure can not all be as far apart as ten: half the distance is still told apart by dash and name.
    const share = gases.length > 10 ? 0.4 : 0.95;
    for (const sight of sights) {
      for (const other of others) {
        expect(colourDistance(light, tokenInks[other]!.light, sight)).toBeGreaterThanOrEqual(6.2 * share);
        expect(colourDistance(dark, tokenInks[other]!.dark, sight)).toBeGreaterThanOrEqual(6.6 * share);
      }
    }
    expect(contrast(light, papers.light)).toBeGreaterThanOrEqual(4.6);
    expect(contrast(dark, papers.dark)).toBeGreaterThanOrEqual(4.6);
  });

  it("take dashes that no other gas of the figure has", () => {
    const gases = ["H", "H2", "He", "CH4", "O", "N2", "CO", "O2", "Ar", "H2O", "HCN", "C2H6", "Ne"];
    const dashes = [...gasStyles(gases).values()].map(({ dash }) => dash);
    expect(new Set(dashes).size).toBe(gases.length);
  });

  it("get the same style from the same list", () => {
    expect(gasStyle("H2O", ["CO2", "H2O"])).toEqual(gasStyle("H2O", ["CO2", "H2O"]));
  });
});
