import { render } from "@testing-library/react";
import { expect, it } from "vitest";
import { DefaultsLine } from "../../../../src/features/notebook/cells/DefaultsLine";

const three = [
  { key: "criterion", text: "criterion = bulk", note: "l = H" },
  { key: "coupling", text: "coupling = coupled", note: "the column feels what escapes" },
  { key: "satellites", text: "satellites = 0" },
];

it("sets commas once, whatever has a note", () => {
  const line = (defaults: typeof three) => render(<DefaultsLine defaults={defaults} />).container.textContent;
  expect(line(three)).toBe(
    "By default criterion = bulk, l = H, coupling = coupled, the column feels what escapes, and satellites = 0.",
  );
  expect(line(three.slice(0, 1))).toBe("By default criterion = bulk, l = H.");
  expect(line([])).toBe("");
});
