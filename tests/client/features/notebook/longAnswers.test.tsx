import { fireEvent, render, screen, within } from "@testing-library/react";
import { beforeAll, describe, expect, it, vi } from "vitest";
import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import type { CellResult } from "../../../../shared/notebook/result";
import { countResults } from "../../../../src/features/notebook/cells/answers/answers";
import { CellView, type CellViewProps } from "../../../../src/features/notebook/cells/CellView";
import { readingCommands } from "../../../../src/features/notebook/cells/readingCommands";
import type { TaskState } from "../../../../src/features/notebook/evaluation/createTaskQueue";
import { answerOf, gasSweep } from "../../ui/plots/sweepResults";
import { aCell, aNotebook } from "./aNotebook";

// The figure library measures what jsdom does not lay out; what it is handed is tested with the plots.
vi.mock("../../../../src/ui/plots/PlotlyFigure", () => ({ PlotlyFigure: () => <div data-testid="plot" /> }));

beforeAll(() => {
  const nothing = { x: 0, y: 0, top: 0, left: 0, bottom: 0, right: 0, width: 0, height: 0 };
  Range.prototype.getClientRects = () => [] as unknown as DOMRectList;
  Range.prototype.getBoundingClientRect = () => nothing as DOMRect;
});

const given =
  "x = 4 ± 1\nr = 2 within factor 2\nlength = x * 1 km\nroot = sqrt(x)\nboth = x + r\nlow = sqrt(x - 4)";

function view(
  kind: "sweep" | "spread",
  text: string,
  change: Partial<CellViewProps> = {},
  isComputed = true,
) {
  const cell = aCell({ id: "asked", kind, name: "asked", text });
  const document = aNotebook({
    cells: [aCell({ id: "given", kind: "values", name: "given", text: given }), cell],
  });
  const { cells } = isComputed ? completeNotebook(document) : evaluateNotebook(document).evaluation;
  const evaluation = cells[1]!;
  return (
    <CellView
      cell={cell}
      evaluation={evaluation}
      readText={text}
      columnGases={undefined}
      coronae={[]}
      drawn={null}
      notes={evaluation.result.notes.map((note) => ({ note, letter: null }))}
      isLate={false}
      task={undefined}
      unitSystem="SI"
      figureNumber={3}
      tableNumber={2}
      isEditable={false}
      isNew={false}
      surroundings={{ cells: new Map(), names: new Set(), isGas: () => false }}
      commands={readingCommands}
      onDragStart={() => {}}
      {...change}
    />
  );
}

const plain = (text: string | null | undefined) => text?.replace(/[\u202f\u00a0]/g, " ");

