import { describe, expect, it } from "vitest";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { evaluateCells, numberIn, resultOf, type WrittenCell } from "../evaluateCells";
import {
  atomicMass,
  boltzmann,
  gravitationalParametersKm3S2,
  massesU,
  notebookWithExobaseAt,
  radiiKm,
} from "../notebookWithExobaseAt";

/** A notebook whose hydrogen has a chosen escape parameter at the exobase. */
function withHydrogenAt(escapeParameter: number, text: string): WrittenCell[] {
  const radiusKm = radiiKm.Mars + 200;
  const gm = gravitationalParametersKm3S2.Mars * 1e9;
  const temperature = (gm * massesU.H * atomicMass) / (boltzmann * escapeParameter * radiusKm * 1e3);
  const below = notebookWithExobaseAt({
    body: "Mars",
    radiusKm,
    temperature,
    hydrogenAtExobase: 1e6,
  });
  return [...below, ["corona", "halo", `escape = leak\ngas = H\n${text}`]];
}

/** Altitude of a radius given in exobase radii. */
const at = (ratio: number) => `${ratio * (radiiKm.Mars + 200) - radiiKm.Mars} km`;

describe("a corona", () => {
  const [below, halo] = evaluateCells(
    withHydrogenAt(
      3,
      `satellites = 1\nreach = 20000 km\nlevels = leak.exobase.altitude, ${at(1.25)}, ${at(2)}, ${at(3)}`,
    ),
  )
    .slice(-2)
    .map(({ result }) => result);
  const density = numberIn(halo, "exobase.number_density");

  it("has at its exobase the density of the column, and tables named as the design names them", () => {
    expect(density).toBe(numberIn(below, "H.number_density"));
    expect(Object.keys(halo.values)).toEqual(["exobase.number_density"]);
    expect(halo.values["exobase.number_density"].unit).toBe("m^-3");
    expect(Object.keys(halo.tables.levels[0]).join(" ")).toBe(
      "radius altitude number_density ballistic satellite escaping limb_column overhead_column",
    );
    expect(Object.keys(halo.profiles!).join(" ")).toBe(
      "altitude number_density ballistic satellite escaping",
    );
  });

  it("tells how it begins: orbits filled, λ, and the share of the column's density that goes on", () => {
    const cells = evaluateCells(withHydrogenAt(3, "satellites = 0.25"));
    const { corona, result } = cells.at(-1)!;
    expect(corona!.satellites).toBe(0.25);
    expect(corona!.escapeParameter).toBeCloseToRelative(
      numberIn(cells.at(-2)!.result, "H.escape_parameter"),
      1e-12,
    );
    const { ballistic, escaping } = result.profiles!;
    const begins = ballistic[0] + escaping[0];
    expect(begins / numberIn(result, "exobase.number_density")).toBeCloseToRelative(corona!.share, 1e-12);
  });

  it("gives columns along lines of sight from the exobase to the reach, as its levels do", () => {
    const { lines_of_sight: sights, levels } = halo.tables;
    const { altitude } = halo.profiles!;
    expect(sights.map((row) => row.altitude)).toEqual(
      sights.map((_, i) => altitude[(i * (altitude.length - 1)) / (sights.length - 1)]),
    );
    const atExobase = levels.find((row) => row.altitude === sights[0].altitude)!;
    expect(sights[0].limb_column).toBe(atExobase.limb_column);
    expect(sights[0].overhead_column).toBe(atExobase.overhead_column);
    for (const { limb_column: limb, overhead_column: overhead } of sights.slice(0, -1))
      expect(limb).toBeGreaterThan(overhead as number);
  });

  // After Chamberlain and Hunten (1987), computed from the stated formulas and checked by quadrature over velocities.
  it.each([
    {
      row: 1,
      ballistic: 0.6985453636581198,
      satellite: 0.1144128874369725,
      escaping: 0.04748118211131637,
      barometric: 0.5488116360940264,
    },
    {
      row: 2,
      ballistic: 0.3837724831168591,
      satellite: 0.22460234061205184,
      escaping: 0.04547827869893281,
      barometric: 0.22313016014842982,
    },
    {
      row: 3,
      ballistic: 0.1942969748763416,
      satellite: 0.23329632065277864,
      escaping: 0.03572130262637341,
      barometric: 0.1353352832366127,
    },
  ])(
    "agrees with the table of partition functions in row $row",
    ({ row, ballistic, satellite, escaping, barometric }) => {
      const level = halo.tables.levels[row];
      expect((level.ballistic as number) / density).toAgreeWith({
        what: "ballistic density of a corona, λ_c = 3",
        unit: "n_c",
        published: ballistic * barometric,
        within: { relative: 1e-6 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
      expect((level.satellite as number) / density).toAgreeWith({
        what: "satellite density of a corona, λ_c = 3",
        unit: "n_c",
        published: satellite * barometric,
        within: { relative: 1e-6 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
      expect((level.escaping as number) / density).toAgreeWith({
        what: "escaping density of a corona, λ_c = 3",
        unit: "n_c",
        published: escaping * barometric,
        within: { relative: 1e-6 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
      const sum = (level.ballistic as number) + (level.satellite as number) + (level.escaping as number);
      expect(level.number_density).toBeCloseToRelative(sum, 1e-12);
    },
  );

  // P(3/2, 3), from the same table: ballistic and escaping at r_c make ½(1 + P).
  it("begins with ½(1 + P) of the column's density, and says so", () => {
    const [level] = halo.tables.levels;
    const share = 0.9441948874526437;
    expect(((level.ballistic as number) + (level.escaping as number)) / density).toAgreeWith({
      what: "share ½(1 + P) of the column's density at the exobase, λ_c = 3",
      unit: "1",
      published: share,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(level.satellite).toBe(0);
    const step = halo.notes.find(({ code }) => code === "corona_step");
    expect(step?.message).toContain("0.9442 of the column's density");
  });

  it("gives columns along the limb and overhead that its own profile adds up to", () => {
    const none = resultOf(...withHydrogenAt(3, `reach = 2000000 km\nlevels = ${at(2)}`));
    const [level] = none.tables.levels;
    const { altitude, number_density: n } = none.profiles!;
    const from = level.altitude as number;
    const radii = altitude.map((z) => z + radiiKm.Mars * 1e3);
    const tangent = level.radius as number;
    let [overhead, limb] = [0, 0];
    for (let i = 1; i < altitude.length; i += 1) {
      if (altitude[i - 1] < from) continue;
      // n goes about as a power of r from one level to the next.
      const power = Math.log(n[i] / n[i - 1]) / Math.log(radii[i] / radii[i - 1]);
      for (let k = 0; k < 200; k += 1) {
        const [a, b] = [k, k + 1].map((step) => radii[i - 1] + ((radii[i] - radii[i - 1]) * step) / 200);
        const density = n[i - 1] * ((a + b) / 2 / radii[i - 1]) ** power;
        overhead += density * (b - a);
        const x = (r: number) => Math.sqrt(Math.max(0, r * r - tangent * tangent));
        limb += 2 * density * (x(b) - x(a));
      }
    }
    // The first piece of the profile begins above the level; the rest is a check of orders, not of digits.
    expect(level.overhead_column).toBeCloseToRelative(overhead, 0.05);
    expect(level.limb_column).toBeCloseToRelative(limb, 0.2);
  });

  it("has a profile from the exobase to its reach, falling outward", () => {
    const { altitude, number_density: n } = halo.profiles!;
    expect(altitude[0]).toBe(numberIn(below, "exobase.altitude"));
    expect(altitude.at(-1)).toBeCloseToRelative(20000e3, 1e-12);
    for (let i = 1; i < altitude.length; i += 1) {
      expect(altitude[i]).toBeGreaterThan(altitude[i - 1]);
      expect(n[i]).toBeLessThan(n[i - 1]);
    }
  });

  it("reaches ten radii by default, without satellites, and says both", () => {
    const cells = evaluateCells(withHydrogenAt(5, ""));
    const { result, defaults, gases } = cells.at(-1)!;
    expect(result.status).toBe("fine");
    expect(result.profiles!.altitude.at(-1)).toBeCloseToRelative(10 * radiiKm.Mars * 1e3, 1e-12);
    expect(result.profiles!.satellite.every((density) => density === 0)).toBe(true);
    expect(defaults.map(({ key }) => key)).toEqual(["satellites", "reach"]);
    expect(gases).toEqual(["H"]);
  });

  it("holds what is too thin for a number as null, not as zero", () => {
    const cells = withHydrogenAt(12, `levels = ${at(3)}`).map(([kind, name, text]): WrittenCell => [
      kind,
      name,
      text.replace("gas = H", "gas = CO2"),
    ]);
    expect(resultOf(...cells).tables.levels[0].escaping).toBeLessThan(1e-100);
    const [kind, name, text] = cells.at(-1)!;
    const cold = withHydrogenAt(40, "").slice(0, -1);
    const row = resultOf(...cold, [kind, name, text]).tables.levels[0];
    expect(row).toMatchObject({
      number_density: null,
      ballistic: null,
      escaping: null,
      overhead_column: null,
    });
  });
});

describe("a corona that is written wrongly", () => {
  const noteOf = (text: string, code: string) => {
    const cells = withHydrogenAt(5, "").slice(0, -1);
    const { notes } = resultOf(...cells, ["corona", "halo", text]);
    const note = notes.find((candidate) => candidate.code === code);
    if (!note) throw new Error(notes.map((other) => `${other.code}: ${other.message}`).join("\n"));
    return { note, at: note.range ? text.slice(note.range.from, note.range.to) : "" };
  };

  it.each([
    ["escape = leek\ngas = H", "reference", "leek"],
    ["escape = air\ngas = H", "reference", "air"],
    ["escape = leak\ngas = N2", "gas", "N2"],
    ["escape = leak\ngas = H\nsatellites = 1.2", "bound", "1.2"],
    ["escape = leak\ngas = H\nsatellites = -0.1", "bound", "-0.1"],
    ["escape = leak\ngas = H\nreach = 100 km", "reach_below_exobase", "100 km"],
    ["escape = leak\ngas = H\nreach = 100 K", "dimension", "100 K"],
    ["escape = leak\ngas = H\nlevels = 300 km, 150 km", "level_below_exobase", "150 km"],
    ["escape = leak\ngas = H\nlevel = 300 km", "unknown_key", "level"],
  ])("%j is told on the very characters", (text, code, characters) => {
    const { note, at } = noteOf(text, code);
    expect(at).toBe(characters);
    expect(note.level).toBe("fault");
    expect(note.message).toMatch(/^[*A-Z].*\.$/s);
  });

  it("says what is missing", () => {
    const { notes } = resultOf(["corona", "halo", ""]);
    expect(notes.map(({ message }) => message).join("\n")).toMatch(/\*escape\*[^]*\*gas\*/);
  });

  it("answers for the levels that are right", () => {
    const { tables } = resultOf(...withHydrogenAt(5, "levels = 150 km, 300 km"));
    expect(tables.levels.map(({ altitude }) => altitude)).toEqual([300e3]);
  });

  it("cautions beyond the Hill radius", () => {
    const cells = withHydrogenAt(5, "reach = 30000 km").map(([kind, name, text]): WrittenCell =>
      kind === "body"
        ? [kind, name, `${text}\nstar_distance = 0.02 au\nstar_mass = 1 solar_mass`]
        : [kind, name, text],
    );
    const caution = resultOf(...cells).notes.find(({ level }) => level === "caution");
    expect(caution).toMatchObject({ code: "corona_beyond_hill_radius", entry: "reach" });
    expect(caution?.message).toMatch(/Hill radius, 14.\d+.km/);
  });

  it("has nothing to build on where there is no exobase", () => {
    const cells = withHydrogenAt(5, "").map(([kind, name, text]): WrittenCell =>
      kind === "column" ? [kind, name, `${text}\ntop = 160 km`] : [kind, name, text],
    );
    expect(resultOf(...cells).notes.map(({ code }) => code)).toContain("reference_without_answer");
  });
});
