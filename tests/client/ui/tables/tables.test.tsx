import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import type { CellResult, Note } from "../../../../shared/notebook/result";
import { EscapeTable } from "../../../../src/ui/tables/EscapeTable";
import { LevelsTable } from "../../../../src/ui/tables/LevelsTable";
import { noteTarget } from "../../../../src/ui/tables/noteTarget";
import type { EscapeTableProps } from "../../../../src/ui/tables/tableProps";
import { tableText } from "../../../../src/ui/tables/tableText";
import { ValueList } from "../../../../src/ui/tables/ValueList";

const number = (value: number | null, unit: string) => ({ value, unit });

/** Made by hand to show every way a number can be: plain, beyond sight, carried by its logarithm, absent. */
const escape: CellResult = {
  kind: "escape",
  name: "leak",
  status: "caution",
  tables: {},
  notes: [],
  values: {
    "exobase.altitude": number(239_200, "m"),
    "exobase.temperature": number(411, "K"),
    "exobase.escape_speed": number(7940, "m s^-1"),
    bulk_escape_parameter: number(185, "1"),
    regime: { value: "jeans" },
    "H.escape_parameter": number(9.29, "1"),
    "H.number_density": number(4.22e11, "m^-3"),
    "H.jeans_flux": number(2.94e11, "m^-2 s^-1"),
    "H.log10_jeans_flux": number(11.468, "1"),
    "H.rate": number(9.94e25, "s^-1"),
    "H.diffusion_limit": number(5.1e11, "m^-2 s^-1"),
    "H.supply_fraction": number(0.57, "1"),
    "CO2.escape_parameter": number(405.7, "1"),
    "CO2.number_density": number(8.37e12, "m^-3"),
    "CO2.jeans_flux": number(null, "m^-2 s^-1"),
    "CO2.log10_jeans_flux": number(-318.6, "1"),
    "CO2.rate": number(null, "s^-1"),
    "CO2.log10_rate": number(-304.1, "1"),
  },
};

const caution: Note = {
  level: "caution",
  code: "estimated_collisions",
  message: "No measured collision parameter for H in Ar. A gas cell with *collision* can give one.",
  remedy: { label: "Give one", range: { from: 0, to: 0 }, replacement: "x" },
};
const remark: Note = { level: "remark", code: "jeans_correction_range", message: "λ of H is 9.29." };
const underEntry: Note = { level: "fault", code: "unknown_key", message: "No entry *levl*.", line: 3 };

describe("the escape table", () => {
  const table = (onRemedy?: (note: Note) => void) =>
    render(
      <EscapeTable
        result={escape}
        gases={["H", "CO2"]}
        unitSystem="SI"
        number={1}
        notes={[
          { note: remark, letter: null },
          { note: caution, letter: "a" },
          { note: underEntry, letter: "b" },
        ]}
        onRemedy={onRemedy}
      />,
    );

  it("has a row a gas and a column a quantity that is answered", () => {
    table();
    const rows = within(screen.getByRole("table")).getAllByRole("row");
    expect(rows).toHaveLength(3);
    const heads = within(rows[0]!)
      .getAllByRole("columnheader")
      .map(({ textContent }) => textContent);
    expect(heads).toEqual([
      "Gas",
      "λ",
      "ncm−3",
      "Jeans fluxm−2\u00a0s−1",
      "Rates−1",
      "Diffusion limitm−2\u00a0s−1",
      "Share of limit",
    ]);
    expect(rows[1]!.textContent).toContain("57\u202f%");
  });

  it("keeps what is beyond sight as a power and sets a dash where there is nothing", () => {
    table();
    const cells = within(screen.getAllByRole("row")[2]!)
      .getAllByRole("cell")
      .map(({ textContent }) => textContent);
    expect(cells).toContain("10−318.6");
    expect(cells.slice(-2)).toEqual(["–", "–"]);
  });

  it("keys a caution by its letter on the number it speaks of, and tells it below with its remedy", () => {
    const onRemedy = vi.fn();
    table(onRemedy);
    const limit = within(screen.getAllByRole("row")[1]!).getAllByRole("cell")[4]!;
    expect(limit.querySelector("sup:last-child")?.textContent).toBe("a");
    const notes = screen.getAllByRole("listitem").map(({ textContent }) => textContent);
    expect(notes[0]).toMatch(/^aNo measured collision/);
    expect(notes).toHaveLength(2);
    fireEvent.click(screen.getByRole("button", { name: "Give one" }));
    expect(onRemedy).toHaveBeenCalledWith(caution);
  });

  it("is copied with every digit, in SI", async () => {
    const writeText = vi.fn().mockResolvedValue(undefined);
    vi.stubGlobal("navigator", { clipboard: { writeText } });
    table();
    fireEvent.click(screen.getByRole("button", { name: "Copy as TSV" }));
    expect(await screen.findByText("Copied.")).toBeTruthy();
    const lines = (writeText.mock.calls[0]![0] as string).split("\n");
    expect(lines[0]!.split("\t").slice(0, 3)).toEqual(["gas", "escape_parameter", "number_density (m^-3)"]);
    expect(lines[2]!.split("\t")).toContain("-318.6");
    vi.unstubAllGlobals();
  });

  it("says in its caption where the exobase is and which regime holds", () => {
    table();
    expect(screen.getByText(/Thermal escape\./).textContent).toMatch(
      /Table 1\. Thermal escape\. Exobase at 239\skm, where T = 411\sK .* 7\.94\skm\ss−1\. Regime: Jeans; λ of the mean mass there is 185\./,
    );
  });
});

