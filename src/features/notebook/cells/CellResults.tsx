import { useRef } from "react";
import type { CellEvaluation, Note } from "../../../../shared/notebook/result";
import { ValueList } from "../../../ui/tables/ValueList";
import type { AnswerProps } from "./answers/answerProps";
import { answers } from "./answers/answers";
import type { CellViewProps } from "./CellView";
import { Computing } from "./Computing";
import { isUnderWay, TaskHalt, TaskNews, TaskProgress } from "./TaskProgress";

interface CellResultsProps extends CellViewProps {
  /** Figures are made when the cell first comes near the screen. */
  isNear: boolean;
  onRemedy: ((note: Note) => void) | undefined;
}

/**
 * What a cell gives. While an entry is at fault or its answer is late, the old figures keep their place unseen, so
 * that nothing is drawn anew, and nothing moves, when the next answer comes.
 */
export function CellResults(props: CellResultsProps) {
  const { cell, evaluation, isLate, task } = props;
  const hasAnswer = evaluation !== undefined && isAnswered(evaluation);
  const isLong = cell.kind === "sweep" || cell.kind === "spread";
  const lastGood = useRef<CellEvaluation | null>(null);
  if (hasAnswer) lastGood.current = evaluation;

  if (cell.kind === "prose" || cell.kind === "values") return null;
  const shown = lastGood.current;
  // What was stopped shows its answer as soon as it has been evaluated.
  const isUnderWayNow =
    task !== undefined && (isUnderWay(task) || (task.done > 0 && !hasAnswer && !task.failure));
  const isVoid = isLate || isUnderWayNow || !hasAnswer;
  const wait = isUnderWayNow && !isLate ? <TaskProgress task={task} /> : <Computing isBeginning={!shown} />;
  return (
    <>
      {isLong && <TaskNews name={cell.name} task={task} />}
      {task && !isUnderWayNow && !isLate && <TaskHalt task={task} />}
      {!shown && (isLate || !evaluation || isUnderWayNow) && wait}
      {shown && (
        <div className="results" data-void={isVoid || undefined} aria-busy={isLate || isUnderWayNow}>
          {(isLate || isUnderWayNow) && wait}
          <div className="results-body" inert={isVoid}>
            <Answer {...props} evaluation={shown} />
          </div>
        </div>
      )}
    </>
  );
}

function isAnswered({ result }: CellEvaluation): boolean {
  if (result.kind === "column") return result.profiles !== undefined;
  return (
    Object.keys(result.values).length > 0 || Object.values(result.tables).some((rows) => rows.length > 0)
  );
}

function Answer(props: AnswerProps) {
  const { result } = props.evaluation;
  const OwnAnswer = answers[result.kind];
  return OwnAnswer ? <OwnAnswer {...props} /> : <ValueList result={result} unitSystem={props.unitSystem} />;
}
