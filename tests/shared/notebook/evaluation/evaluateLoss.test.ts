import { describe, expect, it } from "vitest";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { evaluateCells, numberIn, resultOf, type WrittenCell } from "../evaluateCells";

/** Mars as the checks state it: g = 3.7279 m/s² on a radius of 3389.5 km. */
const mars: WrittenCell = ["body", "mars", "gm = 3.7279 m/s^2 * (3389.5 km)^2\nradius = 3389.5 km"];

const entries = {
  body: "mars",
  rate: "1e27 /s",
  gas: "H",
  begin: "1 Gyr",
  end: "4.56 Gyr",
  now: "4.56 Gyr",
};

function loss(changes: Record<string, string | null> = {}): WrittenCell {
  const lines = Object.entries({ ...entries, ...changes }).filter(([, value]) => value !== null);
  return ["loss", "lost", lines.map(([key, value]) => `${key} = ${value}`).join("\n")];
}

const answer = (changes: Record<string, string | null> = {}) => resultOf(mars, loss(changes));

/** A rate that never changed, over 1 Gyr. */
const steady = { exponent: "0", begin: "1 Gyr", end: "2 Gyr", now: "2 Gyr" };

describe("published numbers of losses", () => {
  // Arithmetic: 4πR² × 1000 kg/m³ × 1 m on 3389.5 km is 1.443714e17 kg.
  it("a layer of water of 1 m on a sphere of 3389.5 km is 1.443714e17 kg", () => {
    const result = answer({ ...steady, gas: "H2O", rate: "1.443714e17 kg / 18.015 u / 1 Gyr" });
    expect(numberIn(result, "mass")).toAgreeWith({
      what: "mass of 1 m of water on a sphere of 3389.5 km",
      unit: "kg",
      published: 1.443714e17,
      within: { relative: 1e-4 },
      source: "Arithmetic",
      mark: "computed independently",
    });
    expect(numberIn(result, "water_layer")).toAgreeWith({
      what: "water layer of 1.443714e17 kg on a sphere of 3389.5 km",
      unit: "m",
      published: 1,
      within: { relative: 1e-4 },
      source: "Arithmetic",
      mark: "computed independently",
    });
  });

  // Arithmetic, two atoms a molecule: 0.472024 m.
  it("1e8 cm⁻² s⁻¹ of H for 1 Gyr make 0.472 m of water", () => {
    const result = answer({ ...steady, rate: "1e8 /(cm^2 s) * 4 * pi * (3389.5 km)^2" });
    expect(numberIn(result, "water_layer")).toAgreeWith({
      what: "water layer of 1e8 H cm⁻² s⁻¹ for 1 Gyr on a sphere of 3389.5 km",
      unit: "m",
      published: 0.472024,
      within: { relative: 1e-4 },
      source: "Arithmetic",
      mark: "computed independently",
    });
    expect(numberIn(result, "particles")).toBeCloseToRelative(
      1e12 * 4 * Math.PI * 3389.5e3 ** 2 * 3.15576e16,
      1e-12,
    );
  });

  // Arithmetic: 1e5 Pa over 3.7279 m/s² is 26,825 kg/m².
  it("26,825 kg/m² of CO2 press with 1 bar", () => {
    const result = answer({
      ...steady,
      gas: "CO2",
      rate: "26825 kg/m^2 / 44.009 u / 1 Gyr * 4 * pi * (3389.5 km)^2",
    });
    expect(numberIn(result, "surface_pressure")).toAgreeWith({
      what: "surface pressure of 26,825 kg/m² of CO2, g = 3.7279 m/s²",
      unit: "Pa",
      published: 1e5,
      within: { relative: 1e-4 },
      source: "Arithmetic",
      mark: "computed independently",
    });
    expect(result.values).not.toHaveProperty("water_layer");
    expect(result.notes.map(({ code }) => code)).toContain("no_water_layer");
  });

  // Ribas et al. (2005): 6 times today's light 3.5 Gyr ago, 2.5 times 2.5 Gyr ago; today is 4.56 Gyr.
  it.each([
    [1.06, 6],
    [2.06, 2.5],
  ])("the light of the Sun at %d Gyr was %d times today's", (age, times) => {
    const [first] = answer({ begin: `${age} Gyr` }).tables.history;
    expect((first.rate as number) / 1e27).toAgreeWith({
      what: `the Sun's XUV at ${age} Gyr over today's`,
      unit: "1",
      published: times,
      within: { relative: 0.07 },
      source: "Ribas2005",
      mark: "published",
    });
  });
});

