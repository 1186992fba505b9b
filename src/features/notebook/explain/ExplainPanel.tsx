import { useEffect, useId, useRef, useState, type PropsWithChildren, type RefObject } from "react";
import type { Explanation, ResultPlace } from "../../../../shared/notebook/explanations/explain";
import { formatKilometres, unitSpace, type UnitSystem } from "../../../lib/format";
import { formatMessage } from "../../../lib/formatMessage";
import { Rich } from "../../../lib/Rich";
import { StateMark } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import { explainedRange, explainedValue, fullValue, inputValue } from "./explainedText";
import { Tex } from "./Tex";
import { useHanging } from "./useHanging";

interface ExplainPanelProps {
  place: ResultPlace;
  /** null where the notebook has no such number now. */
  explanation: Explanation | null;
  /** The cell that gives it, or gave it; null where it is gone. */
  cellId: string | null;
  /** It is being computed anew, so that what is known of it is not shown. */
  isLate: boolean;
  unitSystem: UnitSystem;
  desk: RefObject<HTMLElement | null>;
  findNumber: () => HTMLElement | null;
  onClose: () => void;
}

/** What a number is, hanging from it. The page stays in use beside it. */
export function ExplainPanel({
  place,
  explanation,
  cellId,
  isLate,
  unitSystem,
  desk,
  findNumber,
  onClose,
}: ExplainPanelProps) {
  const panel = useRef<HTMLDivElement>(null);
  const titleId = useId();
  const hanging = useHanging(desk, findNumber);
  const isPlaced = hanging !== null;
  useEffect(
    function takeFocus() {
      if (!isPlaced) return;
      panel.current?.focus({ preventScroll: true });
      panel.current?.scrollIntoView?.({ block: "nearest" });
    },
    [isPlaced],
  );

  /** From either end of the panel the Tab key leads back to the number, whose neighbours follow. */
  const handleKeyDown = (event: React.KeyboardEvent) => {
    if (event.key !== "Tab" || !panel.current) return;
    const stops = [...panel.current.querySelectorAll<HTMLElement>("a, button, summary")];
    const at = window.document.activeElement;
    const isLeaving = event.shiftKey ? at === panel.current || at === stops[0] : at === stops.at(-1);
    if (!isLeaving) return;
    event.preventDefault();
    findNumber()?.focus({ preventScroll: true });
  };

  return (
    <div
      ref={panel}
      className="explain"
      role="dialog"
      aria-labelledby={titleId}
      tabIndex={-1}
      data-print="never"
      aria-busy={isLate}
      style={
        hanging ? { left: hanging.left, top: hanging.top, width: hanging.width } : { visibility: "hidden" }
      }
      onKeyDown={handleKeyDown}
    >
      {hanging && <span className="explain-line" style={{ left: hanging.line }} aria-hidden="true" />}
      <div className="explain-head">
        <h3 id={titleId}>
          <span className="explain-name">
            {explanation ? (explanation.name ?? explanation.cell) : placeName(place)}
          </span>
          {explanation && (
            <span className="explain-words">
              <Rich text={formatMessage(explanation.words + rowWords(place))} />
            </span>
          )}
        </h3>
        {explanation && explanation.name !== null && (
          <CopyWord words="copy the name" text={explanation.name} />
        )}
        <TextButton onClick={onClose}>close</TextButton>
      </div>
      {isLate && (
        <p className="explain-late" role="status">
          Computing
        </p>
      )}
      {explanation ? (
        <div className="explain-body" data-late={isLate || undefined} inert={isLate}>
          <Explained explanation={explanation} unitSystem={unitSystem} />
        </div>
      ) : (
        <p className="explain-none">
          The notebook has no such number now.{" "}
          {cellId !== null && <a href={`#cell-${cellId}`}>Its cell says why.</a>}
        </p>
      )}
    </div>
  );
}

const placeName = ({ cell, name }: ResultPlace): string => (cell === "" ? name : `${cell}.${name}`);

