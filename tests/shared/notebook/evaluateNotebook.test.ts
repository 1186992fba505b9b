import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cellSchemas } from "../../../shared/notebook/cellSchemas";
import { cellKinds } from "../../../shared/notebook/document";
import { editDocument, type DocumentEdit } from "../../../shared/notebook/editDocument";
import { engineVersion } from "../../../shared/notebook/engine";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import { resultDocument } from "../../../shared/notebook/resultDocument";
import "../../toBeCloseToRelative";
import { evaluateCells, notebookOf, numberIn, resultOf, type WrittenCell } from "./evaluateCells";

const ilmara: WrittenCell = ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 0.775 earth_radius"];
const given: WrittenCell = [
  "values",
  "given",
  "T_quiet = 428 ± 45 K # occultations\nK_base = 1e6 cm^2/s within factor 2",
];
const dayside: WrittenCell = [
  "column",
  "dayside",
  [
    "body        = ilmara",
    "base        = 80 km",
    "pressure    = 0.42 Pa",
    "gases       = CO2: rest, N2: 2.7 %, O: 0.9 %, H2: 15 ppm, H: 1.2 ppm",
    "temperature = bates(base = 165 K, exosphere = T_quiet, shape = 0.022 /km)",
    "eddy        = power(base = K_base, exponent = 0.5, ceiling = 1e8 cm^2/s)",
    "levels      = 80 km, 120 km",
  ].join("\n"),
];
const leak: WrittenCell = ["escape", "leak", "column = dayside\ncoupling = open\ngases = H, CO2"];
const whole = [
  ["prose", "intro", "Ilmara is *dry*."],
  ilmara,
  given,
  dayside,
  leak,
] as const satisfies WrittenCell[];

