import { LevelsTable } from "../../../../ui/tables/LevelsTable";
import { ColumnFigures } from "../ColumnFigures";
import type { AnswerProps } from "./answerProps";

export function ColumnAnswer({ evaluation, unitSystem, figureNumber, tableNumber, isNear }: AnswerProps) {
  const { result, gases } = evaluation;
  return (
    <>
      {isNear && <ColumnFigures evaluation={evaluation} unitSystem={unitSystem} number={figureNumber} />}
      {(result.tables.levels?.length ?? 0) > 0 && (
        <LevelsTable result={result} gases={gases} unitSystem={unitSystem} number={tableNumber} />
      )}
    </>
  );
}
