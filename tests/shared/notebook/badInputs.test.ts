/** What one may write wrongly, and where each fault is told: on the very characters. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import type { CellEvaluation, Note } from "../../../shared/notebook/result";
import { evaluateCells, notebookOf, resultOf, type WrittenCell } from "./evaluateCells";

const ilmara: WrittenCell = ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 4943 km"];

const entries = {
  body: "ilmara",
  base: "80 km",
  pressure: "0.42 Pa",
  gases: "CO2: rest, N2: 2.7 %, O: 0.9 %, H2: 15 ppm",
  temperature: "bates(base = 165 K, exosphere = 428 K, shape = 0.022 /km)",
  eddy: "power(base = 1e6 cm^2/s, exponent = 0.5, ceiling = 1e8 cm^2/s)",
};

/** A sound column, but for what is changed; `null` leaves an entry out. */
function column(changes: Record<string, string | null> = {}): WrittenCell {
  const lines = Object.entries({ ...entries, ...changes }).filter(([, value]) => value !== null);
  return ["column", "dayside", lines.map(([key, value]) => `${key} = ${value}`).join("\n")];
}

const leak: WrittenCell = ["escape", "leak", "column = dayside\ncoupling = open"];

function noteOf(
  cells: readonly WrittenCell[],
  code: string,
): { note: Note; text: string; cell: CellEvaluation } {
  const evaluations = evaluateCells(cells);
  const cell = evaluations.at(-1)!;
  const note = cell.result.notes.find((candidate) => candidate.code === code);
  if (!note) {
    const found = cell.result.notes.map((other) => `${other.code}: ${other.message}`).join("\n");
    throw new Error(`No note ${code} among\n${found}`);
  }
  const written = cells.at(-1)![2];
  return { note, text: note.range ? written.slice(note.range.from, note.range.to) : "", cell };
}

it("has nothing to complain of in the sound cells that the cases change", () => {
  for (const { result } of evaluateCells([ilmara, column(), leak])) {
    expect(result.notes.filter(({ level }) => level === "fault")).toEqual([]);
  }
});

