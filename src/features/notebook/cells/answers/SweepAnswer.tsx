import { useDeferredValue, useMemo } from "react";
import { MapFigure } from "../../../../ui/plots/MapFigure";
import { MissingPoints } from "../../../../ui/plots/MissingPoints";
import { SweepFigure } from "../../../../ui/plots/SweepFigure";
import { readSweep } from "../../../../ui/plots/sweepResult";
import type { AnswerProps } from "./answerProps";
import { hasSweptAnswer } from "./longAnswers";

/** Curves over one varied quantity, a map over two. */
export function SweepAnswer({ evaluation, columnGases, unitSystem, figureNumber, isNear }: AnswerProps) {
  const { result } = useDeferredValue(evaluation);
  const sweep = useMemo(() => readSweep(result, unitSystem), [result, unitSystem]);
  if (!sweep || !isNear) return null;
  const reasons = <MissingPoints sweep={sweep} />;
  if (!hasSweptAnswer(result))
    return (
      <>
        <p className="answer-none">No point of this sweep has an answer.</p>
        {reasons}
      </>
    );
  const [, second] = sweep.axes;
  // Of a map that was stopped in its first row there is no more than a line.
  const isMap = second !== undefined && second.values.length > 1;
  const Figure = isMap ? MapFigure : SweepFigure;
  return (
    <Figure
      sweep={sweep}
      columnGases={columnGases}
      unitSystem={unitSystem}
      number={figureNumber}
      reasons={reasons}
    />
  );
}
