import { fireEvent, render, screen, within } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { HandbookChooser } from "../../../../src/features/notebook/cells/HandbookChooser";
import { InsertCell } from "../../../../src/features/notebook/cells/InsertCell";
import type { CellCommands } from "../../../../src/features/notebook/cells/useCellCommands";

describe("choosing from the handbook", () => {
  it("finds a row and gives it as a cell", () => {
    const onChoose = vi.fn();
    render(<HandbookChooser onChoose={onChoose} onClose={() => undefined} />);
    fireEvent.change(screen.getByLabelText("Search names and formulas"), { target: { value: "titan" } });
    const found = within(screen.getByRole("dialog", { name: "From the handbook" })).getAllByRole("listitem");
    expect(found).toHaveLength(1);
    fireEvent.click(screen.getByRole("button", { name: /^Titan/ }));
    expect(onChoose).toHaveBeenCalledWith([{ kind: "body", name: "titan", text: "like = handbook(Titan)" }]);
  });

  it("says so where there is nothing", () => {
    render(<HandbookChooser onChoose={() => undefined} onClose={() => undefined} />);
    fireEvent.change(screen.getByLabelText("Search names and formulas"), { target: { value: "zzz" } });
    expect(screen.getByText(/Nothing in the handbook with “zzz”/)).toBeTruthy();
  });

  it("hangs from the caret between cells, and inserts at its place", async () => {
    const insertFromHandbook = vi.fn();
    const commands = { insertFromHandbook } as unknown as CellCommands;
    render(<InsertCell index={3} afterId="a" place="after Body oda" isLast={false} commands={commands} />);
    fireEvent.click(screen.getByRole("button", { name: "Insert a cell after Body oda" }));
    fireEvent.click(await screen.findByRole("menuitem", { name: /^handbook/ }));
    const dialog = within(await screen.findByRole("dialog", { name: "From the handbook" }));
    fireEvent.click(dialog.getByRole("button", { name: "Mars planet" }));
    expect(insertFromHandbook).toHaveBeenCalledWith([expect.objectContaining({ name: "mars" })], 3);
    expect(screen.queryByRole("dialog")).toBeNull();
  });
});
