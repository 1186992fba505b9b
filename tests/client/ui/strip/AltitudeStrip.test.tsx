import { fireEvent, render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { AltitudeStrip } from "../../../../src/ui/strip/AltitudeStrip";
import { LyingStrip } from "../../../../src/ui/strip/LyingStrip";
import { StripShelf } from "../../../../src/ui/strip/StripShelf";
import { StripThumb } from "../../../../src/ui/strip/StripThumb";
import { ilmara, sampleColumn } from "../../fixtures/sampleColumn";

const { strip } = sampleColumn(ilmara);
const unbound = { ...strip, column: "hot", exobase: null, lower: null, upper: null };

describe.each([
  ["standing", AltitudeStrip],
  ["lying", LyingStrip],
])("the strip %s", (_, Part) => {
  it("says its main numbers and tells each mark as a sentence", () => {
    render(<Part strip={strip} unitSystem="SI" />);
    expect(screen.getByRole("img", { name: /Altitude strip of dayside.*exobase at/ })).toBeTruthy();
    expect(screen.getByRole("list", { name: "Marks of dayside" }).children.length).toBeGreaterThan(6);
  });

  it("is read by arrow keys, and put away by Escape", () => {
    const { container } = render(<Part strip={strip} unitSystem="SI" />);
    const reader = screen.getByRole("slider", { name: "Altitude read in dayside" });
    fireEvent.focus(reader);
    const before = Number(reader.getAttribute("aria-valuenow"));
    fireEvent.keyDown(reader, { key: "ArrowUp", shiftKey: true });
    expect(Number(reader.getAttribute("aria-valuenow"))).toBeGreaterThan(before);
    expect(reader.getAttribute("aria-valuetext")).toContain("Knudsen number");
    fireEvent.keyDown(reader, { key: "Home" });
    expect(reader.getAttribute("aria-valuenow")).toBe("80");
    expect(container.querySelector(".strip-plate")).not.toBeNull();
    fireEvent.keyDown(reader, { key: "Escape" });
    expect(container.querySelector(".strip-plate")).toBeNull();
  });

  it("says how far its exobase may lie from the mark, where that is known", () => {
    const spread = { lower: strip.exobase! - 26e3, upper: strip.exobase! + 26e3 };
    const { container } = render(<Part strip={strip} exobaseSpread={spread} unitSystem="SI" />);
    const told = new RegExp(`${Math.round(strip.exobase! / 1000)}\\s±\\s26\\skm`);
    expect(container.querySelector("svg.strip-svg")!.textContent).toMatch(told);
    expect(screen.getByRole("img").getAttribute("aria-label")).toMatch(told);
    expect(screen.getByRole("list").textContent).toMatch(told);
  });

  it("draws a column that has no exobase", () => {
    render(<Part strip={unbound} unitSystem="SI" />);
    expect(screen.getByRole("img", { name: /no exobase/ })).toBeTruthy();
  });
});

describe("bodies side by side", () => {
  const bodies = [
    { id: "1", body: "Ilmara", note: "2 notebooks", strip },
    { id: "2", body: "Saranth", note: "1 notebook", strip: unbound },
  ];

  it("says of each where its exobase is, or that it has none", () => {
    render(<StripShelf bodies={bodies} />);
    const shelf = screen.getByRole("img", { name: /^On one scale of altitude: Ilmara: exobase at/ });
    expect(shelf.getAttribute("aria-label")).toContain("Saranth: no exobase, the gas runs on");
    expect(screen.getByText("2 notebooks")).toBeTruthy();
  });

  it("lets an exobase far above all others run off the scale and say so", () => {
    const high = { ...strip, exobase: 30e6, top: 60e6 };
    const three = [
      bodies[0]!,
      { ...bodies[0]!, id: "3", body: "Oda" },
      { id: "4", body: "Veiga", note: "", strip: high },
    ];
    render(<StripShelf bodies={three} />);
    expect(screen.getByText("above this scale")).toBeTruthy();
  });

  it("shows nothing where there is no body", () => {
    const { container } = render(<StripShelf bodies={[]} />);
    expect(container.querySelector("svg")).toBeNull();
  });

  it("has a small one that is decoration alone", () => {
    const { container } = render(<StripThumb strip={strip} />);
    expect(container.querySelector("svg")?.getAttribute("aria-hidden")).toBe("true");
  });
});