describe("a fault stands on the very characters", () => {
  it.each<[what: string, cells: WrittenCell[], code: string, characters: string]>([
    ["a wrong dimension", [["body", "b", "mass = 3 K\nradius = 1 km"]], "dimension", "3 K"],
    ["a number without its unit", [ilmara, column({ base: "80" })], "dimension", "80"],
    ["an unknown unit", [["body", "b", "mass = 3 stone\nradius = 1 km"]], "unknown_unit", "stone"],
    ["an unknown key", [["body", "b", "mass = 3 kg\nradius = 1 km\nradios = 1 km"]], "unknown_key", "radios"],
    ["a key twice", [["body", "b", "mass = 3 kg\nradius = 1 km\nmass = 4 kg"]], "duplicate_key", "mass"],
    [
      "a name given twice",
      [
        ["values", "v", "x = 1"],
        ["values", "w", "x = 2"],
      ],
      "name_twice",
      "x",
    ],
    ["a reserved name", [["values", "v", "km = 1"]], "bad_name", "km"],
    ["a gas as a name", [["values", "v", "CO2 = 1"]], "bad_name", "CO2"],
    ["a missing name", [["values", "v", "x = 2 * y"]], "unknown_name", "y"],
    ["a name of the line below", [["values", "v", "x = 2 * y\ny = 1"]], "unavailable", "y"],
    ["a body that is none", [["values", "given", "x = 1"], column({ body: "given" })], "reference", "given"],
    ["a body that is not there", [ilmara, column({ body: "ilmarra" })], "reference", "ilmarra"],
    [
      "a result that is not there",
      [ilmara, ["values", "v", "x = ilmara.surface_gravitas"]],
      "unknown_name",
      "ilmara.surface_gravitas",
    ],
    [
      "fractions over 1",
      [ilmara, column({ gases: "CO2: 80 %, N2: 30 %" })],
      "gases_sum",
      "CO2: 80 %, N2: 30 %",
    ],
    [
      "fractions below 1 without a rest",
      [ilmara, column({ gases: "CO2: 80 %, N2: 10 %" })],
      "gases_sum",
      "CO2: 80 %, N2: 10 %",
    ],
    [
      "a rest below zero",
      [ilmara, column({ gases: "CO2: rest, N2: 80 %, O: 30 %" })],
      "gases_sum",
      "CO2: rest, N2: 80 %, O: 30 %",
    ],
    ["two rests", [ilmara, column({ gases: "CO2: rest, N2: rest" })], "rest_twice", "N2: rest"],
    ["a gas twice", [ilmara, column({ gases: "CO2: rest, N2: 1 %, N2: 2 %" })], "gas_twice", "N2: 2 %"],
    ["an unknown gas", [ilmara, column({ gases: "CO2: rest, Qq: 1 %" })], "gas", "Qq"],
    ["a negative fraction", [ilmara, column({ gases: "CO2: rest, N2: -1 %" })], "bound", "-1 %"],
    ["a temperature of zero", [ilmara, column({ temperature: "0 K" })], "bound", "0 K"],
    [
      "a temperature below zero",
      [ilmara, column({ temperature: "bates(base = 165 K, exosphere = -3 K, shape = 0.02 /km)" })],
      "bound",
      "-3 K",
    ],
    [
      "a temperature that runs below zero at the base",
      [
        ilmara,
        column({ temperature: "bates(base = 165 K, exosphere = 428 K, shape = 0.1 /km, at = 120 km)" }),
      ],
      "temperature_at_base",
      "bates(base = 165 K, exosphere = 428 K, shape = 0.1 /km, at = 120 km)",
    ],
    [
      "mass and gm both",
      [["body", "b", "mass = 3e24 kg\ngm = 2e14 m^3/s^2\nradius = 5000 km"]],
      "both_given",
      "gm",
    ],
    [
      "pressure and density both",
      [ilmara, column({ number_density: "1e14 /cm^3" })],
      "both_given",
      "number_density",
    ],
    [
      "a density beside those of the gases",
      [ilmara, column({ gases: "CO2: 1e20 /m^3" })],
      "both_given",
      "pressure",
    ],
    [
      "points that are not sorted",
      [ilmara, column({ temperature: "points(80 km: 165 K, 200 km: 400 K, 120 km: 300 K)" })],
      "points",
      "120 km",
    ],
    [
      "points that repeat an altitude",
      [ilmara, column({ temperature: "points(80 km: 165 K, 80 km: 400 K)" })],
      "points",
      "80 km",
    ],
    [
      "a ceiling below the base",
      [ilmara, column({ eddy: "power(base = 1e8 cm^2/s, exponent = 0.5, ceiling = 1e6 cm^2/s)" })],
      "bound",
      "1e6 cm^2/s",
    ],
    [
      "an argument that is missing",
      [ilmara, column({ temperature: "bates(base = 165 K, exosphere = 428 K)" })],
      "argument",
      "bates",
    ],
    [
      "a level above the column",
      [ilmara, column({ top: "600 km", levels: "100 km, 700 km" })],
      "level_outside",
      "700 km",
    ],
    ["a level below the column", [ilmara, column({ levels: "20 km" })], "level_outside", "20 km"],
    ["a top below the base", [ilmara, column({ top: "60 km" })], "top_below_base", "60 km"],
    ["a base below the centre", [ilmara, column({ base: "-5000 km" })], "base_below_centre", "-5000 km"],
    [
      "a base above the exobase",
      [ilmara, column({ pressure: "1e-12 Pa" })],
      "base_above_exobase",
      "1e-12 Pa",
    ],
    [
      "a base that is not bound",
      [["body", "pebble", "mass = 1e16 kg\nradius = 10 km"], column({ body: "pebble", base: "0 km" })],
      "base_unbound",
      entries.temperature,
    ],
    [
      "a coupling that is none",
      [ilmara, column(), ["escape", "leak", "column = dayside\ncoupling = closed"]],
      "choice",
      "closed",
    ],
    [
      "a criterion that is none",
      [ilmara, column(), ["escape", "leak", "column = dayside\ncoupling = open\ncriterion = depth"]],
      "choice",
      "depth",
    ],
    [
      "a gas that the column does not hold",
      [ilmara, column(), ["escape", "leak", "column = dayside\ncoupling = open\ngases = He"]],
      "gas",
      "He",
    ],
    ["an absurd power", [["values", "v", "x = 10^10^10"]], "out_of_range", "10^10^10"],
    [
      "nesting without end",
      [["values", "v", `x = ${"(".repeat(200)}1${")".repeat(200)}`]],
      "too_deep",
      `${"(".repeat(200)}1${")".repeat(200)}`,
    ],
    ["a control character", [["values", "v", "x = 1\u0007 m"]], "hidden_character", "\u0007"],
    ["a character that turns the text", [["values", "v", "x = \u202e1 m"]], "hidden_character", "\u202e"],
    ["a gas cell without a formula", [["gas", "water", "mass = 18 u"]], "bad_name", ""],
    ["a gas cell of an unknown gas without data", [["gas", "Zz", "mass = 18 u"]], "missing_key", ""],
    [
      "a collision with itself",
      [["gas", "CO2", "collision = CO2: binary(A = 1e17 /(cm s), s = 0.7)"]],
      "collision_with_itself",
      "CO2: binary(A = 1e17 /(cm s), s = 0.7)",
    ],
    ["a body of no handbook", [["body", "b", "like = handbook(Vulcan)"]], "handbook", "Vulcan"],
    [
      "a period of zero",
      [["body", "b", "mass = 1e24 kg\nradius = 1e6 m\nrotation_period = 0 h\nlatitude = 3 deg"]],
      "bound",
      "0 h",
    ],
    [
      "a latitude beyond the pole",
      [["body", "b", "mass = 1e24 kg\nradius = 1e6 m\nlatitude = 91 deg"]],
      "bound",
      "91 deg",
    ],
  ])("%s", (_, cells, code, characters) => {
    const { note, text, cell } = noteOf(cells, code);
    expect(text).toBe(characters);
    expect(note.level).toBe("fault");
    expect(note.message).toMatch(/^[*A-Z].*\.$/s);
    expect(cell.result.status).toBe("fault");
    if (note.range) expect(note.line).toBeGreaterThan(0);
  });

  it.each<[what: string, cells: WrittenCell[], code: string, characters: string]>([
    ["a top below the exobase", [ilmara, column({ top: "150 km" })], "top_below_exobase", "150 km"],
    [
      "points that end too low",
      [ilmara, column({ temperature: "points(80 km: 165 K, 200 km: 400 K)" })],
      "temperature_extrapolated",
      "points(80 km: 165 K, 200 km: 400 K)",
    ],
    [
      "bates below its altitude",
      [
        ilmara,
        column({ temperature: "bates(base = 165 K, exosphere = 200 K, shape = 0.01 /km, at = 90 km)" }),
      ],
      "bates_below_reference",
      "bates(base = 165 K, exosphere = 200 K, shape = 0.01 /km, at = 90 km)",
    ],
    [
      "an unbound exosphere",
      [ilmara, column({ temperature: "bates(base = 165 K, exosphere = 90000 K, shape = 0.02 /km)" })],
      "runaway",
      "bates(base = 165 K, exosphere = 90000 K, shape = 0.02 /km)",
    ],
  ])("a caution as well: %s", (_, cells, code, characters) => {
    const { note, text } = noteOf(cells, code);
    expect(text).toBe(characters);
    expect(note.level).toBe("caution");
  });

  it("names the nearest right key and changes to it", () => {
    const { note } = noteOf([ilmara, column({ level: "80 km" })], "unknown_key");
    expect(note.message).toBe("No entry *level* in a column. The nearest is *levels*.");
    expect(note.remedy).toMatchObject({ label: "Change to levels", replacement: "levels" });
    expect(note.entry).toBe("level");
  });

  it.each([
    ["body", "", ["mass", "radius"]],
    ["column", "", ["body", "base", "number_density", "gases", "temperature"]],
    ["escape", "", ["column"]],
  ] as const)("says what is missing in an empty %s", (kind, text, keys) => {
    const { notes, values } = resultOf([kind, "empty", text]);
    const missing = notes.filter(({ code }) => code === "missing_key").map(({ message }) => message);
    for (const key of keys) expect(missing.join("\n")).toContain(`*${key}*`);
    expect(missing).toHaveLength(keys.length);
    expect(values).toEqual({});
  });

  it("says of a name that stands further down that it does", () => {
    const cells: WrittenCell[] = [
      ["values", "v", "x = 2 * y"],
      ["values", "w", "y = 1 m"],
    ];
    const [{ result }] = evaluateCells(cells);
    expect(result.notes[0]).toMatchObject({
      code: "unavailable",
      message: expect.stringContaining("further down"),
    });
    const [above] = evaluateCells([column(), ilmara]);
    expect(above.result.notes.find(({ code }) => code === "reference_below")?.message).toContain(
      "further down",
    );
  });

  it("says why a column without an exobase has no escape, with the largest Knudsen number", () => {
    const { note, text } = noteOf([ilmara, column({ top: "150 km" }), leak], "no_exobase_top_below_exobase");
    expect(text).toBe("dayside");
    expect(note.message).toMatch(/largest Knudsen number is 0\.0\d+, at 150 km/);
  });

  it("says of a cell that builds on a broken one where to look", () => {
    const { note } = noteOf([ilmara, column({ gases: "CO2: 5 %" }), leak], "reference_without_answer");
    expect(note.message).toContain("*dayside*");
  });
});

