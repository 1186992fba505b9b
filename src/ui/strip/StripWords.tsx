import { useSettled } from "../../lib/useSettled";
import type { AltitudeStripProps } from "./stripProps";
import { stripLabel, stripSentences } from "./stripSentences";

/** Time without a change after which the strip tells aloud what it has become. */
const restMs = 1500;

/** The same marks as a list of sentences, and a quiet voice that says the main one once the typing rests. */
export function StripWords({
  strip,
  exobaseSpread = null,
}: Pick<AltitudeStripProps, "strip" | "exobaseSpread">) {
  const announced = useSettled(stripLabel(strip, exobaseSpread), restMs);
  return (
    <>
      <ul className="visually-hidden" aria-label={`Marks of ${strip.column}`}>
        {stripSentences(strip, exobaseSpread).map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
      <p className="visually-hidden" aria-live="polite">
        {announced}
      </p>
    </>
  );
}
