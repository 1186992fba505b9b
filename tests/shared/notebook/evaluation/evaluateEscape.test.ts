import { describe, expect, it } from "vitest";
import "../../../toBeCloseToRelative";
import { evaluateNotebook, type EvaluationMemory } from "../../../../shared/notebook/evaluateNotebook";
import type { EscapeModel } from "../../../../shared/notebook/evaluation/models";
import { evaluateCells, notebookOf, numberIn, resultOf, type WrittenCell } from "../evaluateCells";

const ilmara: WrittenCell = ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 4943 km"];
const air =
  "body = ilmara\nbase = 80 km\npressure = 0.42 Pa\ngases = CO2: rest, N2: 2.7 %, O: 0.9 %, H2: 15 ppm, H: 1.2 ppm\ntemperature = bates(base = 165 K, exosphere = 428 K, shape = 0.022 /km)";
const mixed: WrittenCell = [
  "column",
  "air",
  `${air}\neddy = power(base = 1e6 cm^2/s, exponent = 0.5, ceiling = 1e8 cm^2/s)`,
];
const still: WrittenCell = ["column", "air", air];

const leak = (text = ""): WrittenCell => ["escape", "leak", `column = air\ncoupling = open\n${text}`];
const answer = (text = "", column = mixed, body = ilmara) => resultOf(body, column, leak(text));
const codes = (text = "", column = mixed) => answer(text, column).notes.map(({ code }) => code);

