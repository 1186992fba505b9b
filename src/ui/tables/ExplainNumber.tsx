import { createContext, use, useLayoutEffect, useRef, type PropsWithChildren } from "react";
import type { ResultPlace } from "../../../shared/notebook/explanations/explain";
import { joinNumberGroup, moveToNumber } from "./numberGroup";

export interface NumberExplainer {
  /** Key of the number that is being explained; see `placeKey`. */
  openKey: string | null;
  explain: (place: ResultPlace, number: HTMLElement) => void;
}

/** Whoever explains numbers on this page; where nobody does, numbers are plain text. */
export const ExplainNumbers = createContext<NumberExplainer | null>(null);

export const placeKey = ({ cell, name, row }: ResultPlace): string =>
  `${cell}.${name}${row ? ` ${row.column}=${row.value}` : ""}`;

/** As it is read aloud; a number in a table has its column and, from the head of its row, its row. */
const spokenName = ({ name, row }: ResultPlace): string => (row ? name.slice(name.indexOf(".") + 1) : name);

interface ExplainNumberProps {
  place: ResultPlace;
  /** The number as it is read aloud. */
  spoken: string;
}

/**
 * A number that explains itself when it is pressed. It is an inline span, not a button, so that it is selected, copied
 * and laid out like the text it is.
 */
export function ExplainNumber({ place, spoken, children }: PropsWithChildren<ExplainNumberProps>) {
  const explainer = use(ExplainNumbers);
  return explainer ? (
    <PressableNumber explainer={explainer} place={place} spoken={spoken}>
      {children}
    </PressableNumber>
  ) : (
    children
  );
}

interface PressableNumberProps extends ExplainNumberProps {
  explainer: NumberExplainer;
}

function PressableNumber({ explainer, place, spoken, children }: PropsWithChildren<PressableNumberProps>) {
  const ref = useRef<HTMLSpanElement>(null);
  useLayoutEffect(function takePlaceAmongNumbers() {
    return joinNumberGroup(ref.current!);
  }, []);
  const key = placeKey(place);

  const handleKeyDown = (event: React.KeyboardEvent<HTMLElement>) => {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    if (event.key === "Enter" || event.key === " ") explainer.explain(place, event.currentTarget);
    else if (!moveToNumber(event.currentTarget, event.key)) return;
    event.preventDefault();
    event.stopPropagation();
  };

  return (
    <span
      ref={ref}
      role="button"
      className="explain-number"
      data-number={key}
      aria-label={`Explain ${spokenName(place)}: ${spoken}`}
      aria-haspopup="dialog"
      aria-expanded={explainer.openKey === key}
      onClick={(event) => {
        // Drawing over a number selects it.
        if (window.getSelection()?.isCollapsed === false) return;
        explainer.explain(place, event.currentTarget);
      }}
      onKeyDown={handleKeyDown}
    >
      {children}
    </span>
  );
}