describe("the answers of a notebook", () => {
  const { evaluation } = evaluateNotebook(notebookOf(whole));
  const [prose, body, values, column, escape] = evaluation.cells;

  it("stand in the order of the cells, with engine and title", () => {
    expect(evaluation).toMatchObject({ engine: engineVersion, title: "A test" });
    expect(evaluation.cells.map(({ id }) => id)).toEqual(["0", "1", "2", "3", "4"]);
    expect(prose.result).toEqual({
      kind: "prose",
      name: "intro",
      status: "fine",
      values: {},
      tables: {},
      notes: [],
    });
  });

  it("are named as the design names them, in SI", () => {
    expect(Object.entries(body.result.values).map(([name, { unit }]) => `${name} ${unit}`)).toEqual([
      "mass kg",
      "gm m^3 s^-2",
      "radius m",
      "surface_gravity m s^-2",
      "surface_escape_speed m s^-1",
      "mean_density kg m^-3",
    ]);
    expect(values.result.values).toEqual({
      T_quiet: { value: 428, unit: "K" },
      K_base: { value: 100, unit: "m^2 s^-1" },
    });
    expect(Object.keys(column.result.values)).toEqual([
      "base.altitude",
      "base.number_density",
      "base.pressure",
      ...["CO2", "N2", "O", "H2", "H"].map((gas) => `${gas}.homopause.altitude`),
      "top.altitude",
    ]);
    const levelNames = [
      "altitude temperature pressure mass_density number_density mean_mass gravity scale_height mean_free_path knudsen",
      ...["CO2", "N2", "O", "H2", "H"].map(
        (gas) => `${gas}.number_density ${gas}.mole_fraction ${gas}.scale_height`,
      ),
    ].join(" ");
    expect(Object.keys(column.result.tables.levels[0]).join(" ")).toBe(levelNames);
    expect(Object.keys(column.result.profiles!).join(" ")).toBe(levelNames);
    expect(Object.keys(escape.result.values).map((name) => name.replace(/^CO2\./, "GAS."))).toEqual([
      ..."altitude radius temperature number_density gravity scale_height mean_free_path lower upper escape_speed"
        .split(" ")
        .map((name) => `exobase.${name}`),
      "bulk_escape_parameter",
      "regime",
      ...["H", "GAS"].flatMap((gas) =>
        [
          "number_density escape_parameter thermal_speed effusion_velocity log10_effusion_velocity jeans_flux log10_jeans_flux rate log10_rate mass_rate",
          // Carbon dioxide is the heavy gas here, so diffusion sets it no limit.
          gas === "H" ? "diffusion_limit supply_fraction depletion_time" : "depletion_time",
        ]
          .join(" ")
          .split(" ")
          .map((name) => `${gas}.${name}`),
      ),
      "crossover_mass",
      "wind_mass_rate",
    ]);
    expect(escape.result.values.regime).toEqual({ value: "jeans" });
  });

  it("tabulate a column from base to top in ascending altitudes, exobase included", () => {
    const { profiles, values: results } = column.result;
    const { altitude } = profiles!;
    expect(altitude[0]).toBe(80e3);
    expect(altitude.at(-1)).toBe(results["top.altitude"].value);
    expect(altitude.every((z, index) => index === 0 || z > altitude[index - 1])).toBe(true);
    expect(altitude.length).toBeGreaterThan(200);
    expect(altitude.length).toBeLessThan(360);
    expect(altitude).toContain(escape.result.values["exobase.altitude"].value);
    for (const values of Object.values(profiles!)) expect(values).toHaveLength(altitude.length);
  });

  it("give the strip of a column, to 2.3 times the exobase", () => {
    const { strip } = column;
    const exobase = numberIn(escape.result, "exobase.altitude");
    expect(strip).toMatchObject({
      column: "dayside",
      base: 80e3,
      exobase,
      gases: ["CO2", "N2", "O", "H2", "H"],
    });
    expect(strip!.top).toBeCloseToRelative(80e3 + 2.3 * (exobase - 80e3), 1e-12);
    expect(strip!.altitude.at(-1)).toBe(strip!.top);
    expect(strip!.moleFractions.map((fractions) => fractions.length)).toEqual(
      Array(5).fill(strip!.altitude.length),
    );
    expect(strip!.homopauses).toHaveLength(5);
  });

  it("agree with what the physics says of the same column", () => {
    expect(numberIn(column.result, "base.pressure")).toBeCloseToRelative(0.42, 1e-12);
    // g = GM/(R + z)², by hand.
    const [base] = column.result.tables.levels;
    const r = 0.775 * 6378.1e3 + 80e3;
    expect(base.gravity).toBeCloseToRelative((0.41 * 3.986004e14) / r ** 2, 1e-12);
  });

  it("say what was understood only where it adds something", () => {
    const understood = ({ understood: list }: typeof body) =>
      Object.fromEntries(list.map(({ entry, text }) => [entry, plain(text)]));
    expect(understood(body)).toEqual({ mass: "2.449×10²⁴ kg", radius: "4 943 km" });
    expect(understood(values)).toEqual({ K_base: "50 to 200 m² s⁻¹" });
    expect(understood(column)).toEqual({
      base: "g = 6.48 m s⁻²",
      pressure: "n = 1.84×10²⁰ m⁻³",
      gases: "CO2 96.4 %",
      temperature: expect.stringMatching(/^165 to 42\d K$/),
      eddy: expect.stringMatching(/^meets its ceiling at 1\d\d km$/),
    });
    const { line, offset } = values.understood[0];
    expect(line).toBe(2);
    expect(given[2].slice(0, offset).endsWith("within factor 2")).toBe(true);
  });

  it("name what acts by default", () => {
    expect(column.defaults).toEqual([
      { key: "top", text: "top = auto", note: expect.stringMatching(/\skm here$/) },
    ]);
    expect(escape.defaults).toEqual([
      { key: "criterion", text: "criterion = bulk", note: "mean free path equal to scale height" },
    ]);
    const [, allGases] = evaluateCells([
      ilmara,
      given,
      dayside,
      ["escape", "e", "column = dayside\ncoupling = open"],
    ]).at(-1)!.defaults;
    expect(allGases.text).toBe("gases = CO2, N2, O, H2, H");
  });

  it("name the cells and entries above that each cell uses", () => {
    expect(values.uses).toEqual([]);
    expect(column.uses).toEqual(expect.arrayContaining(["ilmara", "T_quiet", "K_base"]));
    expect(escape.uses).toEqual(["dayside"]);
    expect(column.gases).toEqual(["CO2", "N2", "O", "H2", "H"]);
    expect(escape.gases).toEqual(["H", "CO2"]);
  });

  it("say that uncertain entries act by their centres, without a word of what may come", () => {
    expect(values.result.status).toBe("fine");
    expect(values.result.notes).toEqual([
      expect.objectContaining({
        level: "remark",
        code: "acts_by_centre",
        message: "*T_quiet* and *K_base* act by their centres; results carry no ±.",
      }),
    ]);
  });

  it("name the handbook's sources and which collision parameters are estimates", () => {
    const messages = column.result.notes.map(({ level, message }) => `${level}: ${message}`).join("\n");
    expect(messages).toContain(
      "remark: Masses and collision diameters of CO2, N2, O, H2 and H are those of the handbook: Meija et al. 2016",
    );
    expect(messages).toContain(
      "caution: No measured collision parameter for N2 in CO2 and O in CO2; estimated from the masses",
    );
  });

  it("are all that the result document holds", () => {
    expect(resultDocument(evaluation)).toEqual({
      engine: engineVersion,
      title: "A test",
      cells: evaluation.cells.map(({ result }) => result),
    });
    expect(JSON.parse(JSON.stringify(resultDocument(evaluation)))).toEqual(resultDocument(evaluation));
  });
});

