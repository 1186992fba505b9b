import { fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { evaluateNotebook } from "../../../../../shared/notebook/evaluateNotebook";
import type { NotebookDocument } from "../../../../../shared/notebook/document";
import { ExplainDesk } from "../../../../../src/features/notebook/explain/ExplainDesk";
import { EscapeTable } from "../../../../../src/ui/tables/EscapeTable";
import { LevelsTable } from "../../../../../src/ui/tables/LevelsTable";
import { ValueList } from "../../../../../src/ui/tables/ValueList";
import { aCell, aNotebook } from "../aNotebook";

const cells = [
  aCell({
    id: "body",
    kind: "body",
    name: "ilmara",
    text: "mass = 0.41 earth_mass # orbit of its moonlet\nradius = 4943 km",
  }),
  aCell({
    id: "column",
    kind: "column",
    name: "dayside",
    text: "body = ilmara\nbase = 80 km\npressure = 0.42 Pa\ngases = CO2: rest, H: 10 ppm\ntemperature = 300 K\nlevels = 80 km, 120 km",
  }),
  aCell({ id: "escape", kind: "escape", name: "leak", text: "column = dayside\ncoupling = open" }),
];
const written = aNotebook({ cells });

function liveOf(document: NotebookDocument, late: readonly string[] = []) {
  const { evaluation } = evaluateNotebook(document);
  const byId = new Map(evaluation.cells.map((cell) => [cell.id, cell]));
  const texts = new Map(document.cells.map(({ id, text }) => [id, text]));
  const evaluated = {
    engine: evaluation.engine,
    document,
    cells: byId,
    headline: [],
    tasks: [],
    partial: [],
    texts,
  };
  return { evaluated, late: new Set(late) };
}

function Page({ document, late = [] }: { document: NotebookDocument; late?: readonly string[] }) {
  const live = liveOf(document, late);
  const resultOf = (id: string) => live.evaluated.cells.get(id)!.result;
  const [typed, setTyped] = useState("");
  return (
    <ExplainDesk document={document} live={live} unitSystem="SI">
      <input aria-label="entry" value={typed} onChange={(event) => setTyped(event.target.value)} />
      <ValueList result={resultOf("body")} unitSystem="SI" />
      <LevelsTable result={resultOf("column")} gases={["CO2", "H"]} unitSystem="SI" number={1} />
      <EscapeTable result={resultOf("escape")} gases={["CO2", "H"]} unitSystem="SI" number={2} />
    </ExplainDesk>
  );
}

const changed = (id: string, text: string): NotebookDocument => ({
  ...written,
  cells: cells.map((cell) => (cell.id === id ? { ...cell, text } : cell)),
});

const gravity = () => screen.getByRole("button", { name: /^Explain surface_gravity: / });
const panel = () => screen.getByRole("dialog");
const row = (term: string) =>
  within(panel())
    .getAllByRole("term")
    .find(({ textContent }) => textContent === term)?.nextElementSibling;

beforeEach(() => {
  // Without a layout every rectangle is empty, as is that of a number which is not to be seen.
  vi.spyOn(Element.prototype, "getBoundingClientRect").mockReturnValue(new DOMRect(100, 200, 60, 24));
});
afterEach(() => vi.restoreAllMocks());

describe("a number that explains itself", () => {
  it("is named and reads as what it is, and leaves the table's text alone", () => {
    render(<Page document={written} />);
    expect(gravity().getAttribute("aria-label")).toBe("Explain surface_gravity: 6.69\u00a0m\u00a0s⁻²");
    const { container } = render(
      <ValueList result={liveOf(written).evaluated.cells.get("body")!.result} unitSystem="SI" />,
    );
    expect(within(container).queryByRole("button")).toBeNull();
    expect(document.querySelector(".explain-desk .value-list")!.textContent).toBe(container.textContent);
  });

  it("opens at a press what it rests on, and says with what values", () => {
    render(<Page document={written} />);
    fireEvent.click(gravity());
    expect(gravity().getAttribute("aria-expanded")).toBe("true");
    expect(panel().getAttribute("aria-modal")).toBeNull();
    expect(within(panel()).getByRole("heading").textContent).toBe("ilmara.surface_gravitySurface gravity");
    expect(row("With")!.textContent).toMatch(/4\s?943\skm\s?radius/);
    expect(row("Comes from")!.textContent).toContain("orbit of its moonlet");
    expect(
      within(row("Comes from") as HTMLElement)
        .getByRole("link", { name: "ilmara.mass" })
        .getAttribute("href"),
    ).toBe("#cell-body");
    expect(row("Holds for")!.textContent).toMatch(/spheres round its centre/);
    expect(row("Published")!.textContent).toContain("Theory of Planetary Atmospheres");
    expect(row("In full")!.textContent).toMatch(/^6\.68\d{10,}/);
  });

  it("copies its name and all of its digits", async () => {
    const writeText = vi.fn(() => Promise.resolve());
    vi.stubGlobal("navigator", { ...navigator, clipboard: { writeText } });
    render(<Page document={written} />);
    fireEvent.click(gravity());
    fireEvent.click(within(panel()).getByRole("button", { name: "copy the name" }));
    fireEvent.click(within(panel()).getByRole("button", { name: "copy" }));
    const { value } = liveOf(written).evaluated.cells.get("body")!.result.values.surface_gravity;
    expect(writeText.mock.calls).toEqual([["ilmara.surface_gravity"], [String(value)]]);
    expect(await within(panel()).findAllByRole("button", { name: "copied" })).toHaveLength(2);
    vi.unstubAllGlobals();
  });

  it("closes at a second press, at its word and at Escape", () => {
    render(<Page document={written} />);
    fireEvent.click(gravity());
    fireEvent.click(gravity());
    expect(screen.queryByRole("dialog")).toBeNull();
    fireEvent.click(gravity());
    fireEvent.click(within(panel()).getByRole("button", { name: "close" }));
    expect(screen.queryByRole("dialog")).toBeNull();
    fireEvent.click(gravity());
    fireEvent.keyDown(document.body, { key: "Escape" });
    expect(screen.queryByRole("dialog")).toBeNull();
  });

  it("goes over to another number that is pressed", () => {
    render(<Page document={written} />);
    fireEvent.click(gravity());
    fireEvent.click(screen.getByRole("button", { name: /^Explain H\.jeans_flux: / }));
    expect(within(panel()).getByRole("heading").textContent).toBe("leak.H.jeans_fluxJeans flux of H");
    expect(gravity().getAttribute("aria-expanded")).toBe("false");
  });

  it("sets small masses and constants with their digits", () => {
    render(<Page document={written} />);
    fireEvent.click(screen.getByRole("button", { name: /^Explain H\.escape_parameter: / }));
    // Wang et al. (2012) for the mass of the atom, 1.00782503 u; CODATA 2022 for k
    expect(row("With")!.textContent).toMatch(/1\.008\su\s?mass of one particle/);
    expect(row("With")!.textContent).toMatch(/1\.381\s?×\s?10−23\sJ\sK−1\s?Boltzmann constant/);
  });

  it("tells the level that a number of a table is at", () => {
    render(<Page document={written} />);
    fireEvent.click(screen.getAllByRole("button", { name: /^Explain H\.number_density: / })[0]!);
    expect(within(panel()).getByRole("heading").textContent).toBe(
      "daysideNumber density of H at 120\u00a0km",
    );
    expect(within(panel()).queryByRole("button", { name: "copy the name" })).toBeNull();
  });

  it("stays up to date while one writes, with the focus left where it is", () => {
    const { rerender } = render(<Page document={written} />);
    fireEvent.click(gravity());
    const field = screen.getByRole("textbox", { name: "entry" });
    field.focus();
    const before = row("In full")!.textContent;
    rerender(<Page document={changed("body", "mass = 0.82 earth_mass # a new orbit\nradius = 4943 km")} />);
    expect(row("In full")!.textContent).not.toBe(before);
    expect(row("Comes from")!.textContent).toContain("a new orbit");
    expect(document.activeElement).toBe(field);
    fireEvent.keyDown(field, { key: "Escape" });
    expect(screen.getByRole("dialog")).toBeTruthy();
  });

  it("says so while its number is computed anew, and when there is none any more", () => {
    const { rerender } = render(<Page document={written} />);
    fireEvent.click(gravity());
    rerender(<Page document={written} late={["body"]} />);
    expect(panel().getAttribute("aria-busy")).toBe("true");
    expect(panel().querySelector(".explain-body")!.hasAttribute("inert")).toBe(true);
    rerender(<Page document={changed("body", "mass = 0.41 earth_mass\nradius = ")} />);
    expect(panel().textContent).toContain("The notebook has no such number now.");
    expect(within(panel()).getByRole("link", { name: "Its cell says why." }).getAttribute("href")).toBe(
      "#cell-body",
    );
  });
});

describe("numbers by key", () => {
  it("takes Enter to open, Escape to close and come back", () => {
    render(<Page document={written} />);
    gravity().focus();
    fireEvent.keyDown(gravity(), { key: "Enter" });
    expect(document.activeElement).toBe(panel());
    fireEvent.keyDown(panel(), { key: "Escape" });
    expect(screen.queryByRole("dialog")).toBeNull();
    expect(document.activeElement).toBe(gravity());
  });

  it("leads from either end of the panel back to the number", () => {
    render(<Page document={written} />);
    fireEvent.click(gravity());
    const last = within(panel()).getByRole("button", { name: "copy" });
    last.focus();
    fireEvent.keyDown(last, { key: "Tab" });
    expect(document.activeElement).toBe(gravity());
    panel().focus();
    fireEvent.keyDown(panel(), { key: "Tab", shiftKey: true });
    expect(document.activeElement).toBe(gravity());
  });

  it("makes one stop of a table, within which arrows go from number to number", () => {
    render(<Page document={written} />);
    const tables = screen.getAllByRole("table");
    for (const group of [document.querySelector("dl.value-list")!, ...tables])
      expect(group.querySelectorAll('.explain-number[tabindex="0"]')).toHaveLength(1);

    const [first] = within(tables[1]!).getAllByRole("button");
    first!.focus();
    fireEvent.keyDown(first!, { key: "ArrowRight" });
    expect(document.activeElement!.getAttribute("aria-label")).toMatch(/^Explain CO2\.number_density/);
    fireEvent.keyDown(document.activeElement!, { key: "ArrowDown" });
    expect(document.activeElement!.getAttribute("aria-label")).toMatch(/^Explain H\.number_density/);
    fireEvent.keyDown(document.activeElement!, { key: "Home" });
    expect(document.activeElement).toBe(first);
    expect(tables[1]!.querySelectorAll('.explain-number[tabindex="0"]')).toHaveLength(1);
  });

  it("gives its stop on when a number goes", () => {
    const lit = (mass: string) => changed("body", `xuv_flux = 6 mW/m^2\nradius = 4943 km\nmass = ${mass}`);
    const { rerender } = render(<Page document={lit("0.41 earth_mass")} />);
    const flux = screen.getByRole("button", { name: /^Explain xuv_flux/ });
    expect([gravity().tabIndex, flux.tabIndex]).toEqual([0, -1]);
    rerender(<Page document={lit("")} />);
    expect(screen.queryByRole("button", { name: /surface_gravity/ })).toBeNull();
    expect(flux.isConnected).toBe(true);
    expect(flux.tabIndex).toBe(0);
  });
});
