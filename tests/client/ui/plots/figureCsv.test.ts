import { describe, expect, it } from "vitest";
import { figureCsv } from "../../../../src/ui/plots/figureCsv";

describe("figureCsv", () => {
  it("keeps every digit that gives the number back", () => {
    const values = [1 / 3, 1.8026e-155, 4_943_027.5, 0];
    const lines = figureCsv([{ head: "n (m^-3)", values }])
      .trimEnd()
      .split("\r\n");
    expect(lines[0]).toBe("n (m^-3)");
    expect(lines.slice(1).map(Number)).toEqual(values);
  });

  it("quotes heads that hold a comma or a quotation mark", () => {
    expect(figureCsv([{ head: 'a, "b"', values: [1] }])).toBe('"a, ""b"""\r\n1\r\n');
  });

  it("leaves cells empty where a column is shorter", () => {
    const text = figureCsv([
      { head: "a", values: [1, 2] },
      { head: "b", values: [3] },
    ]);
    expect(text).toBe("a,b\r\n1,3\r\n2,\r\n");
  });

  it("has a head and no rows where there is nothing", () => {
    expect(figureCsv([{ head: "a", values: [] }])).toBe("a\r\n");
  });
});
