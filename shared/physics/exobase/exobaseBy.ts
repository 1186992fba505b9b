import { marchFurther, type UpwardMarch } from "../column/marchUp";
import type { ExobaseCriterion, ExobaseOutcome } from "../types";
import { exobaseNumber } from "./exobaseNumber";
import { exobaseOutcome, findExobaseBand } from "./findExobase";
import { completeNumber, numberAlong } from "./numberAlong";

/** ln of the number up to which a column that sets its own top is followed: surely beyond 1. */
const surelyPassed = 0.05;

/**
 * The exobase of a column that was marched up, by another criterion than the bulk one. Where the column set its own
 * top, it is followed further up if need be.
 *
 * @param upward               the march, on which further steps may be added
 * @param baseEscapeParameter  of the mean mass at the base, with the lowest temperature above
 *
 * @throws  PhysicsDomainError if the criterion is of a gas that the column has not
 */
export function exobaseBy(
  upward: UpwardMarch,
  criterion: ExobaseCriterion,
  baseEscapeParameter: number,
): ExobaseOutcome {
  const { path } = upward.march;
  const along = numberAlong(path, exobaseNumber(path.problem, criterion));
  let { top, isRunaway } = upward;
  if (path.problem.input.top === "auto") {
    const hasPassed = () => {
      completeNumber(along);
      return along.values.some((value) => value >= surelyPassed);
    };
    if (marchFurther(upward, hasPassed)) isRunaway = true;
    top = Math.max(top, path.positions[path.steps]);
  }
  const band = findExobaseBand(along, upward.along);
  return exobaseOutcome({ along, band, top, baseEscapeParameter, isRunaway });
}