describe("limits beside the rates", () => {
  const result = answer();
  const radius = numberIn(result, "exobase.radius");

  it("are in SI, and left out for gases that diffusion does not lift, with a remark", () => {
    const unit = (name: string) => result.values[name]?.unit;
    expect(unit("H.diffusion_limit")).toBe("m^-2 s^-1");
    expect(unit("H.supply_fraction")).toBe("1");
    expect(unit("H.depletion_time")).toBe("s");
    expect(unit("crossover_mass")).toBe("kg");
    expect(unit("wind_mass_rate")).toBe("kg s^-1");
    expect(result.values).not.toHaveProperty(["CO2.diffusion_limit"]);
    expect(result.values).toHaveProperty(["CO2.depletion_time"]);
    const reason = result.notes.find(({ code }) => code === "no_diffusion_limit");
    expect(reason?.message).toMatch(/^No diffusion limit of CO2: no lighter/);
  });

  it("are one to another as their definitions say", () => {
    for (const gas of ["H", "H2", "O", "N2"]) {
      const limit = numberIn(result, `${gas}.diffusion_limit`) * 4 * Math.PI * radius ** 2;
      const share = numberIn(result, `${gas}.supply_fraction`);
      expect(share).toBeCloseToRelative(numberIn(result, `${gas}.rate`) / limit, 1e-12);
    }
  });

  // Hunten (1973) for a trace gas: Φ = b X/H_a (1 − m/m_a), at the base where nothing mixes.
  it("come to b X (m_a − m) g/kT at the base of an unmixed isothermal column", () => {
    const gases = "gases = N2: rest, H: 1 ppm\ntemperature = 300 K";
    const column = air.replace(/gases[^]*/, gases);
    const h = resultOf(
      ilmara,
      ["gas", "H", "collision = N2: binary(A = 4e17 /(cm s), s = 0.7)\nthermal_diffusion = 0"],
      ["column", "air", `${column}\nlevels = 80 km`],
      leak(),
    );
    const levels = resultOf(ilmara, ["column", "air", `${column}\nlevels = 80 km`]).tables.levels[0];
    const [m, others] = [1.00782503223, 28.014].map((u) => u * 1.66053906892e-27);
    const lift = ((others - m) * (levels.gravity as number)) / (1.380649e-23 * 300);
    const spread = ((4943e3 + 80e3) / numberIn(h, "exobase.radius")) ** 2;
    const limit = 4e19 * 300 ** 0.7 * 1e-6 * lift * spread;
    expect(numberIn(h, "H.diffusion_limit")).toBeCloseToRelative(limit, 1e-5);
    expect(h.notes.map(({ code }) => code)).toContain("limits_at_base");
  });

  it("give as time to empty the column what it holds over what leaves", () => {
    const { profiles } = resultOf(ilmara, mixed);
    const exobase = numberIn(result, "exobase.altitude");
    let particles = 0;
    const { altitude } = profiles!;
    const shell = (i: number) => 4 * Math.PI * (4943e3 + altitude[i]) ** 2 * profiles!["O.number_density"][i];
    for (let i = 1; i < altitude.length && altitude[i] <= exobase; i += 1) {
      // Densities fall off exponentially between levels.
      const ratio = Math.log(shell(i - 1) / shell(i));
      particles += ((altitude[i] - altitude[i - 1]) * (shell(i - 1) - shell(i))) / ratio;
    }
    const time = particles / 10 ** numberIn(result, "O.log10_rate");
    expect(numberIn(result, "O.depletion_time")).toBeCloseToRelative(time, 1e-2);
  });

  it("caution on an open column that lets go more than diffusion supplies", () => {
    const note = answer("", still).notes.find(({ code }) => code === "above_diffusion_limit");
    expect(note).toMatchObject({ level: "caution", entry: "column" });
    expect(note?.message).toMatch(/^H leaves at [\d.]+ times the rate that diffusion supplies/);
  });

  it("name the gases of the crossover mass, which is above that of the gas that flows", () => {
    const note = result.notes.find(({ code }) => code === "crossover_gases");
    expect(note?.message).toMatch(/^The crossover mass is that of H2? flowing through CO2/);
    expect(numberIn(result, "crossover_mass")).toBeGreaterThan(1.66e-27);
    const alone = air.replace(/gases = .*/, "gases = CO2: 100 %");
    expect(codes("", ["column", "air", alone])).toEqual(
      expect.arrayContaining(["no_crossover_mass", "no_diffusion_limit"]),
    );
  });

  it("hold a rate too slow for a number in a twin", () => {
    const colder = air.replace(/temperature = .*/, "temperature = 60 K");
    const coldest = resultOf(ilmara, ["column", "air", colder], leak(), [
      "values",
      "v",
      "x = leak.CO2.depletion_time",
    ]);
    expect(coldest.notes[0].message).toContain("use *leak.CO2.log10_depletion_time* instead");
    const { values } = resultOf(ilmara, ["column", "air", colder], leak());
    expect(values["CO2.depletion_time"]).toEqual({ value: null, unit: "s" });
    expect(numberIn({ ...coldest, values }, "CO2.log10_depletion_time")).toBeGreaterThan(300);
    expect(values["CO2.mass_rate"]).toEqual({ value: null, unit: "kg s^-1" });
    expect(numberIn({ ...coldest, values }, "CO2.log10_mass_rate")).toBeLessThan(-300);
  });
});

describe("the energy limit", () => {
  const lit: WrittenCell = [
    "body",
    "ilmara",
    `${ilmara[2]}\nxuv_flux = 6 mW/m^2\nheating_efficiency = 15 %\nxuv_radius = 5200 km`,
  ];

  // Watson et al. (1981), without a star: ε π R_XUV² R F/(G M).
  it("is ε π R_XUV² R F/(GM), and less hard to reach with a star near", () => {
    const gm = numberIn(resultOf(lit), "gm");
    const expected = (0.15 * Math.PI * 5200e3 ** 2 * 4943e3 * 6e-3) / gm;
    const far = answer("", mixed, lit);
    expect(numberIn(far, "energy_limited_mass_rate")).toBeCloseToRelative(expected, 1e-12);
    const near: WrittenCell = [
      "body",
      "ilmara",
      `${lit[2]}\nstar_distance = 0.05 au\nstar_mass = 1 solar_mass`,
    ];
    const tide = numberIn(resultOf(near), "tidal_factor");
    const rate = numberIn(answer("", mixed, near), "energy_limited_mass_rate");
    expect(rate).toBeCloseToRelative(expected / tide, 1e-12);
  });

  it("is left out without flux and efficiency, and says which is missing", () => {
    expect(answer().values).not.toHaveProperty("energy_limited_mass_rate");
    const half = resultOf(["body", "ilmara", `${ilmara[2]}\nxuv_flux = 6 mW/m^2`]);
    expect(half.values.xuv_flux).toEqual({ value: 6e-3, unit: "W m^-2" });
    expect(half.notes.find(({ code }) => code === "energy_limit_incomplete")?.message).toContain(
      "*heating_efficiency*",
    );
  });

  it.each([
    ["heating_efficiency = 1.2", "bound", "1.2"],
    ["heating_efficiency = -1 %", "bound", "-1 %"],
    ["xuv_flux = -2 W/m^2", "bound", "-2 W/m^2"],
    ["xuv_flux = 2 W", "dimension", "2 W"],
  ])("refuses %j on the very characters", (line, code, characters) => {
    const text = `${ilmara[2]}\n${line}`;
    const note = resultOf(["body", "ilmara", text]).notes.find((candidate) => candidate.code === code)!;
    expect(text.slice(note.range!.from, note.range!.to)).toBe(characters);
  });
});

