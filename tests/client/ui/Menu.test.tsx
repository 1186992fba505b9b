import { fireEvent, render, screen } from "@testing-library/react";
import { describe, expect, it, vi } from "vitest";
import { Menu, MenuItem } from "../../../src/ui/Menu";

function renderMenu(onSelect = vi.fn()) {
  render(
    <Menu trigger={<button type="button">More</button>}>
      <MenuItem onSelect={onSelect}>Rename</MenuItem>
      <MenuItem onSelect={onSelect} disabled>
        Delete
      </MenuItem>
    </Menu>,
  );
  return onSelect;
}

describe("a menu", () => {
  it("says that it is one before its parts are fetched", () => {
    renderMenu();
    expect(screen.getByRole("button", { name: "More" }).getAttribute("aria-haspopup")).toBe("menu");
    expect(screen.queryByRole("menu")).toBeNull();
  });

  it("opens at a press and runs the verb that is chosen", async () => {
    const onSelect = renderMenu();
    fireEvent.click(screen.getByRole("button", { name: "More" }));
    fireEvent.click(await screen.findByRole("menuitem", { name: "Rename" }));
    expect(onSelect).toHaveBeenCalledOnce();
    expect(screen.queryByRole("menu")).toBeNull();
  });

  it("opens with the arrow key, and closes with Escape", async () => {
    renderMenu();
    fireEvent.keyDown(screen.getByRole("button", { name: "More" }), { key: "ArrowDown" });
    const menu = await screen.findByRole("menu");
    fireEvent.keyDown(menu, { key: "Escape" });
    expect(screen.queryByRole("menu")).toBeNull();
  });

  it("does nothing for a verb that is not possible now", async () => {
    const onSelect = renderMenu();
    fireEvent.click(screen.getByRole("button", { name: "More" }));
    fireEvent.click(await screen.findByRole("menuitem", { name: "Delete" }));
    expect(onSelect).not.toHaveBeenCalled();
  });
});
