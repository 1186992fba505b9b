import { describe, expect, it } from "vitest";

import { meanDensity } from "../../../../shared/physics/body/meanDensity";
import { julianYear } from "../../../../shared/physics/constants/iau";
import { gravitationalConstant } from "../../../../shared/physics/constants/codata2022";
import { findBody, handbookBodies } from "../../../../shared/physics/handbook/handbookBodies";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

function body(name: string) {
  const found = findBody(name);
  if (!found) throw new Error(`no ${name} in the handbook`);
  return found;
}

describe("handbookBodies", () => {
  it("know planets, dwarf planets and the larger moons", () => {
    const names = (kind: string) => handbookBodies.filter((b) => b.kind === kind).map((b) => b.name);
    expect(names("planet")).toEqual("Mercury Venus Earth Mars Jupiter Saturn Uranus Neptune".split(" "));
    expect(names("dwarf planet")).toEqual(["Ceres", "Pluto", "Eris"]);
    expect(names("moon").sort()).toEqual(
      "Callisto Charon Enceladus Europa Ganymede Io Moon Titan Triton".split(" "),
    );
  });

  it.each([
    // GM in km³ s⁻².
    ["Venus", 324858.592],
    ["Earth", 398600.43550702266],
    ["Mars", 42828.37362069909],
    ["Jupiter", 126686531.9003704],
    ["Titan", 8978.137095521046],
    ["Triton", 1428.495462910464],
    ["Pluto", 869.3261226311508],
    ["Ceres", 62.62888644],
    ["Eris", 1098.9],
  ])("give %s a GM of %s km³ s⁻²", (name, gmKm3) => {
    expect(body(name).gravitationalParameter).toAgreeWith({
      what: "GM of the handbook's bodies",
      unit: "m³ s⁻²",
      published: gmKm3 * 1e9,
      within: { relative: 1e-15 },
      source: "NaifGM",
      mark: "published",
    });
  });

  it.each([
    // Mean densities in kg/m³; half a unit of the last digit of the lightest.
    ["Mercury", 5429],
    ["Venus", 5243],
    ["Earth", 5513],
    ["Mars", 3934],
    ["Jupiter", 1326],
    ["Saturn", 687],
    ["Uranus", 1270],
    ["Neptune", 1638],
    ["Moon", 3344],
    ["Titan", 1881],
    ["Pluto", 1854],
  ])("give %s a density of %s kg/m³", (name, density) => {
    expect(meanDensity(body(name))).toAgreeWith({
      what: `mean density of ${name}`,
      unit: "kg m⁻³",
      published: density,
      within: { relative: 2e-3 },
      source: "NSSDC",
      mark: "from memory",
    });
  });

  it("keep Kepler's third law with their star", () => {
    // Periods in days; the elements are averages over decades, so 2 parts in 10³.
    const periods = {
      Mercury: 87.969,
      Venus: 224.701,
      Earth: 365.256,
      Mars: 686.98,
      Jupiter: 4332.59,
      Neptune: 60182,
    };
    for (const [name, days] of Object.entries(periods)) {
      const { starDistance = 0, starMass = 0 } = body(name);
      const period = 2 * Math.PI * Math.sqrt(starDistance ** 3 / (gravitationalConstant.value * starMass));
      expect(period / 86400).toAgreeWith({
        what: `orbital period of ${name} by Kepler's third law`,
        unit: "d",
        published: days,
        within: { relative: 2e-3 },
        source: "NSSDC",
        mark: "from memory",
      });
    }
    expect(julianYear.value / 86400).toBeCloseToRelative(periods.Earth, 1e-4);
  });

  it("keep Kepler's third law of moons with their planets, as they turn once an orbit", () => {
    for (const moon of handbookBodies.filter(({ kind }) => kind === "moon")) {
      const { name, primary, rotationPeriod = 0, gravitationalParameter } = moon;
      if (!primary) throw new Error(`${name} has no primary`);
      const together = gravitationalParameter + body(primary.name).gravitationalParameter;
      const period = 2 * Math.PI * Math.sqrt(primary.distance ** 3 / together);
      expect(period, name).toBeCloseToRelative(Math.abs(rotationPeriod), 5e-3);
    }
  });

  it("turn backwards where they do", () => {
    const backwards = handbookBodies
      .filter(({ rotationPeriod = 1 }) => rotationPeriod < 0)
      .map(({ name }) => name);
    expect(backwards).toEqual(["Venus", "Uranus", "Triton", "Pluto"]);
    expect(body("Mars").rotationPeriod).toBeCloseToRelative(24.6229 * 3600, 1e-15);
  });

  it("name a source for every number they hold", () => {
    for (const { sources, ...entry } of handbookBodies) {
      const numbers = Object.keys(entry).filter((key) => key !== "name" && key !== "kind");
      expect(Object.keys(sources).sort(), entry.name).toEqual(numbers.sort());
    }
    expect(body("Mars").sources.radius?.mark).toBe("from memory");
    expect(body("Mars").sources.gravitationalParameter?.mark).toBe("read");
  });

  it("answer undefined for what they do not hold", () => {
    expect(findBody("mars")).toBeUndefined();
    expect(findBody("toString")).toBeUndefined();
  });
});