describe("what an escape table rests on", () => {
  const shown = (
    change: Partial<CellResult>,
    convention: EscapeTableProps["convention"] = { coupling: "coupled", criterion: "bulk, l = H" },
  ) => {
    const { container } = render(
      <EscapeTable
        result={{ ...escape, ...change }}
        gases={["H", "CO2"]}
        convention={convention}
        unitSystem="SI"
        number={1}
      />,
    );
    return (selector: string) =>
      [...container.querySelectorAll(selector)].map(({ textContent }) =>
        (textContent ?? "").replace(/[\u202f\u00a0]/g, " "),
      );
  };

  it("is said in its caption: coupling and criterion", () => {
    expect(shown({})(".table-caption")[0]).toContain(
      "Thermal escape, solved together with its flux. Exobase (bulk, l = H) at 239 km",
    );
    expect(shown({}, { coupling: "open", criterion: "unit depth" })(".table-caption")[0]).toContain(
      "Thermal escape on an open column, which does not reckon with its flux. Exobase (unit depth)",
    );
  });

  it("is in place of the table why there is no exobase, and what can be said without one", () => {
    const at = shown({
      values: { regime: { value: "wind" }, wind_mass_rate: number(3.9e10, "kg s^-1") },
      notes: [
        { level: "fault", code: "no_exobase_runaway", message: "No exobase. The gas leaves as a wind." },
      ],
    });
    expect(at(".table-caption")[0]).toContain("Thermal escape. No exobase. The gas leaves as a wind.");
    expect(at("table")).toEqual([]);
    expect(at(".value-list")).toEqual(["Isothermal wind3.90 × 1010 kg s−1"]);
  });

  it("has under it what is said of all gases together", () => {
    const values = {
      ...escape.values,
      energy_limited_mass_rate: number(2246, "kg s^-1"),
      crossover_mass: number(4.464e-26, "kg"),
    };
    expect(shown({ values })(".value-list div")).toEqual([
      "Energy limit2 246 kg s−1",
      "Crossover mass26.9 u",
    ]);
    expect(shown({})(".value-list")).toEqual([]);
  });

  it("has spreads under its numbers, says what they are, and remarks where draws are missing", () => {
    const spread = { median: 9e25, lower: 4.6e25, upper: 1.6e26, q2_5: null, q97_5: null, cell: "how_sure" };
    const values = {
      ...escape.values,
      "exobase.altitude": { ...number(239_200, "m"), spread: { ...spread, lower: 213_200, upper: 265_200 } },
      "H.rate": { ...number(9.94e25, "s^-1"), spread },
      "H.supply_fraction": { ...number(0.57, "1"), spread: { ...spread, lower: 0.5, upper: 0.64 } },
    };
    const at = shown({ values });
    expect(at(".table-caption")[0]).toContain("at 239 ± 26 km, where");
    expect(at(".table-spread")).toEqual(["± 5.7 × 1025", "± 7.0 %"]);
    expect(at(".spread-remark")).toEqual(["± holds the middle 68 % of the draws of how_sure."]);
    const partial = { ...values["H.rate"], spread: { ...spread, isPartial: true as const } };
    const stopped = shown({ values: { ...values, "H.rate": partial } });
    expect(stopped(".spread-remark")[0]).toContain("which was stopped before all of them were done");
  });
});

