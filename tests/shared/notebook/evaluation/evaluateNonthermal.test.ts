import { describe, expect, it } from "vitest";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { evaluateCells, numberIn, resultOf, type WrittenCell } from "../evaluateCells";
import { notebookWithExobaseAt, radiiKm } from "../notebookWithExobaseAt";

const electronvolt = 1.602176634e-19;

const mars = notebookWithExobaseAt({ body: "Mars", radiusKm: radiiKm.Mars + 200, temperature: 240 });

const entries = {
  escape: "leak",
  ion: "O2+",
  ion_density: "points(150 km: 1e4 /cm^3, 400 km: 1e4 /cm^3)",
  electron_density: "points(150 km: 2e4 /cm^3, 500 km: 2e4 /cm^3)",
  electron_temperature: "1000 K",
};

function hot(changes: Record<string, string | null> = {}): WrittenCell {
  const lines = Object.entries({ ...entries, ...changes }).filter(([, value]) => value !== null);
  return ["nonthermal", "hot", lines.map(([key, value]) => `${key} = ${value}`).join("\n")];
}

const answer = (changes: Record<string, string | null> = {}) => resultOf(...mars, hot(changes));

describe("recombination above an exobase", () => {
  // Fox and Hać (1997) for the energies, Kella et al. (1997) for the branchings; at Mars the first two channels alone
  // send their atoms off.
  it("sends off the atoms of the first two channels of O2+ at Mars", () => {
    const { channels } = answer().tables;
    expect(channels.map(({ products }) => products)).toEqual([
      "O(3P) + O(3P)",
      "O(3P) + O(1D)",
      "O(1D) + O(1D)",
      "O(1D) + O(1S)",
    ]);
    [6.99, 5.02, 3.06, 0.84].forEach((energy, row) =>
      expect((channels[row].energy as number) / electronvolt).toAgreeWith({
        what: "energies of the recombination channels of O2+",
        unit: "eV",
        published: energy,
        within: { relative: 1e-12 },
        source: "FoxHac1997",
        mark: "secondary",
      }),
    );
    expect(channels.map(({ branching }) => branching)).toEqual([0.22, 0.42, 0.31, 0.05]);
    expect(channels.map(({ escapes }) => escapes)).toEqual([2, 2, 0, 0]);
  });

  it("gives each fragment its share of the energy, and counts those that get more than they need", () => {
    const { channels, fragments } = answer({ ion: "CO2+" }).tables;
    for (const { products, energy, escapes } of channels) {
      const own = fragments.filter((row) => row.products === products);
      expect(own).toHaveLength(2);
      const sum = own.reduce((total, row) => total + (row.energy as number), 0);
      expect(sum).toBeCloseToRelative(energy as number, 1e-12);
      expect(own.filter((row) => (row.energy as number) > (row.escape_energy as number))).toHaveLength(
        escapes as number,
      );
    }
    expect(fragments[0].fragment).toBe((channels[0].products as string).split(" + ")[0]);
  });

  // Computed from the masses and GM: an atom of O-16 needs 1.978 eV at 200 km on Mars, 9.617 eV at 500 km on Earth, and has
  // 3.495 eV at most.
  it("says what an atom needs and what it gets", () => {
    const told = (cells: WrittenCell[]) => {
      const { message } = resultOf(...cells, hot()).notes.find(({ code }) => code === "escape_energy")!;
      return /O needs ([\d.]+).eV and gets ([\d.]+).eV at most/.exec(message)!.slice(1).map(Number);
    };
    expect(told(mars)[0]).toAgreeWith({
      what: "escape energy of O above Mars, at 200 km, as told",
      unit: "eV",
      published: 1.978,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(told(mars)[1]).toBe(3.495);
    const earth = notebookWithExobaseAt({ body: "Earth", radiusKm: 6871.0084, temperature: 1000 });
    expect(told(earth)[0]).toAgreeWith({
      what: "escape energy of O above the Earth, at 500 km, as told",
      unit: "eV",
      published: 9.617,
      within: { relative: 5e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    const cells = [
      ...earth,
      hot({
        ion_density: "points(400 km: 1e4 /cm^3, 900 km: 10 /cm^3)",
        electron_density: "points(400 km: 1e4 /cm^3, 900 km: 10 /cm^3)",
      }),
    ];
    expect(numberIn(resultOf(...cells), "O2+.escape_rate")).toBe(0);
  });

  // Constant profiles: 4πr² ½ α n_e n_i Δz × 0.64 × 2, α of Mehr and Biondi (1969).
  it("comes to the rate of constant profiles by hand", () => {
    const radius = (radiiKm.Mars + 200) * 1e3;
    const alpha = 1.953e-13 * (300 / 1000) ** 0.7;
    const rate = 2 * Math.PI * radius ** 2 * alpha * 1e10 * 2e10 * 200e3 * 0.64 * 2;
    const result = answer();
    expect(numberIn(result, "O2+.escape_rate")).toAgreeWith({
      what: "hot O from constant profiles above Mars, α of Mehr and Biondi (1969)",
      unit: "s⁻¹",
      published: rate,
      within: { relative: 1e-6 },
      source: "Arithmetic",
      mark: "computed independently",
    });
    expect(result.values["O2+.escape_rate"].unit).toBe("s^-1");
    const mixed = answer({
      ion_density: "1e4 /cm^3",
      electron_density: "points(150 km: 2e4 /cm^3, 400 km: 2e4 /cm^3)",
    });
    expect(numberIn(mixed, "O2+.escape_rate")).toBeCloseToRelative(rate, 1e-6);
    const sampled = answer({ electron_temperature: "points(100 km: 1000 K, 130 km: 1000 K)" });
    expect(numberIn(sampled, "O2+.escape_rate")).toBeCloseToRelative(rate, 1e-6);
  });

  it("can be referred to by the ion's own name", () => {
    const { values } = resultOf(...mars, hot(), ["values", "v", "x = 2 * hot.O2+.escape_rate + 0 /s"]);
    expect(values.x.value).toBeCloseToRelative(2 * numberIn(answer(), "O2+.escape_rate"), 1e-15);
  });

  it("keeps to energies where the handbook has no branching", () => {
    const result = answer({ ion: "CO2+" });
    expect(result.values).not.toHaveProperty(["CO2+.escape_rate"]);
    expect(result.tables.channels[0]).toMatchObject({ products: "CO(X1Σ+) + O(3P)", branching: null });
    expect(result.notes.find(({ code }) => code === "branching_unknown")).toMatchObject({
      level: "caution",
      entry: "ion",
    });
  });

  it("cautions of densities that are one value each, and of profiles that begin too high", () => {
    const codes = (changes: Record<string, string>) =>
      answer(changes)
        .notes.filter(({ level }) => level === "caution")
        .map(({ code }) => code);
    expect(codes({})).toEqual([]);
    expect(codes({ ion_density: "1e4 /cm^3", electron_density: "1e4 /cm^3" })).toEqual(["constant_to_top"]);
    expect(codes({ electron_temperature: "points(250 km: 1000 K, 300 km: 1200 K)" })).toEqual([
      "temperature_extrapolated",
    ]);
    expect(codes({ ion_density: "points(250 km: 1e4 /cm^3, 400 km: 1e3 /cm^3)" })).toEqual([
      "profile_begins_above_exobase",
    ]);
  });
});

describe("ions picked up by a wind", () => {
  // r = mv/(qB) and 2mv² at 400 km/s, computed with the mass of the proton for H+ and of the neutral for the others.
  it.each([
    ["O+", 3, 22103e3, 53.05e3],
    ["O+", 10, 6631e3, 53.05e3],
    ["H+", 3, 1392e3, 3.341e3],
    ["CO2+", 3, 60804e3, 145.9e3],
  ])("%s in %d nT gyrates on %d m with up to %d eV", (ion, field, radius, energy) => {
    const result = answer({ ion, flow_speed: "400 km/s", magnetic_field: `${field} nT` });
    expect(numberIn(result, `${ion}.gyroradius`)).toBeCloseToRelative(radius, 5e-4);
    expect(numberIn(result, `${ion}.pickup_energy`)).toBeCloseToRelative(energy * electronvolt, 5e-4);
    expect(result.values[`${ion}.gyroradius`].unit).toBe("m");
    expect(result.values[`${ion}.pickup_energy`].unit).toBe("J");
  });

  it("need no profiles where the handbook has no recombination of them", () => {
    const none = { ion_density: null, electron_density: null, electron_temperature: null };
    const result = answer({ ...none, ion: "O+", flow_speed: "400 km/s" });
    expect(result.status).toBe("fine");
    expect(Object.keys(result.values)).toEqual(["O+.pickup_energy"]);
    expect(result.notes.map(({ code }) => code)).toContain("no_recombination");
  });

  it("want the flow beside the field", () => {
    expect(answer({ magnetic_field: "3 nT" }).notes.map(({ code }) => code)).toContain("pickup_incomplete");
  });
});

describe("a nonthermal cell that is written wrongly", () => {
  it.each<[changes: Record<string, string | null>, code: string, characters: string]>([
    [{ escape: "leek" }, "reference", "leek"],
    [{ ion: "O2" }, "ion", "O2"],
    [{ ion: "O3+" }, "ion", "O3+"],
    [{ ion: "3 K" }, "ion", "3 K"],
    [{ ion_density: "1e4" }, "dimension", "1e4"],
    [{ ion_density: "0 /cm^3" }, "bound", "0 /cm^3"],
    [{ ion_density: "points(200 km: 1e4 /cm^3)" }, "points", "points(200 km: 1e4 /cm^3)"],
    [{ ion_density: "pionts(200 km: 1e4 /cm^3, 300 km: 1 /cm^3)" }, "profile", "pionts"],
    [
      { ion_density: "points(100 km: 1e4 /cm^3, 150 km: 1e3 /cm^3)" },
      "profile_below_exobase",
      "points(100 km: 1e4 /cm^3, 150 km: 1e3 /cm^3)",
    ],
    [{ electron_temperature: "points(200 km: 1200 K, 190 km: 1300 K)" }, "points", "190 km"],
    [{ electron_temperature: "-3 K" }, "bound", "-3 K"],
    [{ flow_speed: "0 km/s" }, "bound", "0 km/s"],
    [{ magnetic_field: "3 K" }, "dimension", "3 K"],
  ])("%j is told on the very characters", (changes, code, characters) => {
    const cell = hot(changes);
    const { notes } = resultOf(...mars, cell);
    const note = notes.find((candidate) => candidate.code === code);
    if (!note) throw new Error(notes.map((other) => `${other.code}: ${other.message}`).join("\n"));
    expect(cell[2].slice(note.range!.from, note.range!.to)).toBe(characters);
    expect(note.level).toBe("fault");
    expect(note.message).toMatch(/^[*A-Z].*\.$/s);
  });

  it("offers the ion of a gas", () => {
    const cell = hot({ ion: "O2 # ions" });
    const { remedy } = resultOf(...mars, cell).notes.find(({ code }) => code === "ion")!;
    expect(remedy).toMatchObject({ label: "Change to O2+", replacement: "O2+" });
  });

  it("says what is missing", () => {
    const { notes } = resultOf(["nonthermal", "hot", "ion = O2+"]);
    const messages = notes.map(({ message }) => message).join("\n");
    for (const key of ["escape", "ion_density", "electron_density", "electron_temperature"])
      expect(messages).toContain(`*${key}*`);
  });

  it("still shows the channels where a profile has a fault", () => {
    const { tables, values } = evaluateCells([...mars, hot({ ion_density: "3 K" })]).at(-1)!.result;
    expect(tables.channels).toHaveLength(4);
    expect(values).toEqual({});
  });
});