/** Thin spaces as plain ones. */
function plain(text: string): string {
  return text.replace(/[\u2009\u202f\u00a0]/g, " ");
}

describe("a name", () => {
  it("reaches any result above", () => {
    const results = resultOf(...whole, [
      "values",
      "after",
      "p = dayside.base.pressure\nratio = leak.exobase.gravity / ilmara.surface_gravity\nheight = dayside.H.homopause.altitude\nf = leak.H.jeans_flux",
    ]);
    expect(results.values.p).toEqual({ value: expect.closeTo(0.42, 10), unit: "Pa" });
    expect(numberIn(results, "ratio")).toBeLessThan(1);
    expect(results.values.height.unit).toBe("m");
    expect(results.values.f.unit).toBe("m^-2 s^-1");
  });

  it("of a magnitude below 1e-300 is refused, and its logarithm named", () => {
    const cells: WrittenCell[] = [
      ["body", "giant", "like = handbook(Jupiter)"],
      [
        "column",
        "cold",
        "body = giant\nbase = 300 km\npressure = 1e-2 Pa\ngases = H2: rest, He: 10 %\ntemperature = 300 K",
      ],
      ["escape", "held", "column = cold\ncoupling = open"],
      ["values", "v", "x = held.He.rate\ny = held.He.log10_rate"],
    ];
    const held = evaluateCells(cells)[2].result;
    expect(held.values["He.rate"]).toEqual({ value: null, unit: "s^-1" });
    expect(numberIn(held, "He.log10_rate")).toBeLessThan(-300);
    const { values, notes } = resultOf(...cells);
    expect(notes.find(({ code }) => code === "unavailable")?.message).toContain("*held.He.log10_rate*");
    expect(numberIn({ ...held, values }, "y")).toBe(numberIn(held, "He.log10_rate"));
  });

  it("of a choice is no quantity", () => {
    const { notes } = resultOf(...whole, ["values", "v", "x = leak.regime"]);
    expect(notes[0]).toMatchObject({ code: "not_a_quantity", level: "fault" });
  });

  it("that is given twice keeps its first meaning", () => {
    const { values } = resultOf(
      ["values", "a", "x = 1 m"],
      ["values", "b", "x = 2 m"],
      ["values", "c", "y = x"],
    );
    expect(values.y).toEqual({ value: 1, unit: "m" });
  });
});

