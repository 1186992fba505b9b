import { fireEvent, render, screen } from "@testing-library/react";
import { expect, it, vi } from "vitest";
import { TwoWay } from "../../../src/ui/TwoWay";

it("is one choice with a name, of which one word stands", () => {
  const onChange = vi.fn();
  const options = [
    { value: "SI", label: "SI" },
    { value: "cgs", label: "cgs" },
  ] as const;
  render(<TwoWay label="Units" value="SI" options={options} onChange={onChange} />);
  expect(screen.getByRole("radiogroup", { name: "Units" })).toBeTruthy();
  expect(screen.getByRole<HTMLInputElement>("radio", { name: "SI" }).checked).toBe(true);
  fireEvent.click(screen.getByRole("radio", { name: "cgs" }));
  expect(onChange).toHaveBeenCalledWith("cgs");
});
