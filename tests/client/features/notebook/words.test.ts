import { describe, expect, it } from "vitest";
import { complaintAndRest } from "../../../../src/features/notebook/cells/complaintAndRest";
import { differingPart } from "../../../../src/features/notebook/conflict/differingPart";
import { formatUnderstood } from "../../../../src/features/notebook/editor/formatUnderstood";

describe("complaintAndRest", () => {
  it.each([
    ["No entry *level* in a column. The nearest is *levels*.", "No entry *level* in a column."],
    ["The escape parameter of H is 9.31. Below 15 it errs.", "The escape parameter of H is 9.31."],
    ["Given by A. V. Pavlov. It holds.", "Given by A. V. Pavlov."],
    ["Without an end", "Without an end"],
  ])("cuts %j after its first sentence", (message, complaint) => {
    expect(complaintAndRest(message)[0]).toBe(complaint);
  });
});

describe("formatUnderstood", () => {
  it("raises exponents however they are written and leans the symbol", () => {
    expect(formatUnderstood("n = 1.84×10²⁰ m⁻³")).toEqual([
      { italic: "n" },
      " = 1.84×10",
      { sup: "20" },
      " m",
      { sup: "−3" },
    ]);
    expect(formatUnderstood("m^-2")).toEqual(["m", { sup: "−2" }]);
  });

  it("sets the digits of gases low", () => {
    expect(formatUnderstood("CO2 94.5 %")).toEqual(["CO", { sub: "2" }, " 94.5 %"]);
  });
});

describe("differingPart", () => {
  it.each([
    ["shape = 0.027 /km)", "shape = 0.022 /km)", "0.027"],
    ["ceiling = 1e8 cm^2/s", "ceiling = 5e7 cm^2/s", "1e8"],
    ["a, b", "a", ", b"],
    ["same", "same", ""],
  ])("of %j against %j is %j", (text, other, part) => {
    const cut = differingPart(text, other);
    expect(cut.part).toBe(part);
    expect(cut.before + cut.part + cut.after).toBe(text);
  });
});
