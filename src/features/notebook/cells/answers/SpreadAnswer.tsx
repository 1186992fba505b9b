import { useDeferredValue, useMemo } from "react";
import { SpreadFigure } from "../../../../ui/plots/SpreadFigure";
import { readSpread } from "../../../../ui/plots/spreadResult";
import { SpreadTable } from "../../../../ui/tables/SpreadTable";
import type { AnswerProps } from "./answerProps";
import { hasSpreadAnswer } from "./longAnswers";

/** How watched results scatter and what drives them; their quantiles as a table. */
export function SpreadAnswer({ evaluation, unitSystem, figureNumber, tableNumber, isNear }: AnswerProps) {
  const { result } = useDeferredValue(evaluation);
  const spread = useMemo(() => readSpread(result, unitSystem), [result, unitSystem]);
  if (!spread) return null;
  if (!hasSpreadAnswer(result)) return <p className="answer-none">No draw of this spread has an answer.</p>;
  return (
    <>
      {isNear && <SpreadFigure spread={spread} unitSystem={unitSystem} number={figureNumber} />}
      <SpreadTable spread={spread} number={tableNumber} />
    </>
  );
}
