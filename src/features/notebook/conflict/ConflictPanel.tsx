import { useEffect, useMemo, useRef, useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { HeadlineItem } from "../../../../shared/notebook/summary";
import type { DraftState as ServerDraft } from "../../../../shared/schemas/notebooks";
import { formatCount, formatTime, type UnitSystem } from "../../../lib/format";
import { Button } from "../../../ui/Button";
import { StateWord } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import type { Conflict, DocumentMerge, Side } from "../draft/mergeDocuments";
import { workerEvaluator } from "../evaluation/evaluator";
import { changeWords } from "./changeWords";
import { ChosenHeadlines } from "./ChosenHeadlines";
import { ConflictEntry } from "./ConflictEntry";

interface ConflictPanelProps {
  merge: DocumentMerge;
  mine: NotebookDocument;
  theirs: ServerDraft;
  agreedRevision: number;
  /** Headline of what is chosen; empty while it is computed. */
  chosen: readonly HeadlineItem[];
  unitSystem: UnitSystem;
  choices: Record<string, Side>;
  settling: {
    choose: (conflictId: string, side: Side) => void;
    chooseAll: (side: Side) => void;
    settle: () => void;
  };
}

/** Two states of the same entries: both are shown, one stands, and nothing is saved or lost until it is settled. */
export function ConflictPanel(props: ConflictPanelProps) {
  const { merge, mine, theirs, agreedRevision, chosen, unitSystem, choices, settling } = props;
  const panel = useRef<HTMLElement>(null);
  const headlines = useHeadlines(mine, theirs.document);
  const byCell = useMemo(() => groupByCell(merge.conflicts), [merge.conflicts]);
  const other = theirs.savedBy.name;
  const foreign = merge.settled.filter(({ side }) => side === "theirs");
  const first = other.split(" ", 1)[0] || other;

  useEffect(function comeIntoView() {
    panel.current?.scrollIntoView({ block: "start" });
    panel.current?.focus({ preventScroll: true });
  }, []);

  return (
    <section ref={panel} className="conflict" tabIndex={-1} aria-label="Two states to settle">
      <div className="cell-head head-line">
        <span className="type-kind text-ink2">two states</span>
        <h2 className="type-cell-name">
          {merge.conflicts.length === 1
            ? "one thing to choose"
            : `${formatCount(merge.conflicts.length, "thing")} to choose`}
        </h2>
        <span className="flex-1" />
        <StateWord state="caution">not saved</StateWord>
      </div>
      <p className="pt-8" role="status">
        You and {other} both changed what stands below since revision {agreedRevision}. Nothing is lost:
        choose entry by entry, and what stands is saved as revision {theirs.revision + 1}.
        {foreign.length > 0 &&
          ` Other changes of ${other}’s went in by themselves: ${changeWords(foreign, merge.document)}.`}
      </p>
      <div className="conflict-sides" aria-hidden="true">
        <div>
          <span className="type-section text-dusk">{first}’s</span>
          <span>
            saved {formatTime(new Date(theirs.savedAt))}, revision {theirs.revision}
          </span>
        </div>
        <div>
          <span className="type-section">Yours</span>
          <span>written here and kept here</span>
        </div>
      </div>
      {byCell.map(([cellId, conflicts]) => (
        <div
          key={cellId}
          className="conflict-cell"
          role="group"
          aria-label={cellName(cellId, merge.document)}
        >
          {byCell.length > 1 && <p className="conflict-cell-name">{cellName(cellId, merge.document)}</p>}
          {conflicts.map((conflict) => (
            <ConflictEntry
              key={conflict.id}
              conflict={conflict}
              other={first}
              side={choices[conflict.id] ?? "mine"}
              onChoose={settling.choose}
            />
          ))}
        </div>
      ))}
      <ChosenHeadlines
        theirs={headlines.theirs}
        mine={headlines.mine}
        chosen={chosen}
        other={first}
        unitSystem={unitSystem}
      />
      <div className="conflict-acts">
        <Button tone="main" onClick={settling.settle}>
          Save as chosen
        </Button>
        <TextButton onClick={() => settling.chooseAll("theirs")}>Take all of {first}’s</TextButton>
        <TextButton onClick={() => settling.chooseAll("mine")}>Take all of yours</TextButton>
      </div>
    </section>
  );
}

function groupByCell(conflicts: readonly Conflict[]): [string, Conflict[]][] {
  const groups = new Map<string, Conflict[]>();
  for (const conflict of conflicts) {
    const key = conflict.cellId ?? "";
    groups.set(key, [...(groups.get(key) ?? []), conflict]);
  }
  return [...groups];
}

function cellName(id: string, document: NotebookDocument): string {
  if (id === "") return "notebook";
  const cell = document.cells.find((candidate) => candidate.id === id);
  return cell ? cell.name || cell.kind : "removed cell";
}

/** What each of the two states gives by itself. */
function useHeadlines(mine: NotebookDocument, theirs: NotebookDocument) {
  const [headlines, setHeadlines] = useState<{ mine: HeadlineItem[]; theirs: HeadlineItem[] }>({
    mine: [],
    theirs: [],
  });
  useEffect(
    function computeBoth() {
      let isGone = false;
      const service = workerEvaluator();
      void Promise.all([service.headlineOf(mine), service.headlineOf(theirs)]).then(([here, there]) => {
        if (!isGone) setHeadlines({ mine: here, theirs: there });
      });
      return () => {
        isGone = true;
      };
    },
    [mine, theirs],
  );
  return headlines;
}
