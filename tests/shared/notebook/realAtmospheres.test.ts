/**
 * Titan, Pluto, Triton and Saturn from published inputs, coupled, beside what the literature has for them: orders of
 * magnitude for `docs/validation.md`. That they agree is not asserted; that they answer is.
 */
import { describe, expect, it } from "vitest";

import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import type { CellResult } from "../../../shared/notebook/result";
import { compareMagnitude } from "../../toAgreeWith";
import type { ComparedNumber } from "../../validation/agreement";
import { numberIn } from "./evaluateCells";
import { fixtureNotebook } from "./fixtureNotebook";

const atomicMass = 1.66053906892e-27;

interface Beside extends Omit<ComparedNumber, "section" | "mark"> {
  ours: (results: { leak: CellResult; others: CellResult[] }) => number;
}

const ofLeak =
  (name: string, unit = 1): Beside["ours"] =>
  ({ leak }) =>
    numberIn(leak, name) / unit;

const atmospheres: Record<string, Beside[]> = {
  "titan.md": [
    {
      what: "Titan: exobase",
      unit: "km",
      published: 1430,
      source: "Agren2007",
      why: "Follows the density at the base, which is from memory and varies from flyby to flyby.",
      ours: ofLeak("exobase.altitude", 1e3),
    },
    {
      what: "Titan: H2 flux, referred to the surface",
      unit: "m⁻² s⁻¹",
      published: 2e14,
      source: "Strobel2010",
      why: "Set by diffusion through N2, and so by the share of H2 at the base, 0.4 % here from memory; the published flux comes from a fit of a whole profile.",
      ours: ({ others }) =>
        numberIn(
          others.find(({ name }) => name === "referred")!,
          "H2_at_surface",
        ),
    },
    {
      what: "Titan: mass lost in all",
      unit: "u s⁻¹",
      published: [4e28, 5e28],
      source: "Strobel2009",
      why: "The published rate has methane leave in a slow, heated outflow, which kinetic models do not find; ours is thermal escape alone, and nearly all of it is H2.",
      ours: ({ leak }) =>
        ["N2", "CH4", "H2"].reduce((sum, gas) => sum + numberIn(leak, `${gas}.mass_rate`), 0) / atomicMass,
    },
  ],
  "pluto.md": [
    {
      what: "Pluto: radius of the exobase",
      unit: "km",
      published: 2900,
      source: "Young2018",
      why: "Pressure at the ground and warm layer are from memory; a kelvin more above 700 km alone moves the exobase by 16 km.",
      ours: ofLeak("exobase.radius", 1e3),
    },
    {
      what: "Pluto: N2 lost",
      unit: "s⁻¹",
      published: [3e22, 7e22],
      source: "Young2018",
      why: "Both are Jeans rates of a gas of 66 K; the published one is enhanced for the flow, and ours leaves from a higher exobase.",
      ours: ofLeak("N2.rate"),
    },
    {
      what: "Pluto: CH4 lost",
      unit: "s⁻¹",
      published: [4e25, 8e25],
      source: "Young2018",
      why: "Two thirds of what diffusion through N2 can supply, so that little depends on the exobase; no chemistry takes methane away on its way up here.",
      ours: ofLeak("CH4.rate"),
    },
  ],
  "triton.md": [
    {
      what: "Triton: exobase",
      unit: "km",
      published: 870,
      source: "Krasnopolsky1993",
      why: "The height rests on the collision diameters, which the publication and the handbook need not share, and on one temperature for all altitudes.",
      ours: ofLeak("exobase.altitude", 1e3),
    },
    {
      what: "Triton: N lost",
      unit: "s⁻¹",
      published: [0.7e25, 1.3e25],
      source: "Krasnopolsky1993",
      why: "N of 400 km carried up at rest; what makes and takes it between is left out.",
      ours: ofLeak("N.rate"),
    },
  ],
  "saturn.md": [
    {
      what: "Saturn: exobase above 1 bar",
      unit: "km",
      published: [2700, 3000],
      source: "Koskinen2013",
      why: "Pressure and temperature at the base and the rise to 455 K are guesses from memory.",
      ours: ofLeak("exobase.altitude", 1e3),
    },
    {
      what: "Saturn: escape parameter of H2",
      unit: "1",
      published: [260, 340],
      source: "Koskinen2013",
      why: "GM over a radius that is known to a percent and a temperature that was given.",
      ours: ofLeak("H2.escape_parameter"),
    },
  ],
};

describe.each(Object.entries(atmospheres))("%s", (file, compared) => {
  const results = evaluateNotebook(fixtureNotebook(file)).evaluation.cells.map(({ result }) => result);
  const leak = results.find(({ name }) => name === "leak")!;

  it("has an exobase and rates", () => {
    expect(results.filter(({ status }) => status === "fault")).toEqual([]);
    expect(leak.values["exobase.altitude"].value).toBeGreaterThan(0);
  });

  it.each(compared)("$what stands beside the published one", ({ ours, ...outside }) => {
    compareMagnitude(ours({ leak, others: results }), {
      ...outside,
      section: "magnitude",
      mark: "published",
    });
  });
});
