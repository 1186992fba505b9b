import { memo, useDeferredValue } from "react";
import { LevelsTable } from "../../../../ui/tables/LevelsTable";
import { ColumnFigures } from "../ColumnFigures";
import type { AnswerProps } from "./answerProps";

const Levels = memo(LevelsTable);

export function ColumnAnswer({
  evaluation,
  drawn,
  coronae,
  unitSystem,
  figureNumber,
  tableNumber,
  isNear,
}: AnswerProps) {
  const { result, gases } = useDeferredValue(evaluation);
  const isAtRest = drawn !== null && drawn.escape !== null;
  return (
    <>
      {isNear && drawn && (
        <ColumnFigures drawn={drawn} coronae={coronae} unitSystem={unitSystem} number={figureNumber} />
      )}
      {(result.tables.levels?.length ?? 0) > 0 && (
        <Levels
          result={result}
          gases={gases}
          unitSystem={unitSystem}
          number={tableNumber}
          isAtRest={isAtRest}
        />
      )}
    </>
  );
}