describe("a body", () => {
  it("takes what it does not give from the handbook, and says so", () => {
    const { values, notes, status } = resultOf(["body", "twin", "like = handbook(Mars)\nradius = 3400 km"]);
    expect(numberIn({ values } as never, "gm")).toBeCloseToRelative(4.2828e13, 1e-4);
    expect(values.radius.value).toBe(3.4e6);
    expect(values).toHaveProperty("hill_radius");
    expect(status).toBe("fine");
    expect(notes[0]).toMatchObject({ level: "remark", code: "handbook_body" });
  });

  // Analytic: K(ξ) = 1 − 3/(2ξ) + 1/(2ξ³), and r_H by hand.
  it("has a Hill radius and a tidal factor beside a star", () => {
    const result = resultOf([
      "body",
      "b",
      "mass = 1 earth_mass\nradius = 1 earth_radius\nstar_distance = 1 au\nstar_mass = 1 solar_mass\nxuv_radius = 2 earth_radius",
    ]);
    const hill = 1.495978707e11 * Math.cbrt(3.986004e14 / 1.3271244e20 / 3);
    expect(numberIn(result, "hill_radius")).toBeCloseToRelative(hill, 1e-12);
    const xi = hill / (2 * 6378.1e3);
    expect(numberIn(result, "tidal_factor")).toBeCloseToRelative(1 - 1.5 / xi + 0.5 / xi ** 3, 1e-12);
  });

  it("takes the centrifugal term off gravity in the column at a latitude", () => {
    const spinning = (text: string) =>
      evaluateCells([
        ["body", "b", `mass = 1e24 kg\nradius = 5000 km\n${text}`],
        [
          "column",
          "c",
          "body = b\nbase = 100 km\npressure = 1 Pa\ngases = N2: rest\ntemperature = 200 K\nlevels = 100 km",
        ],
      ])[1].result.tables.levels[0].gravity as number;
    const angularSpeed = (2 * Math.PI) / 36000;
    expect(spinning("") - spinning("rotation_period = 10 h\nlatitude = 60 deg")).toBeCloseToRelative(
      5100e3 * angularSpeed ** 2 * 0.25,
      1e-9,
    );
    expect(spinning("rotation_period = 10 h")).toBe(spinning(""));
  });
});

describe("an escape cell", () => {
  const hot = (temperature: string, body = "") =>
    resultOf(
      ["body", "b", `mass = 0.41 earth_mass\nradius = 4943 km\n${body}`],
      [
        "column",
        "c",
        `body = b\nbase = 80 km\npressure = 0.4 Pa\ngases = CO2: rest, H: 0.001 ppm\ntemperature = ${temperature}`,
      ],
      ["escape", "e", "column = c\ncoupling = open"],
    );
  const codes = (result: ReturnType<typeof hot>) => result.notes.map(({ level, code }) => `${level} ${code}`);

  it("cautions where a gas drifts fast, and stays an answer", () => {
    const result = hot("bates(base = 165 K, exosphere = 1500 K, shape = 0.02 /km)");
    expect(numberIn(result, "H.escape_parameter")).toBeLessThan(2.69);
    expect(codes(result)).toContain("caution fast_drift");
    expect(result.status).toBe("caution");
  });

  it("cautions where the exobase lies beyond half the Hill radius", () => {
    const beside = "star_distance = 0.006 au\nstar_mass = 0.9 solar_mass";
    expect(codes(hot("250 K", beside))).toContain("caution exobase_near_hill_radius");
    expect(codes(hot("250 K"))).not.toContain("caution exobase_near_hill_radius");
  });
});