describe("a loss", () => {
  it("is named as the design names it, with a history from begin to end", () => {
    const result = answer();
    expect(Object.entries(result.values).map(([name, { unit }]) => `${name} ${unit}`)).toEqual([
      "particles 1",
      "mass kg",
      "water_layer m",
      "surface_pressure Pa",
    ]);
    const { history } = result.tables;
    expect(Object.keys(history[0]).join(" ")).toBe("age rate lost");
    expect(history[0]).toMatchObject({ age: 1e9 * 31557600, lost: 0 });
    expect(history.at(-1)).toMatchObject({ age: 4.56e9 * 31557600, rate: expect.closeTo(1e27, -15) });
    expect(history.at(-1)!.lost).toBeCloseToRelative(numberIn(result, "particles"), 1e-12);
    for (let i = 1; i < history.length; i += 1)
      expect(history[i].lost).toBeGreaterThan(history[i - 1].lost as number);
  });

  // ∫ (t/t_now)^−1.23 dt = t_now^1.23 (t_begin^−0.23 − t_end^−0.23)/0.23
  it("is the integral of its power law", () => {
    const gyr = 1e9 * 31557600;
    const time = (4.56 ** 1.23 * (1 - 4.56 ** -0.23)) / 0.23;
    expect(numberIn(answer(), "particles")).toBeCloseToRelative(1e27 * time * gyr, 1e-9);
  });

  it("goes with the rate, and with the power of the light", () => {
    const once = numberIn(answer(), "particles");
    expect(numberIn(answer({ rate: "3e27 /s" }), "particles")).toBeCloseToRelative(3 * once, 1e-12);
    const steep = numberIn(answer({ exponent: "2", xuv_exponent: "0.615" }), "particles");
    expect(steep).toBeCloseToRelative(once, 1e-12);
  });

  it("stands still before saturation", () => {
    const [first, ...rest] = answer({ begin: "0 Gyr", saturation: "0.5 Gyr" }).tables.history;
    const early = rest.filter(({ age }) => (age as number) < 0.5e9 * 31557600);
    for (const { rate } of early) expect(rate).toBeCloseToRelative(first.rate as number, 1e-12);
    expect(first.rate).toBeCloseToRelative(1e27 * (4.56 / 0.5) ** 1.23, 1e-9);
  });

  it.each([
    [{ saturation: "2 Gyr" }, 2e9 * 31557600],
    [{ saturation: "0.5 Gyr" }, null],
    [{ saturation: "2 Gyr", exponent: "0" }, null],
    [{ saturation: null, history: "points(0.9 Gyr: 6, 5 Gyr: 1)" }, null],
  ])("tells up to which age the light was saturated: %j", (change, saturation) => {
    const { lightHistory } = evaluateCells([mars, loss(change)])[1];
    expect(lightHistory).toEqual({ now: 4.56e9 * 31557600, saturation });
  });

  it("follows a history of points in any unit of light, or none", () => {
    const lost = (history: string) => numberIn(answer({ history }), "particles");
    const relative = lost("points(0.9 Gyr: 6, 2 Gyr: 2.5, 5 Gyr: 1)");
    expect(lost("points(0.9 Gyr: 24 mW/m^2, 2 Gyr: 10 mW/m^2, 5 Gyr: 4 mW/m^2)")).toBeCloseToRelative(
      relative,
      1e-12,
    );
    const alone = lost(`points(1 Gyr: ${4.56 ** 1.23}, 4.56 Gyr: 1)`);
    expect(alone).toBeCloseToRelative(numberIn(answer(), "particles"), 1e-9);
  });

  it("takes the rate of an escape cell and the mass of a gas cell", () => {
    const heavy = resultOf(mars, ["gas", "H", "mass = 2.0141 u"], loss());
    expect(numberIn(heavy, "mass")).toBeCloseToRelative(
      2.0141 * 1.66053906892e-27 * numberIn(heavy, "particles"),
      1e-9,
    );
  });

  it("shows what acts by default", () => {
    const { defaults } = evaluateCells([mars, loss()])[1];
    expect(defaults.map(({ text }) => text)).toEqual([
      "exponent = 1",
      "xuv_exponent = 1.23",
      "saturation = 0 Gyr",
    ]);
  });

  it("cautions where the law of the Sun is carried beyond its stars", () => {
    const codes = (changes: Record<string, string>) => answer(changes).notes.map(({ code }) => code);
    expect(codes({})).not.toContain("xuv_extrapolated");
    expect(codes({ begin: "0.01 Gyr" })).toContain("xuv_extrapolated");
    expect(codes({ begin: "0.01 Gyr", saturation: "0.1 Gyr" })).not.toContain("xuv_extrapolated");
    expect(codes({ end: "9 Gyr" })).toContain("xuv_extrapolated");
    expect(codes({ end: "9 Gyr", exponent: "0" })).not.toContain("xuv_extrapolated");
    expect(codes({ history: "points(2 Gyr: 2, 4 Gyr: 1)" })).toContain("history_extrapolated");
  });
});