describe("where there is no exobase", () => {
  const hot: WrittenCell = ["column", "air", air.replace("428 K", "40000 K")];
  const lit: WrittenCell = ["body", "ilmara", `${ilmara[2]}\nxuv_flux = 1 W/m^2\nheating_efficiency = 10 %`];

  it("the wind is given instead, in the fault and as a value, with the energy limit", () => {
    const result = answer("", hot, lit);
    expect(Object.keys(result.values)).toEqual(["regime", "energy_limited_mass_rate", "wind_mass_rate"]);
    expect(result.values.regime).toEqual({ value: "wind" });
    const [fault] = result.notes;
    expect(fault).toMatchObject({ level: "fault", code: "no_exobase_runaway", entry: "column" });
    expect(fault.message).toMatch(/An isothermal wind from the base at 40.000.K would carry .*kg.s⁻¹\.$/);
  });

  it("cells below are told why the rates they name are not there", () => {
    const { notes } = resultOf(lit, hot, leak(), ["values", "v", "x = leak.H.rate"]);
    expect(notes[0].message).toBe("*leak* has no exobase, so there is no *leak.H.rate*.");
    const wind = resultOf(lit, hot, leak(), ["values", "v", "x = leak.wind_mass_rate"]);
    expect(numberIn(wind, "x")).toBeGreaterThan(0);
  });

  it("no wind is claimed where the column merely ends too low", () => {
    const result = answer("", ["column", "air", `${air}\ntop = 120 km`]);
    expect(result.values).not.toHaveProperty("regime");
    expect(result.notes[0].message).not.toContain("wind");
  });
});