describe("a gas cell", () => {
  const thin: WrittenCell = [
    "column",
    "c",
    "body = ilmara\nbase = 80 km\nnumber_density = 1e20 /m^3\ngases = CO2: rest, N2: 5 %\ntemperature = 200 K\nlevels = 80 km",
  ];

  it("holds instead of the handbook below it, not above", () => {
    const cells: WrittenCell[] = [
      ilmara,
      thin,
      ["gas", "CO2", "mass = 88 u\ncross_section = 1e-18 m^2"],
      [thin[0], "d", thin[2]],
    ];
    const [, before, , after] = evaluateCells(cells).map(({ result }) => result);
    expect(before.tables.levels[0].mean_mass).toBeCloseToRelative(
      (0.95 * 44.009 + 0.05 * 28.014) * 1.66053906892e-27,
      1e-12,
    );
    expect(after.tables.levels[0].mean_mass).toBeCloseToRelative(
      (0.95 * 88 + 0.05 * 28.014) * 1.66053906892e-27,
      1e-12,
    );
    expect(after.notes.find(({ code }) => code === "gas_cell_acts")?.message).toBe(
      "CO2: mass and cross section from the gas cell *CO2*.",
    );
    expect(before.notes.some(({ code }) => code === "gas_cell_acts")).toBe(false);
  });

  it("brings in a gas that the handbook does not know", () => {
    const { status, tables } = resultOf(
      ilmara,
      ["gas", "Zz9", "mass = 30 u\ncross_section = 4e-19 m^2"],
      ["column", "c", thin[2].replace("N2: 5 %", "Zz9: 5 %")],
    );
    expect(status).not.toBe("fault");
    expect(tables.levels[0]).toHaveProperty(["Zz9.number_density"]);
  });

  it("gives collision parameters for either order of the pair", () => {
    const withEddy = [thin[0], thin[1], `${thin[2]}\neddy = 1e5 cm^2/s`] as WrittenCell;
    const binary = "binary(A = 9e16 /(cm s), s = 0.75)";
    const homopause = (...cells: WrittenCell[]) =>
      numberIn(resultOf(ilmara, ...cells, withEddy), "N2.homopause.altitude");
    const one = homopause(["gas", "CO2", `collision = N2: ${binary}`]);
    expect(homopause(["gas", "N2", `collision = CO2: ${binary}`])).toBe(one);
    expect(homopause()).not.toBe(one);
    const { notes } = resultOf(ilmara, ["gas", "N2", `collision = CO2: ${binary}`], withEddy);
    expect(notes.some(({ code }) => code === "estimated_collisions")).toBe(false);
  });
});

