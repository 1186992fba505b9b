import { expect, TestRunner } from "vitest";

import {
  type Agreement,
  type ComparedNumber,
  isRange,
  type NumberRange,
  type SingleNumber,
  strain,
} from "./validation/agreement";
import { citation } from "./validation/sources";

/**
 * `expect(ours).toAgreeWith({ what, unit, published, within: { relative: 1e-4 }, source, mark })`: asserts, and notes
 * the comparison for `docs/validation.md`. Every number that comes from outside is asserted with it.
 */
expect.extend({
  toAgreeWith(ours: unknown, outside: SingleNumber | NumberRange) {
    const isNumber = typeof ours === "number";
    if (isNumber) noteAgreement({ ...outside, ours });
    const pass = isNumber && agrees({ ...outside, ours });
    const wanted =
      "published" in outside
        ? `${outside.published} ${outside.unit} within ${JSON.stringify(outside.within)}`
        : `between ${outside.within.range.join(" and ")} ${outside.unit}`;
    return {
      pass,
      message: () => `${outside.what}: expected ${wanted} (${outside.source}); found ${String(ours)}`,
    };
  },
});

function agrees(row: Agreement): boolean {
  if (isRange(row)) return row.ours >= row.within.range[0] && row.ours <= row.within.range[1];
  return strain(row as SingleNumber & { ours: number }) <= 1;
}

/** Notes an order of magnitude beside ours, and asserts no more than that there is one. */
export function compareMagnitude(ours: number, outside: ComparedNumber): void {
  expect(ours, outside.what).toSatisfy(Number.isFinite);
  noteAgreement({ ...outside, ours });
}

function noteAgreement(row: Agreement): void {
  // A key that has no citation fails here, beside its check.
  citation(row.source);
  const { meta } = TestRunner.getCurrentTest()!;
  meta.agreements = [...(meta.agreements ?? []), row];
}

declare module "vitest" {
  // The type parameter must be spelled as vitest spells it for the two declarations to merge.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  interface Matchers<T = any> {
    toAgreeWith(outside: SingleNumber | NumberRange): T;
  }
}