describe("criteria", () => {
  it("are followed above the top that the column set for itself", () => {
    const thin = air.replace("0.42 Pa", "4e-4 Pa").replace("428 K", "300 K");
    const [bulk, depth] = ["", "criterion = unit_depth"].map((text) => answer(text, ["column", "air", thin]));
    expect(bulk.values).toHaveProperty(["exobase.altitude"]);
    expect(depth.values).toHaveProperty(["H.depletion_time"]);
  });

  it("put the exobase where each says, and name themselves", () => {
    const altitude = (text: string) => numberIn(answer(text), "exobase.altitude");
    const bulk = altitude("");
    expect(altitude("criterion = bulk")).toBe(bulk);
    // Without √2 the mean free path is longer, so that it meets the scale height lower down.
    expect(altitude("criterion = simple")).toBeLessThan(bulk);
    expect(altitude("criterion = unit_depth")).not.toBe(bulk);
    expect(altitude("criterion = gas\ngas = O")).not.toBe(altitude("criterion = gas\ngas = CO2"));
    const { convention } = evaluateCells([ilmara, mixed, leak("criterion = gas\ngas = O")])[2];
    expect(convention).toEqual({ coupling: "open", criterion: "l = H of O" });
  });

  it("leave Kn, H, l and the band those of the whole gas", () => {
    const [bulk, simple] = [answer(), answer("criterion = simple")];
    for (const end of ["exobase.lower", "exobase.upper"])
      expect(simple.values[end]?.value).toBe(bulk.values[end]?.value);
    const level = numberIn(simple, "exobase.mean_free_path") / numberIn(simple, "exobase.scale_height");
    expect(level).toBeCloseToRelative(Math.SQRT1_2, 1e-6);
  });

  it.each([
    ["criterion = bulky", "choice", "bulky"],
    ["criterion = gas", "missing_key", "gas"],
    ["criterion = gas\ngas = He", "gas", "He"],
    ["criterion = 3 K", "choice", "3 K"],
    ["coupling2 = open", "unknown_key", "coupling2"],
    ["correction = H: 0", "bound", "0"],
    ["correction = He: 1.2", "gas", "He"],
    ["correction = H: 1.2, H: 3", "gas_twice", "H: 3"],
    ["correction = 1.2", "by_gas", "1.2"],
    ["correction = H: 2 K", "dimension", "2 K"],
  ])("a cell with %j is told on the very characters", (line, code, characters) => {
    const cell = leak(line);
    const { notes } = resultOf(ilmara, mixed, cell);
    const note = notes.find((candidate) => candidate.code === code);
    if (!note) throw new Error(notes.map((other) => `${other.code}: ${other.message}`).join("\n"));
    expect(cell[2].slice(note.range!.from, note.range!.to)).toBe(characters);
    expect(note.level).toBe("fault");
  });

  it("remark on a gas that does not act", () => {
    const note = answer("gas = O").notes.find(({ code }) => code === "gas_without_criterion");
    expect(note).toMatchObject({ level: "remark", entry: "gas" });
  });
});

describe("correction factors", () => {
  it("act on rate, mass rate and supply, not on the flux", () => {
    const [plain, corrected] = [answer(), answer("correction = H: 0.73 ± 0.03, O: 2")];
    const ratio = (name: string) => numberIn(corrected, name) / numberIn(plain, name);
    for (const name of ["rate", "mass_rate", "supply_fraction"]) {
      expect(ratio(`H.${name}`)).toBeCloseToRelative(0.73, 1e-12);
      expect(ratio(`O.${name}`)).toBeCloseToRelative(2, 1e-12);
      expect(ratio(`H2.${name}`)).toBe(1);
    }
    expect(ratio("H.depletion_time")).toBeCloseToRelative(1 / 0.73, 1e-12);
    for (const name of ["jeans_flux", "effusion_velocity"]) expect(ratio(`H.${name}`)).toBe(1);
  });

  it("act by their centre, and still the remark on published ranges", () => {
    const ranges = (text: string) =>
      answer(text)
        .notes.filter(({ code }) => code === "jeans_correction_range")
        .map(({ message }) => /of (\w+) is/.exec(message)![1]);
    expect(ranges("")).toEqual(["H"]);
    expect(ranges("correction = H: 0.73 ± 0.03")).toEqual([]);
    expect(codes("correction = H: 0.73 ± 0.03")).toContain("acts_by_centre");
  });
});