describe("evaluating again", () => {
  const document = notebookOf(whole);
  const first = evaluateNotebook(document);

  function again(edit: DocumentEdit) {
    const changed = editDocument(document, edit).document;
    const second = evaluateNotebook(changed, first.memory);
    expect(second.evaluation).toEqual(evaluateNotebook(changed).evaluation);
    return second.evaluation.cells.map(
      (cell) => first.evaluation.cells.find(({ id }) => id === cell.id) === cell,
    );
  }

  it("keeps every cell, the same objects, where nothing changed", () => {
    const { evaluation } = evaluateNotebook(structuredClone(document), first.memory);
    expect(evaluation.cells.every((cell, index) => cell === first.evaluation.cells[index])).toBe(true);
  });

  it("keeps what a change of prose or of a remark does not touch", () => {
    expect(again({ type: "changeText", id: "0", text: "Other words." })).toEqual([
      false,
      true,
      true,
      true,
      true,
    ]);
    expect(again({ type: "changeText", id: "2", text: given[2].replace("occultations", "more") })).toEqual([
      true,
      true,
      false,
      true,
      true,
    ]);
  });

  it("keeps the solved column where only its levels change", () => {
    const text = dayside[2].replace("80 km, 120 km", "90 km");
    expect(again({ type: "changeText", id: "3", text })).toEqual([true, true, true, false, true]);
  });

  it("renews what a changed value is used by, and nothing else", () => {
    expect(again({ type: "changeText", id: "2", text: given[2].replace("428", "430") })).toEqual([
      true,
      true,
      false,
      false,
      false,
    ]);
    expect(again({ type: "changeText", id: "4", text: `${leak[2]}, O` })).toEqual([
      true,
      true,
      true,
      true,
      false,
    ]);
  });

  it("sees a name come, go, or move", () => {
    expect(again({ type: "removeCell", id: "2" })).toEqual([true, true, false, false]);
    expect(again({ type: "moveCell", id: "1", index: 4 })).toEqual([true, true, false, false, true]);
    expect(
      again({ type: "insertCell", index: 2, cell: { id: "g", kind: "gas", name: "H", text: "mass = 1 u" } }),
    ).toEqual([true, true, false, true, false, false]);
  });

  it("gives what evaluating afresh gives, whatever edits come", () => {
    const piece = fc.constantFrom(
      "T_quiet = 430 K",
      "K_base = 1 m^2/s",
      "mass = 1 kg",
      "column = dayside",
      "coupling = open",
      "\n",
      "# x",
      "levels = 90 km",
    );
    const edit = fc.oneof(
      fc.record({
        type: fc.constant("changeText" as const),
        id: fc.constantFrom("0", "1", "2", "3", "4"),
        text: fc.oneof(
          fc.constantFrom(ilmara[2], given[2], dayside[2], leak[2]),
          fc.array(piece, { maxLength: 4 }).map((parts) => parts.join("\n")),
        ),
      }),
      fc.record({
        type: fc.constant("renameCell" as const),
        id: fc.constantFrom("1", "2", "3", "4"),
        name: fc.constantFrom("ilmara", "dayside", "leak", "other", "km", ""),
      }),
      fc.record({
        type: fc.constant("moveCell" as const),
        id: fc.constantFrom("0", "1", "2", "3", "4"),
        index: fc.nat({ max: 4 }),
      }),
      fc.record({
        type: fc.constant("changeUnitSystem" as const),
        unitSystem: fc.constantFrom("SI" as const, "cgs" as const),
      }),
    );
    fc.assert(
      fc.property(fc.array(edit, { minLength: 1, maxLength: 6 }), (edits) => {
        let current = document;
        let memory = first.memory;
        for (const step of edits) {
          current = editDocument(current, step).document;
          const evaluated = evaluateNotebook(current, memory);
          memory = evaluated.memory;
          expect(evaluated.evaluation).toEqual(evaluateNotebook(current).evaluation);
        }
      }),
      { numRuns: 40, seed: 3 },
    );
  }, 60_000);
});

describe("the schemas", () => {
  const bodies: WrittenCell[] = [ilmara, ["body", "earth", "like = handbook(Earth)"], given, dayside, leak];

  it("have examples that can be read, for every entry of every kind", () => {
    for (const kind of cellKinds) {
      for (const { key, example } of cellSchemas[kind].entries) {
        const name = kind === "gas" ? "H" : "tried";
        const { notes } = resultOf(...bodies, [kind, name, example]);
        const faults = notes.filter(({ level, code }) => level === "fault" && !code.startsWith("missing_"));
        expect(faults, `${kind}: ${example}`).toEqual([]);
        expect(example.startsWith(`${key} = `)).toBe(true);
      }
    }
  });

  it("say the kind, one line of sense and each entry once", () => {
    for (const kind of cellKinds) {
      const schema = cellSchemas[kind];
      expect(schema.kind).toBe(kind);
      expect(schema.description).toMatch(/^[a-z].*[a-z]$/);
      const keys = schema.entries.map(({ key }) => key);
      expect(new Set(keys).size).toBe(keys.length);
      for (const { description } of schema.entries) expect(description).toMatch(/^[A-Za-z].*\.$/);
    }
  });
});
