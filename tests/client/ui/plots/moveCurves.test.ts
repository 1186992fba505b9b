import { expect, it } from "vitest";
import type { FigureDrawing } from "../../../../src/ui/plots/exportFigure";
import { curvePath, isMove } from "../../../../src/ui/plots/moveCurves";

const drawing = (
  change: { to?: number; width?: number; color?: string; x?: number[] } = {},
): FigureDrawing => ({
  data: [
    {
      type: "scatter",
      name: "H",
      x: change.x ?? [1, 2],
      y: [80, 600],
      line: { color: change.color ?? "#86196f" },
    },
  ],
  layout: {
    width: change.width ?? 736,
    height: 486,
    yaxis: { range: [80, change.to ?? 600] },
    shapes: [],
  },
});

it("takes curves that ran elsewhere on nearly the same axes for a move", () => {
  expect(isMove(drawing(), drawing({ x: [5, 6], to: 620 }))).toBe(true);
});

it.each([
  ["an axis that ends far from where it did", drawing({ to: 700 })],
  ["another width", drawing({ width: 354 })],
  ["another colour", drawing({ color: "#2f7b45" })],
  ["a curve more", { ...drawing(), data: [...drawing().data, ...drawing().data] }],
])("draws the figure anew for %s", (_words, next) => {
  expect(isMove(drawing(), next)).toBe(false);
});

it("draws a curve within its own panel, where panels stand above each other", () => {
  const layout: FigureDrawing["layout"] = {
    width: 100,
    height: 200,
    xaxis: { range: [0, 1] },
    yaxis: { range: [0, 1], domain: [0.5, 1] },
    yaxis2: { range: [0, 1], domain: [0, 0.25] },
  };
  const line = { x: [0, 1], y: [0, 1] };
  expect(curvePath(line, layout)).toBe("M0.00,100.00L100.00,0.00");
  expect(curvePath({ ...line, yaxis: "y2" }, layout)).toBe("M0.00,50.00L100.00,0.00");
});