describe("where a note belongs", () => {
  it.each([
    ["estimated_collisions", "for H2 in Ar", { gas: "H2", key: "diffusion_limit" }],
    ["fast_drift", "H drifts", { gas: "H", key: "jeans_flux" }],
    ["something_else", "He is odd", { gas: "He", key: null }],
    ["several_exobases", "There are two.", null],
  ])("%s", (code, message, target) => {
    expect(noteTarget({ level: "caution", code, message }, ["H", "H2", "He"])).toEqual(target);
  });
});

describe("values and levels", () => {
  const body: CellResult = {
    kind: "body",
    name: "ilmara",
    status: "fine",
    tables: {},
    notes: [],
    values: {
      mass: number(2.449e24, "kg"),
      radius: number(4.943e6, "m"),
      surface_gravity: number(6.6886, "m s^-2"),
      hill_radius: number(9.7036e8, "m"),
    },
  };

  it("shows what is not stated already, a Hill radius in radii of the body", () => {
    render(<ValueList result={body} unitSystem="cgs" />);
    const list = screen.getByLabelText("What ilmara gives");
    expect(list.textContent).toBe("Surface gravity669\u00a0cm\u00a0s−2Hill radius196\u00a0radii");
    expect(within(list).getByText(/669/).title).toBe("ilmara.surface_gravity = 6.6886 m s^-2");
  });

  it("shows a value with its spread, and says whose it is", () => {
    const spread = { median: 6.7, lower: 6.49, upper: 6.89, q2_5: null, q97_5: null, cell: "sure" };
    const values = { ...body.values, surface_gravity: { ...number(6.69, "m s^-2"), spread } };
    const { container } = render(
      <ValueList
        result={{ ...body, values }}
        unitSystem="SI"
        names={["surface_gravity"]}
        labels={{ surface_gravity: ["Pull at ", { italic: "R" }] }}
      />,
    );
    expect(container.querySelector("dl")!.textContent.replace(/[\u202f\u00a0]/g, " ")).toBe(
      "Pull at R6.69 ± 0.20 m s−2",
    );
    expect(container.querySelector(".spread-remark")!.textContent).toContain("the draws of sure.");
  });

  it("is nothing where nothing is given", () => {
    const { container } = render(<ValueList result={{ ...body, values: {} }} unitSystem="SI" />);
    expect(container.innerHTML).toBe("");
  });

  it("sets levels with the highest on top", () => {
    const levels = [
      { altitude: 80e3, temperature: 165, "H.number_density": 2.2e14 },
      { altitude: 240e3, temperature: 419, "H.number_density": 1.7e12 },
    ];
    const column: CellResult = { ...body, kind: "column", name: "dayside", tables: { levels } };
    render(<LevelsTable result={column} gases={["H"]} unitSystem="SI" number={2} />);
    expect(screen.getAllByRole("rowheader").map(({ textContent }) => textContent)).toEqual(["240", "80"]);
  });

  it("writes pressures far up with their digits", () => {
    const levels = [{ altitude: 400e3, temperature: 420, pressure: 6.87e-8 }];
    const column: CellResult = { ...body, kind: "column", name: "dayside", tables: { levels } };
    render(<LevelsTable result={column} gases={[]} unitSystem="SI" number={2} />);
    const cells = screen.getAllByRole("cell").map(({ textContent }) => textContent);
    expect(cells[1]!.replace(/\u202f/g, " ")).toBe("6.87 × 10−8");
  });

  it("copies rows as tab-separated lines", () => {
    expect(
      tableText([
        ["a", null],
        [1, 2.5],
      ]),
    ).toBe("a\t\n1\t2.5");
  });
});
