import { useCallback, useEffect, useMemo, useRef, useState, type PropsWithChildren } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import {
  explain,
  type Explanation,
  type ResultPlace,
} from "../../../../shared/notebook/explanations/explain";
import type { UnitSystem } from "../../../lib/format";
import { ExplainNumbers, placeKey, type NumberExplainer } from "../../../ui/tables/ExplainNumber";
import type { LiveEvaluation } from "../evaluation/useEvaluation";
import { ExplainPanel } from "./ExplainPanel";
import "./explain.css";

interface ExplainDeskProps {
  document: NotebookDocument;
  live: Pick<LiveEvaluation, "evaluated" | "late">;
  unitSystem: UnitSystem;
}

/** Lets every number on the desk explain itself, one at a time, in a panel that hangs from it. */
export function ExplainDesk({ document, live, unitSystem, children }: PropsWithChildren<ExplainDeskProps>) {
  const desk = useRef<HTMLDivElement>(null);
  const anchor = useRef<HTMLElement | null>(null);
  const [place, setPlace] = useState<ResultPlace | null>(null);
  const openKey = place && placeKey(place);

  const findNumber = useCallback((): HTMLElement | null => {
    if (anchor.current?.isConnected && anchor.current.dataset.number === openKey) return anchor.current;
    const all = desk.current?.querySelectorAll<HTMLElement>("[data-number]") ?? [];
    anchor.current = [...all].find((number) => number.dataset.number === openKey) ?? anchor.current;
    return anchor.current;
  }, [openKey]);

  const close = useCallback(() => {
    const isWithin = window.document.activeElement?.closest(".explain") !== null;
    if (isWithin) findNumber()?.focus({ preventScroll: true });
    setPlace(null);
  }, [findNumber]);

  const explainer = useMemo(
    (): NumberExplainer => ({
      openKey,
      explain: (asked, number) => {
        const isOpen = openKey === placeKey(asked) && anchor.current === number;
        anchor.current = number;
        setPlace(isOpen ? null : asked);
      },
    }),
    [openKey],
  );
  useEscapeKey(place === null ? null : close);

  return (
    <ExplainNumbers value={explainer}>
      <div ref={desk} className="explain-desk">
        {children}
        {place && (
          <LivePanel
            key={openKey}
            place={place}
            document={document}
            live={live}
            unitSystem={unitSystem}
            desk={desk}
            findNumber={findNumber}
            onClose={close}
          />
        )}
      </div>
    </ExplainNumbers>
  );
}

interface LivePanelProps extends ExplainDeskProps {
  place: ResultPlace;
  desk: React.RefObject<HTMLDivElement | null>;
  findNumber: () => HTMLElement | null;
  onClose: () => void;
}

/** The explanation of what is written now; while there is none, the last one, void. */
function LivePanel({ place, document, live, ...rest }: LivePanelProps) {
  const { evaluated, late } = live;
  const explanation = useMemo(
    () => (evaluated ? explain(evaluated.document.cells, evaluated.cells.values(), place) : null),
    [evaluated, place],
  );
  const last = useRef<Explanation | null>(null);
  if (explanation) last.current = explanation;
  const cellId = explanation?.cellId ?? last.current?.cellId ?? null;
  const isThere = cellId !== null && document.cells.some(({ id }) => id === cellId);
  return (
    <ExplainPanel
      {...rest}
      place={place}
      explanation={explanation}
      cellId={isThere ? cellId : null}
      isLate={cellId !== null && late.has(cellId)}
    />
  );
}

/** Escape closes, unless what has the focus needs the key itself. */
function useEscapeKey(onEscape: (() => void) | null): void {
  useEffect(
    function closeByKey() {
      if (!onEscape) return undefined;
      const handleKeyDown = (event: KeyboardEvent) => {
        const target = event.target as Element | null;
        const isTaken = target?.closest?.(".cm-editor, input, textarea, [role=menu], [aria-modal=true]");
        if (event.key === "Escape" && !event.defaultPrevented && !isTaken) onEscape();
      };
      window.document.addEventListener("keydown", handleKeyDown);
      return () => window.document.removeEventListener("keydown", handleKeyDown);
    },
    [onEscape],
  );
}
