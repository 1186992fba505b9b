import { describe, expect, it } from "vitest";

import { magnitude } from "../../../../shared/physics/numerics/magnitude";
import "../../../toBeCloseToRelative";

describe("magnitude", () => {
  it("is e to what it is given", () => {
    expect(magnitude(0)).toBe(1);
    expect(magnitude(-2)).toBeCloseToRelative(Math.exp(-2), 1e-15);
    expect(magnitude(600)).toBeCloseToRelative(Math.exp(600), 1e-15);
  });

  it("is null beyond 1e-300 and 1e300, where a number nears its end", () => {
    expect(magnitude(-300.01 * Math.LN10)).toBeNull();
    expect(magnitude(300.01 * Math.LN10)).toBeNull();
    expect(magnitude(-299.99 * Math.LN10)).not.toBeNull();
    expect(magnitude(299.99 * Math.LN10)).not.toBeNull();
  });

  it("is 0 for what is not there", () => {
    expect(magnitude(-Infinity)).toBe(0);
  });
});