describe("the answer of a sweep of one quantity", () => {
  it("is a figure in words too: caption, table, and points read by key", () => {
    render(view("sweep", "vary = x from 1 to 9 in 8 steps\nwatch = both, root"));
    const figure = screen.getByRole("figure");
    expect(plain(figure.textContent)).toContain(
      "Figure 3. both and root over x. Line: as written; grey: one sigma of it.",
    );
    const slider = within(figure).getByRole("slider", { name: "Points read in figure 3" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 4, both 6.00, root 2.00");
    fireEvent.keyDown(slider, { key: "End" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 9, both 11.0, root 3.00");
    fireEvent.keyDown(slider, { key: "ArrowLeft" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 8, both 10.0, root 2.83");
    expect(within(figure).getAllByRole("row")).toHaveLength(10);
  });

  it("lists the points without an answer by their reason, and says so where there is no other", () => {
    const { unmount } = render(view("sweep", "vary = x from -2 to 4 in 6 steps\nwatch = root"));
    expect(screen.getByText(/The reasons, point by point: two points/)).toBeTruthy();
    expect(plain(document.querySelector(".figure-reasons dl")!.textContent)).toContain("x −2 to −1");
    unmount();
    render(view("sweep", "vary = x from -4 to -2 in 2 steps\nwatch = root"));
    expect(screen.getByText("No point of this sweep has an answer.")).toBeTruthy();
    expect(screen.queryByRole("figure")).toBeNull();
  });
});

describe("the answer of a sweep of two quantities", () => {
  const map = "vary = x from 1 to 5 in 4 steps\nagainst = r from 1 to 4 in 3 steps\nwatch = both, length";

  it("is read point by point with arrow keys, across and up", () => {
    render(view("sweep", map));
    const slider = screen.getByRole("slider");
    expect(slider.getAttribute("aria-valuetext")).toBe("x 4, r 2, both 6.00");
    fireEvent.keyDown(slider, { key: "ArrowUp" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 4, r 3, both 7.00");
    fireEvent.keyDown(slider, { key: "Home" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 1, r 3, both 4.00");
    fireEvent.keyDown(slider, { key: "PageDown" });
    expect(slider.getAttribute("aria-valuetext")).toBe("x 1, r 1, both 2.00");
  });

  it("shows one of what is watched, and another when it is chosen", () => {
    render(view("sweep", map));
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Map asked: both over");
    fireEvent.click(screen.getByRole("radio", { name: "length" }));
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Map asked: length over");
    expect(plain(screen.getByRole("slider").getAttribute("aria-valuetext"))).toContain("length 4.00 km");
  });
});

describe("the answer of a spread", () => {
  it("is a figure and a table of quantiles with their errors", () => {
    render(view("spread", "watch = length, both\nsamples = 512"));
    expect(plain(screen.getByRole("figure").textContent)).toMatch(
      /Figure 3\. 512 draws\. Grey and thick line: the middle 68 %/,
    );
    const table = screen.getAllByRole("table").at(-1)!;
    const heads = within(table)
      .getAllByRole("columnheader")
      .map(({ textContent }) => plain(textContent));
    expect(heads).toEqual(["2.5 %", "16 %", "median", "84 %", "97.5 %"]);
    const [row] = within(table).getAllByRole("row").slice(1);
    const cells = within(row!)
      .getAllByRole("cell")
      .map(({ textContent }) => plain(textContent)!);
    // x is 4 ± 1, evenly drawn: its median is 4 to a few thousandths, its middle 68 % from 3.006 to 4.994.
    expect(parseFloat(cells[2]!)).toBeCloseTo(4, 1);
    expect(parseFloat(cells[1]!)).toBeCloseTo(3.0, 1);
    expect(cells.every((cell) => cell.includes("± "))).toBe(true);
    expect(screen.getByRole("region", { name: /^Table 2\./ })).toBeTruthy();
  });

  it("says how many draws have no answer", () => {
    render(view("spread", "watch = low\nsamples = 512"));
    // x is 4 ± 1: half of its draws lie below 4, where x − 4 has no square root.
    const [, share] = /512 draws, of which (\d+) % have no answer/.exec(
      plain(screen.getByRole("figure").textContent)!,
    )!;
    expect(Number(share)).toBeGreaterThan(47);
    expect(Number(share)).toBeLessThan(53);
  });

  it("says that no draw has one", () => {
    const spread = answerOf("spread", "watch = bad\nsamples = 64", "y = -5 ± 0.1\nbad = sqrt(y * 1)");
    expect(countResults(spread)).toEqual({ figures: 0, tables: 0 });
  });
});

describe("a cell whose work is under way", () => {
  const task: TaskState = {
    task: { cellId: "asked", kind: "spread", name: "asked", key: "key", points: 64 },
    points: 64,
    done: 16,
    secondsLeft: 3,
    status: "running",
    failure: null,
    stop: () => undefined,
    resume: () => undefined,
  };
  const text = "watch = both\nsamples = 64";

  it("shows progress and no old numbers", () => {
    const { rerender } = render(view("spread", text));
    rerender(view("spread", text, { task }, false));
    expect(screen.getByRole("progressbar")).toBeTruthy();
    expect(document.querySelector(".results-body")!.hasAttribute("inert")).toBe(true);
    expect(screen.queryByText(/are to be computed/)).toBeNull();
  });

  it("shows the answer in part once it was stopped, with a way to the rest", () => {
    const resume = vi.fn();
    render(view("spread", text, { task: { ...task, status: "stopped", resume } }));
    expect(document.querySelector(".results-body")!.hasAttribute("inert")).toBe(false);
    fireEvent.click(screen.getByRole("button", { name: "Compute the rest: asked" }));
    expect(resume).toHaveBeenCalledOnce();
  });
});

describe("figures and tables are counted", () => {
  it("as they are drawn", () => {
    expect(countResults(gasSweep)).toEqual({ figures: 1, tables: 0 });
    expect(countResults({ ...gasSweep, tables: {} })).toEqual({ figures: 0, tables: 0 });
    const spread: CellResult = answerOf("spread", "watch = both\nsamples = 64");
    expect(countResults(spread)).toEqual({ figures: 1, tables: 1 });
    expect(countResults({ ...spread, values: {}, tables: {} })).toEqual({ figures: 0, tables: 0 });
  });

  it("not where no point has an answer", () => {
    const rows = gasSweep.tables.rows!.map((row) => ({
      ...row,
      "leak.exobase.altitude": null,
      "leak.H.rate": null,
      "leak.H2.rate": null,
    }));
    expect(countResults({ ...gasSweep, tables: { ...gasSweep.tables, rows } })).toEqual({
      figures: 0,
      tables: 0,
    });
  });
});
