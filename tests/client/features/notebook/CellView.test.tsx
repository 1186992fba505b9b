import { render, screen, waitFor, within } from "@testing-library/react";
import { beforeAll, describe, expect, it, vi } from "vitest";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import type { Cell } from "../../../../shared/notebook/document";
import { CellView, type CellViewProps } from "../../../../src/features/notebook/cells/CellView";
import { readingCommands } from "../../../../src/features/notebook/cells/readingCommands";
import { aCell, aNotebook } from "./aNotebook";

beforeAll(() => {
  // The editor measures text, which jsdom does not lay out.
  const nothing = { x: 0, y: 0, top: 0, left: 0, bottom: 0, right: 0, width: 0, height: 0 };
  Range.prototype.getClientRects = () => [] as unknown as DOMRectList;
  Range.prototype.getBoundingClientRect = () => nothing as DOMRect;
});

function show(cell: Cell, change: Partial<CellViewProps> = {}) {
  const { evaluation } = evaluateNotebook(aNotebook({ cells: [cell] }));
  const commands = { ...readingCommands, write: vi.fn(), rename: vi.fn(), move: vi.fn(), remove: vi.fn() };
  render(
    <CellView
      cell={cell}
      evaluation={evaluation.cells[0]}
      readText={cell.text}
      columnGases={undefined}
      coronae={[]}
      drawn={null}
      notes={evaluation.cells[0]!.result.notes.map((note) => ({ note, letter: null }))}
      isLate={false}
      task={undefined}
      unitSystem="SI"
      figureNumber={1}
      tableNumber={1}
      isEditable
      isNew={false}
      surroundings={{ cells: new Map(), names: new Set(), isGas: () => false }}
      commands={commands}
      onDragStart={() => {}}
      {...change}
    />,
  );
  return commands;
}

const body = aCell({
  id: "body",
  kind: "body",
  name: "ilmara",
  text: "mass = 0.41 earth_mass\nradius = 4943 km",
});

describe("CellView", () => {
  it("is a region named by kind and name, with its entries in an editor that says what it holds", () => {
    show(body);
    const region = screen.getByRole("region", { name: "body ilmara" });
    const editor = within(region).getByRole("textbox", { name: "Entries of Body ilmara" });
    expect(editor.textContent).toContain("earth_mass");
  });

  it("says after an entry how it was understood, where that adds something", async () => {
    show(body);
    await waitFor(() => expect(document.querySelectorAll(".entry-understood").length).toBeGreaterThan(0));
    expect(document.querySelector(".entry-understood")!.textContent).toMatch(/^2\.449×1024\s?kg$/);
  });

  it("puts a fault under its entry, with the remedy as a word to press", async () => {
    const commands = show({ ...body, text: "mass = 0.41 earth_mass\nradios = 4943 km" });
    const remedy = await screen.findByRole("button", { name: "Change to radius" });
    expect(document.querySelector(".entry-note-fault")!.textContent).toContain("radios");
    remedy.click();
    expect(commands.write).toHaveBeenCalledWith("body", "mass = 0.41 earth_mass\nradius = 4943 km");
  });

  it("says in its head how grave the gravest notes are", () => {
    show({ ...body, text: "mass = 0.41 earth_mass\nradios = 4943 km" });
    expect(screen.getByText(/faults?$/)).toBeTruthy();
  });

  it("shows no numbers while its answer is late", () => {
    show(body, { isLate: true });
    expect(screen.getByText("Computing")).toBeTruthy();
    expect(document.querySelector(".results")!.getAttribute("aria-busy")).toBe("true");
    expect(document.querySelector(".results-body")!.hasAttribute("inert")).toBe(true);
  });

  it("offers nothing to change to those who may only read", async () => {
    show({ ...body, text: "mass = 0.41 earth_mass\nradios = 4943 km" }, { isEditable: false });
    await waitFor(() => expect(document.querySelector(".entry-note-fault")).not.toBeNull());
    expect(screen.queryByRole("button")).toBeNull();
    expect(screen.getByRole("textbox").getAttribute("aria-readonly")).toBe("true");
  });

  it("sets prose as it reads, headings under the title of the notebook", async () => {
    show(aCell({ id: "text", kind: "prose", name: "", text: "# Method\n\nIlmara is *small*." }), {
      evaluation: undefined,
    });
    expect(await screen.findByRole("heading", { level: 2, name: "Method" })).toBeTruthy();
    expect(screen.getByText("small").tagName).toBe("EM");
  });

  it("lets no HTML of the writer's through", async () => {
    const text = 'Before <img src="x" onerror="alert(1)"> [link](javascript:alert(1)) after.';
    show(aCell({ id: "text", kind: "prose", name: "", text }), { evaluation: undefined });
    const link = await screen.findByText("link");
    expect(link.getAttribute("href") ?? "").not.toContain("javascript");
    expect(document.querySelector("img")).toBeNull();
  });
});