describe("a loss that is written wrongly", () => {
  it.each<[changes: Record<string, string | null>, code: string, characters: string]>([
    [{ body: "venus" }, "reference", "venus"],
    [{ rate: "1e27 /m^2" }, "dimension", "1e27 /m^2"],
    [{ rate: "-1 /s" }, "bound", "-1 /s"],
    [{ gas: "Qq" }, "gas", "Qq"],
    [{ begin: "-1 Gyr" }, "bound", "-1 Gyr"],
    [{ end: "0.5 Gyr" }, "end_before_begin", "0.5 Gyr"],
    [{ now: "0 Gyr" }, "bound", "0 Gyr"],
    [{ begin: "0 Gyr" }, "loss_without_end", "0 Gyr"],
    [{ exponent: "11" }, "bound", "11"],
    [{ saturation: "3 km" }, "dimension", "3 km"],
    [{ history: "table(a, b)" }, "profile", "table"],
    [{ history: "3" }, "profile", "3"],
    [{ history: "points(1 Gyr: 6, 4 km: 1)" }, "dimension", "4 km"],
    [{ history: "points(1 Gyr: 6, 4 Gyr: 1 mW/m^2)" }, "dimension", "1 mW/m^2"],
    [{ history: "points(1 Gyr: 6, 0.5 Gyr: 9)" }, "points", "0.5 Gyr"],
    [{ history: "points(1 Gyr: 6, 4 Gyr: 0)" }, "bound", "0"],
    [{ xuv_exponent: "1", history: "points(1 Gyr: 6, 4 Gyr: 1)" }, "both_given", "history"],
  ])("%j is told on the very characters", (changes, code, characters) => {
    const cell = loss(changes);
    const { notes } = resultOf(mars, cell);
    const note = notes.find((candidate) => candidate.code === code);
    if (!note) throw new Error(notes.map((other) => `${other.code}: ${other.message}`).join("\n"));
    expect(cell[2].slice(note.range!.from, note.range!.to)).toBe(characters);
    expect(note.level).toBe("fault");
    expect(note.message).toMatch(/^[*A-Z].*\.$/s);
  });

  it("says what is missing", () => {
    const { notes } = resultOf(["loss", "lost", ""]);
    const messages = notes.map(({ message }) => message).join("\n");
    for (const key of ["body", "rate", "gas", "begin", "end", "now"]) expect(messages).toContain(`*${key}*`);
  });

  it("never answers with an infinity", () => {
    const { values, tables, notes } = answer({ rate: "1e299 /s", exponent: "10", xuv_exponent: "10" });
    expect(values).not.toHaveProperty("particles");
    expect(tables.history?.every(({ rate }) => Number.isFinite(rate)) ?? true).toBe(true);
    expect(notes.map(({ code }) => code)).toContain("beyond_numbers");
  });
});