/** Which row of a table; rows of levels are told by their altitude. */
const rowWords = ({ row }: ResultPlace): string =>
  row?.column === "altitude" && typeof row.value === "number"
    ? ` at ${formatKilometres(row.value)}${unitSpace}km`
    : "";

function Explained({ explanation, unitSystem }: { explanation: Explanation; unitSystem: UnitSystem }) {
  const { formula, inputs, origins, restsOn, holdsFor, notes, sources } = explanation;
  const range = explainedRange(explanation, unitSystem);
  const full = fullValue(explanation);
  return (
    <>
      <p className="explain-value">
        <b>
          <Rich text={explainedValue(explanation, unitSystem)} />
        </b>
        {range && <span>{range}</span>}
      </p>
      {formula !== null && (
        <div className="explain-formula" tabIndex={0} role="group" aria-label="Formula">
          <Tex tex={formula} isDisplayed />
        </div>
      )}
      <dl className="explain-rows">
        {inputs.length > 0 && (
          <Row term="With">
            <ul className="explain-inputs">
              {inputs.map((input) => (
                <li key={input.symbol + input.words}>
                  {input.symbol === "" ? (
                    <code>{input.words}</code>
                  ) : (
                    <span className="explain-symbol">
                      <Tex tex={input.symbol} />
                    </span>
                  )}{" "}
                  ={" "}
                  {input.text === null ? (
                    <Rich text={inputValue(input, unitSystem)} />
                  ) : (
                    <code>{input.text}</code>
                  )}
                  {input.understood !== null && ` (${input.understood})`}
                  {input.symbol !== "" && <small>{input.words}</small>}
                </li>
              ))}
            </ul>
          </Row>
        )}
        {origins.length > 0 && (
          <Row term={formula === null && inputs.length === 0 ? "As written" : "Comes from"}>
            <ul className="explain-origins">
              {origins.map(({ cellId, name, text, remark }) => (
                <li key={`${cellId} ${name}`}>
                  {cellId === null ? name : <a href={`#cell-${cellId}`}>{name}</a>}
                  {text !== null && (cellId === null ? `: ${text}` : <code> {text}</code>)}
                  {remark !== null && <i> {remark}</i>}
                </li>
              ))}
            </ul>
          </Row>
        )}
        {restsOn.length > 0 && (
          <Row term="Rests on">
            {restsOn.map((sentence) => (
              <p key={sentence}>
                <Rich text={formatMessage(sentence)} />
              </p>
            ))}
          </Row>
        )}
        {(holdsFor !== null || notes.length > 0) && (
          <Row term="Holds for">
            {holdsFor !== null && <p>{holdsFor}</p>}
            {notes.map(({ level, message }) => (
              <p key={message} className="explain-note">
                <StateMark state={level} label={level} /> <Rich text={formatMessage(message)} />
              </p>
            ))}
          </Row>
        )}
        {sources.length > 0 && (
          <Row term="Published">
            <details className="explain-sources">
              <summary>{sources.map(({ short }) => short).join("; ")}</summary>
              {sources.map(({ key, full: citation }) => (
                <p key={key}>{citation}</p>
              ))}
            </details>
          </Row>
        )}
        {full !== null && (
          <Row term="In full">
            <span className="explain-full">
              <Rich text={full.text} />
            </span>{" "}
            <CopyWord words="copy" text={full.copied} />
          </Row>
        )}
      </dl>
    </>
  );
}

function Row({ term, children }: PropsWithChildren<{ term: string }>) {
  return (
    <div>
      <dt>{term}</dt>
      <dd>{children}</dd>
    </div>
  );
}

/** A word that copies, and says so in its place. */
function CopyWord({ words, text }: { words: string; text: string }) {
  const [said, setSaid] = useState<string | null>(null);
  const handleCopy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setSaid("copied");
    } catch {
      setSaid("the browser did not let it be copied");
    }
  };
  return (
    <>
      <TextButton onClick={() => void handleCopy()}>{said === "copied" ? "copied" : words}</TextButton>
      <span className="visually-hidden" role="status">
        {said}
      </span>
    </>
  );
}
