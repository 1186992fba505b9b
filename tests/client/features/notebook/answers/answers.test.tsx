import { render, screen, within } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { plainText } from "../../../../../src/lib/richText";
import { productsRich } from "../../../../../src/ui/tables/ChannelsTable";
import { answers, countResults } from "../../../../../src/features/notebook/cells/answers/answers";
import { drawnColumn } from "../../../../../src/features/notebook/cells/drawnColumn";
import { cellNamed, evaluatedHalo, haloCells } from "./haloNotebook";

const cells = evaluatedHalo();

function show(name: string, from = cells) {
  const evaluation = cellNamed(from, name);
  const Answer = answers[evaluation.result.kind]!;
  return render(
    <Answer
      evaluation={evaluation}
      drawn={drawnColumn(evaluation, from)}
      columnGases={["CO2", "O", "H"]}
      coronae={[]}
      notes={[]}
      unitSystem="SI"
      figureNumber={3}
      tableNumber={2}
      isNear
      onRemedy={undefined}
    />,
  );
}

const plain = (element: Element | null) => (element?.textContent ?? "").replace(/[\u202f\u00a0]/g, " ");

describe("the answer of a corona", () => {
  it("says in its caption which orbits are filled, λ, and the step at the exobase", () => {
    show("halo");
    const caption = plain(document.querySelector(".figure-caption"));
    const { escapeParameter, share } = cellNamed(cells, "halo").corona!;
    expect(caption).toContain("Figure 3.");
    expect(caption).toContain("satellite orbits empty (s = 0)");
    expect(caption).toContain(`λ = ${escapeParameter.toPrecision(3)}`);
    expect(caption).toContain(`½[1 + P(3/2, λ)] = ${share.toPrecision(4)}`);
  });

  it("has a table of the levels asked for, without orbits that nothing flies on", () => {
    show("halo");
    const table = within(screen.getByRole("region", { name: /^Table 2\./ })).getByRole("table");
    const heads = within(table).getAllByRole("columnheader").map(plain);
    expect(heads).toEqual(["zkm", "nm−3", "Ballisticm−3", "Escapingm−3", "Along the limbm−2", "Overheadm−2"]);
    expect(within(table).getAllByRole("rowheader").map(plain)).toEqual(["9 000", "5 000"]);
  });

  it("tells the share of satellite orbits that are filled", () => {
    const some = haloCells.map(([kind, name, text]) =>
      kind === "corona"
        ? ([kind, name, `${text}\nsatellites = 0.5`] as const)
        : ([kind, name, text] as const),
    );
    show("halo", evaluatedHalo(some));
    expect(plain(document.querySelector(".figure-caption"))).toContain(
      "a share s = 0.50 of the satellite orbits",
    );
    expect(screen.getByRole("columnheader", { name: /Satellite/ })).toBeTruthy();
  });
});

describe("the answer of a loss", () => {
  it("gives what has gone in four measures", () => {
    show("lost");
    const list = screen.getByLabelText("What lost gives");
    expect(within(list).getAllByRole("term").map(plain)).toEqual([
      "Lost in all, particles of H",
      "Mass",
      "As a layer of water",
      "As pressure",
    ]);
  });

  it("says until when the light was saturated, and when half had gone", () => {
    show("lost");
    const caption = plain(document.querySelector(".figure-caption"));
    expect(caption).toContain("saturated, up to 0.30 Gyr");
    expect(caption).toMatch(/half of it had gone, at 0\.\d\d Gyr/);
  });

  it("is read by arrow keys along the age", () => {
    show("lost");
    const reader = screen.getByRole("slider", { name: "Age read in figure 3" });
    expect(reader.getAttribute("aria-orientation")).toBe("horizontal");
    expect(reader.getAttribute("aria-valuetext")).toMatch(/^age .*, rate .*, lost /);
  });
});

describe("the answer of nonthermal escape", () => {
  it("has a row a channel, its states raised, and which fragments leave", () => {
    show("hot");
    const table = screen.getByRole("table");
    const rows = within(table).getAllByRole("rowheader");
    expect(rows).toHaveLength(cellNamed(cells, "hot").result.tables.channels!.length);
    expect(rows[0]!.querySelector("sup")?.textContent).toMatch(/^\d$/);
    const { escape_energy: needed, energy } = cellNamed(cells, "hot").result.tables.fragments![0]!;
    const [, , gets, needs, leave] = within(within(table).getAllByRole("row")[1]!).getAllByRole("cell");
    const electronvolts = (joule: unknown) => Number(joule) / 1.602176634e-19; // SI brochure, 9th edition
    expect(Number(plain(gets!))).toBeCloseTo(electronvolts(energy), 2);
    expect(Number(plain(needs!))).toBeCloseTo(electronvolts(needed), 2);
    expect(plain(leave!)).toBe(Number(energy) > Number(needed) ? "both" : "none");
  });

  it.each([
    ["O(3P) + O(1D)", "O(³P) + O(¹D)"],
    ["CO(X1Σ+) + O(3P)", "CO(X¹Σ^+) + O(³P)"],
    ["CO(a3Π) + O2", "CO(a³Π) + O2"],
  ])("raises multiplicity and sign of the states in %s", (products, text) => {
    expect(plainText(productsRich(products))).toBe(text);
  });

  it("says in words what the wind makes of the ion", () => {
    show("hot");
    const terms = within(screen.getByLabelText("What hot gives")).getAllByRole("term").map(plain);
    expect(terms).toEqual(["Most energy in the wind, O2+", "Gyroradius in the wind, O2+"]);
  });
});

describe("figures and tables of a cell", () => {
  it.each([
    ["dayside", 2, 0],
    ["leak", 0, 1],
    ["halo", 1, 1],
    ["hot", 0, 1],
    ["lost", 1, 0],
    ["ilmara", 0, 0],
  ])("%s has %i figures and %i tables, as many as are shown", (name, figures, tables) => {
    const { result } = cellNamed(cells, name);
    expect(countResults(result)).toEqual({ figures, tables });
    if (!answers[result.kind]) return;
    const { container } = show(name);
    expect(container.querySelectorAll("figure")).toHaveLength(figures);
    expect(container.querySelectorAll(".table-frame")).toHaveLength(tables);
  });

  it("are none where there is no answer", () => {
    for (const kind of ["corona", "loss", "nonthermal"] as const)
      expect(countResults({ kind, values: {}, tables: {} })).toEqual({ figures: 0, tables: 0 });
  });
});
