import { act, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import type { FigureDrawing } from "../../../../src/ui/plots/exportFigure";
import { useDrawn } from "../../../../src/ui/plots/useDrawn";

const moved = vi.hoisted(() => [] as FigureDrawing[]);
vi.mock("../../../../src/ui/plots/moveCurves", async (original) => ({
  ...(await original<object>()),
  moveMarks: () => Promise.resolve(),
  moveCurves: (_graph: unknown, _drawn: unknown, drawing: FigureDrawing) => {
    moved.push(drawing);
  },
}));

beforeEach(() => {
  vi.useFakeTimers();
  moved.length = 0;
});
afterEach(() => {
  act(() => {
    vi.runAllTimers();
  });
  vi.useRealTimers();
});

const curve = (x: number): FigureDrawing => ({ data: [{ type: "scatter", x: [x] }], layout: { width: 736 } });
const wide = (width: number): FigureDrawing => ({ data: [{ type: "scatter", x: [1] }], layout: { width } });

const drawingHook = (first: FigureDrawing) =>
  renderHook(({ latest }) => useDrawn(latest), { initialProps: { latest: first } });

it("draws anew in a later task, and never what was overtaken", () => {
  const [first, second, third] = [wide(1), wide(2), wide(3)];
  const { result, rerender } = drawingHook(first);
  rerender({ latest: second });
  rerender({ latest: third });
  expect(result.current.drawn).toBe(first);
  act(() => {
    vi.advanceTimersToNextTimer();
  });
  expect(result.current.drawn).toBe(third);
});

it("lets figures draw one after the other", () => {
  const [one, two] = [drawingHook(wide(1)), drawingHook(wide(1))];
  const next = wide(2);
  one.rerender({ latest: next });
  two.rerender({ latest: next });
  act(() => {
    vi.advanceTimersToNextTimer();
  });
  expect([one.result.current.drawn === next, two.result.current.drawn === next]).toEqual([true, false]);
  act(() => {
    vi.advanceTimersToNextTimer();
  });
  expect(two.result.current.drawn).toBe(next);
});

it("moves curves at once, and draws the whole once writing rests", () => {
  const [first, second, third] = [curve(1), curve(2), curve(3)];
  const { result, rerender } = drawingHook(first);
  act(() => result.current.holdGraph(null, document.createElement("div")));
  rerender({ latest: second });
  rerender({ latest: third });
  expect(moved).toEqual([second, third]);
  expect(result.current.drawn).toBe(first);
  act(() => {
    vi.runAllTimers();
  });
  expect(result.current.drawn).toBe(third);
});
