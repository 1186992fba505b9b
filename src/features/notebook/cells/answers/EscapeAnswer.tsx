import { EscapeTable } from "../../../../ui/tables/EscapeTable";
import type { AnswerProps } from "./answerProps";

export function EscapeAnswer({
  evaluation,
  columnGases,
  unitSystem,
  tableNumber,
  notes,
  onRemedy,
}: AnswerProps) {
  return (
    <EscapeTable
      result={evaluation.result}
      gases={evaluation.gases}
      convention={evaluation.convention}
      columnGases={columnGases}
      unitSystem={unitSystem}
      number={tableNumber}
      notes={notes}
      onRemedy={onRemedy}
    />
  );
}