describe("what remains is still answered", () => {
  it("by a body with an unknown key", () => {
    expect(resultOf(["body", "b", "mass = 1e24 kg\nradius = 1e6 m\ncolour = 3"]).values).toHaveProperty(
      "surface_gravity",
    );
  });

  it("by a column with a level outside", () => {
    const { tables, values } = resultOf(ilmara, column({ levels: "100 km, 5 km, 120 km" }));
    expect(tables.levels.map(({ altitude }) => altitude)).toEqual([100e3, 120e3]);
    expect(values).toHaveProperty(["base.pressure"]);
  });

  it("by an escape cell over a column with a fault that does not matter", () => {
    expect(resultOf(ilmara, column({ level: "5 km" }), leak).values).toHaveProperty(["exobase.altitude"]);
  });

  it("by entries beside a faulty one", () => {
    const { values } = resultOf(["values", "v", "x = 1 m +\ny = 2 m\nz = 2 * y"]);
    expect(values).toEqual({ y: { value: 2, unit: "m" }, z: { value: 4, unit: "m" } });
  });
});

describe("whatever is written", { timeout: 60_000 }, () => {
  it("CRLF and tabs are read like line ends and spaces", () => {
    const { values, notes } = resultOf(["values", "v", "x\t= 1 m\r\ny = 2 m\r\n"]);
    expect(values).toEqual({ x: { value: 1, unit: "m" }, y: { value: 2, unit: "m" } });
    expect(notes.every(({ level }) => level === "remark")).toBe(true);
  });

  it("a cell of 10,000 lines is answered within two seconds of computing", () => {
    const text = Array.from({ length: 10_000 }, (_, line) => `x_${line} = ${line} km + 1 m # line`).join(
      "\n",
    );
    const begun = process.cpuUsage();
    const { values, status } = resultOf(["values", "v", text]);
    expect(Object.keys(values)).toHaveLength(10_000);
    expect(status).toBe("fine");
    const { user, system } = process.cpuUsage(begun);
    expect((user + system) / 1e6).toBeLessThan(2);
  });

  const magnitude = fc.oneof(
    fc.constantFrom(
      "1e300",
      "1e-300",
      "-1e300",
      "0",
      "1e308",
      "1e999",
      "10^10^10",
      "1e150",
      "-1",
      "1e-30",
      "1e30",
      "3",
    ),
    fc.double({ noNaN: true, noDefaultInfinity: true }).map(String),
  );
  const unit = fc.constantFrom(
    "",
    " K",
    " km",
    " /km",
    " kg",
    " Pa",
    " /cm^3",
    " %",
    " ppm",
    " cm^2/s",
    " earth_mass",
    " u",
    " s",
  );
  const quantity = fc.tuple(magnitude, unit).map(([number, of]) => number + of);
  const change = fc.record(
    {
      base: quantity,
      pressure: quantity,
      number_density: quantity,
      temperature: fc.oneof(
        quantity,
        fc
          .tuple(quantity, quantity, quantity)
          .map(([a, b, c]) => `bates(base = ${a}, exosphere = ${b}, shape = ${c})`),
        fc
          .tuple(quantity, quantity, quantity, quantity)
          .map(([a, b, c, d]) => `points(${a}: ${b}, ${c}: ${d})`),
      ),
      eddy: fc.oneof(
        quantity,
        fc
          .tuple(quantity, quantity, quantity)
          .map(([a, b, c]) => `power(base = ${a}, exponent = ${b}, ceiling = ${c})`),
      ),
      gases: fc.tuple(quantity, quantity).map(([a, b]) => `CO2: rest, H: ${a}, N2: ${b}`),
      top: quantity,
      levels: fc.tuple(quantity, quantity).map(([a, b]) => `${a}, ${b}`),
    },
    { requiredKeys: [] },
  );
  const bodyText = fc.tuple(quantity, quantity).map(([a, b]) => `mass = ${a}\nradius = ${b}`);

  function requireNumbers(value: unknown): void {
    if (typeof value === "number") expect(Number.isFinite(value)).toBe(true);
    else if (Array.isArray(value)) value.forEach(requireNumbers);
    else if (typeof value === "object" && value !== null) Object.values(value).forEach(requireNumbers);
  }

  it("nothing throws and no number is NaN or infinite", () => {
    fc.assert(
      fc.property(fc.oneof(fc.constant(ilmara[2]), bodyText), change, (bodyWritten, changes) => {
        const cells: WrittenCell[] = [
          ["body", "ilmara", bodyWritten],
          column(changes),
          leak,
          ["escape", "fed", "column = dayside"],
          ["values", "v", "x = leak.H.rate"],
          ["corona", "halo", "escape = leak\ngas = H\nsatellites = 0.5\nlevels = 3000 km"],
          [
            "nonthermal",
            "hot",
            "escape = leak\nion = O2+\nion_density = 1e4 /cm^3\nelectron_density = 1e4 /cm^3\nelectron_temperature = 1000 K",
          ],
          [
            "loss",
            "lost",
            "body = ilmara\nrate = leak.H.rate\ngas = H\nbegin = 1 Gyr\nend = 4 Gyr\nnow = 4 Gyr",
          ],
        ];
        const { evaluation } = evaluateNotebook(notebookOf(cells));
        for (const { result, understood, strip } of evaluation.cells) {
          requireNumbers([result.values, result.tables, result.profiles, strip]);
          for (const { text } of understood) expect(text).not.toMatch(/NaN|Infinity|undefined/);
          for (const { message, code } of result.notes) {
            expect(message).not.toMatch(/NaN|Infinity|undefined/);
            expect(code).not.toBe("not_computed");
          }
        }
      }),
      { numRuns: 150, seed: 5 },
    );
  });

  it("words of the programming language are names like any other", () => {
    const { values, notes } = resultOf(ilmara, [
      "values",
      "v",
      "constructor = 1 m\ntoString = 2 * constructor\nx = ilmara.constructor",
    ]);
    expect(values).toEqual({ constructor: { value: 1, unit: "m" }, toString: { value: 2, unit: "m" } });
    expect(notes.map(({ code }) => code)).toEqual(["unknown_name"]);
  });

  it("any text at all gets notes inside it", () => {
    fc.assert(
      fc.property(
        fc.constantFrom("values", "body", "gas", "column", "escape", "corona", "nonthermal", "loss"),
        fc.string({ unit: "binary", maxLength: 60 }),
        (kind, text) => {
          const { notes } = resultOf([kind as "values", "H", text]);
          for (const { range } of notes) {
            if (!range) continue;
            expect(range.from).toBeGreaterThanOrEqual(0);
            expect(range.to).toBeLessThanOrEqual(text.length);
          }
        },
      ),
      { numRuns: 200, seed: 6 },
    );
  });
});
