import { act, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { NoticesProvider, useNotify } from "../../../src/ui/Notices";

const putBack = vi.fn();

function Deleter() {
  const notify = useNotify();
  return (
    <button
      onClick={() => notify({ text: "Cell halo removed.", action: { label: "Put back", run: putBack } })}
    >
      Remove
    </button>
  );
}

function removeCell() {
  render(
    <NoticesProvider>
      <Deleter />
    </NoticesProvider>,
  );
  fireEvent.click(screen.getByRole("button", { name: "Remove" }));
}

beforeEach(() => {
  vi.useFakeTimers();
  putBack.mockClear();
});
afterEach(() => vi.useRealTimers());

it("is announced politely and goes by itself", () => {
  removeCell();
  expect(screen.getByRole("status").textContent).toContain("Cell halo removed.");
  act(() => {
    vi.advanceTimersByTime(20_000);
  });
  expect(screen.queryByText("Cell halo removed.")).toBeNull();
});

it("stays as long as it holds the focus", () => {
  removeCell();
  fireEvent.focus(screen.getByRole("button", { name: "Put back" }));
  act(() => {
    vi.advanceTimersByTime(60_000);
  });
  expect(screen.getByText("Cell halo removed.")).toBeTruthy();
});

it("takes back what it tells of, once", () => {
  removeCell();
  fireEvent.click(screen.getByRole("button", { name: "Put back" }));
  expect(putBack).toHaveBeenCalledOnce();
  expect(screen.queryByText("Cell halo removed.")).toBeNull();
});
