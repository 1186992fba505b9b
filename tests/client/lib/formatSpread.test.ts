import { describe, expect, it } from "vitest";
import { quantityText } from "../../../src/lib/format";
import { formatSpread, formatUncertain, numberSpread } from "../../../src/lib/formatSpread";
import { plainText } from "../../../src/lib/richText";

const spaced = (text: string) => text.replace(/[\u202f\u00a0]/g, " ");
const whole = (value: number, lower: number, upper: number) =>
  spaced(plainText(formatSpread(value, { lower, upper }).whole));

describe("a number with its spread", () => {
  it.each([
    [239, 214, 268, "239 ± 27", "sides that differ by less than a third"],
    [8.0, 6.9, 9.3, "8.0 ± 1.2", "as many decimals as leave the spread two digits"],
    [239, 227, 269, "239 +30 −12", "sides that differ"],
    [10, 9.6, 22.3, "10.0 +12.3 −0.4", "as many decimals as the smaller side needs for one digit"],
    [9.9e25, 6.6e25, 1.6e26, "(9.9 +6.1 −3.3) × 10²⁵", "one power for all"],
    [4.2e-9, 4e-9, 4.4e-9, "(4.20 ± 0.20) × 10⁻⁹", "one power for small numbers"],
    [5, 5, 5, "5 ± 0", "no spread at all"],
    [4.2, 4.6, 9.1, "4.20 (68 % from 4.60 to 9.10)", "a range where the number lies outside"],
  ])("%s between %s and %s is told as %s: %s", (value, lower, upper, text) => {
    expect(whole(value, lower, upper)).toBe(text);
  });

  it("keeps its spread apart, in the same power, to stand under it", () => {
    const { alone, isShort } = formatSpread(1.16e26, { lower: 1.04e26, upper: 1.2e26 });
    expect(spaced(plainText(alone))).toBe("+0.04 −0.12 × 10²⁶");
    expect(isShort).toBe(false);
    expect(formatSpread(239, { lower: 216, upper: 269 }).isShort).toBe(true);
  });

  it("is shown in the unit that its number is shown in", () => {
    const speed = { value: 8130, unit: "m s^-1" };
    const text = quantityText(formatUncertain(speed, { lower: 8000, upper: 8260 }, "SI"));
    expect(spaced(text)).toBe("8.13 ± 0.13 km s⁻¹");
    expect(spaced(quantityText(formatUncertain(speed, null, "SI")))).toBe("8.13 km s⁻¹");
  });

  it("is none where an end is too small to have a value", () => {
    expect(numberSpread({ lower: null, upper: 1 })).toBeNull();
    expect(numberSpread(undefined)).toBeNull();
    expect(numberSpread({ lower: 0, upper: 1 })).toEqual({ lower: 0, upper: 1 });
  });
});