describe("a coupled column", () => {
  const coupled = (text = "", column = mixed) =>
    resultOf(ilmara, column, ["escape", "leak", `column = air\n${text}`]);

  it("is the default, shown as such, and may be written out", () => {
    const { defaults, convention, result } = evaluateCells([
      ilmara,
      mixed,
      ["escape", "leak", "column = air"],
    ])[2];
    expect(defaults.find(({ key }) => key === "coupling")?.text).toBe("coupling = coupled");
    expect(convention).toEqual({ coupling: "coupled", criterion: "bulk, l = H" });
    expect(coupled("coupling = coupled").values).toEqual(result.values);
  });

  it("loses at its exobase what Jeans escape takes there", () => {
    const result = coupled();
    const area = 4 * Math.PI * numberIn(result, "exobase.radius") ** 2;
    for (const gas of ["H", "H2", "O", "CO2"]) {
      const [rate, flux] = ["rate", "jeans_flux"].map((name) => numberIn(result, `${gas}.log10_${name}`));
      expect(10 ** (rate - flux)).toBeCloseToRelative(area, 1e-6);
    }
  });

  it("loses less of a light gas than an open column, and never much more than diffusion supplies", () => {
    for (const column of [mixed, still]) {
      const [open, closed] = [answer("", column), coupled("", column)];
      expect(numberIn(closed, "H.rate")).toBeLessThan(numberIn(open, "H.rate"));
      expect(numberIn(closed, "H.supply_fraction")).toBeLessThan(1.05);
      // Carbon dioxide does not feel that it escapes; it feels the exobase, which hydrogen moves.
      expect(numberIn(closed, "CO2.log10_rate")).toBeCloseToRelative(numberIn(open, "CO2.log10_rate"), 0.05);
    }
  });

  it("is the open column where nothing escapes to speak of", () => {
    const cold: WrittenCell = [
      "column",
      "air",
      air.replace("428 K", "170 K").replace(", H2: 15 ppm, H: 1.2 ppm", ""),
    ];
    const [open, closed] = [answer("", cold), coupled("", cold)];
    expect(closed.values["exobase.altitude"]).toEqual(open.values["exobase.altitude"]);
    expect(numberIn(closed, "O.log10_rate")).toBeCloseToRelative(numberIn(open, "O.log10_rate"), 1e-9);
  });

  it("takes correction factors into the solution: the rate grows by less, the flux falls", () => {
    const [plain, corrected] = [coupled(), coupled("correction = H: 3")];
    const ratio = (name: string) => numberIn(corrected, name) / numberIn(plain, name);
    expect(ratio("H.rate")).toBeGreaterThan(1.1);
    expect(ratio("H.rate")).toBeLessThan(2.9);
    expect(ratio("H.jeans_flux")).toBeLessThan(1);
    expect(ratio("H.rate") / ratio("H.jeans_flux")).toBeCloseToRelative(3, 1e-3);
  });

  it("answers by every criterion", () => {
    const altitudes = ["bulk", "simple", "unit_depth", "gas\ngas = O"].map((criterion) =>
      numberIn(coupled(`criterion = ${criterion}`), "exobase.altitude"),
    );
    expect(new Set(altitudes).size).toBe(4);
    for (const altitude of altitudes) expect(altitude).toBeCloseToRelative(altitudes[0], 0.2);
  });

  it("hands the column that it leaves behind to the corona", () => {
    const cells: WrittenCell[] = [ilmara, mixed, ["escape", "leak", "column = air"]];
    const halo = resultOf(...cells, ["corona", "halo", "escape = leak\ngas = H"]);
    const [density] = ["H.number_density"].map((name) => numberIn(coupled(), name));
    expect(numberIn(halo, "exobase.number_density")).toBe(density);
    expect(density).toBeLessThan(0.9 * numberIn(answer(), "H.number_density"));
  });

  it("is a wind where no exobase is left", () => {
    const result = coupled("", ["column", "air", air.replace("428 K", "40000 K")]);
    expect(result.status).toBe("fault");
    expect(result.values.regime).toEqual({ value: "wind" });
    expect(result.values).toHaveProperty("wind_mass_rate");
  });

  it("is solved once for the same column, criterion and factors", () => {
    const cells: WrittenCell[] = [ilmara, mixed, ["escape", "leak", "column = air\ngases = H"]];
    const first = evaluateNotebook(notebookOf(cells));
    const more = notebookOf([...cells.slice(0, 2), ["escape", "leak", "column = air\ngases = H, O"]]);
    const model = (memory: EvaluationMemory) => memory.get("2")!.evaluated.above.model as EscapeModel;
    const second = evaluateNotebook(more, first.memory);
    expect(model(second.memory).coupled?.outcome).toBe(model(first.memory).coupled?.outcome);
    expect(second.evaluation).toEqual(evaluateNotebook(more).evaluation);
  });
});
