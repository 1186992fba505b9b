import { useDeferredValue } from "react";
import { CoronaFigure } from "../../../../ui/plots/CoronaFigure";
import { CoronaLevels } from "../../../../ui/tables/CoronaLevels";
import { ValueList } from "../../../../ui/tables/ValueList";
import type { AnswerProps } from "./answerProps";

const labels = { "exobase.number_density": ["Density just below the exobase"] };

/** What a corona gives: its figure, and its levels where they are asked for. */
export function CoronaAnswer({
  evaluation,
  columnGases,
  unitSystem,
  figureNumber,
  tableNumber,
  isNear,
}: AnswerProps) {
  const { result, corona, gases } = useDeferredValue(evaluation);
  return (
    <>
      <ValueList result={result} unitSystem={unitSystem} names={Object.keys(labels)} labels={labels} />
      {isNear && corona && result.profiles && (
        <CoronaFigure
          result={result}
          corona={corona}
          gas={gases[0]!}
          columnGases={columnGases}
          unitSystem={unitSystem}
          number={figureNumber}
        />
      )}
      <CoronaLevels result={result} gas={gases[0] ?? ""} unitSystem={unitSystem} number={tableNumber} />
    </>
  );
}
