import type { CSSProperties } from "react";
import { formatGas, formatKilometres } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { RichTspans } from "../../lib/Rich";
import type { NumberSpread } from "../../lib/formatSpread";
import type { StripLabel } from "./stripLabels";
import { exobaseText } from "./stripSentences";

interface StripMarksProps {
  labels: readonly StripLabel[];
  gases: readonly string[];
  exobaseSpread: NumberSpread | null;
  height: number;
  /** Right edge of the band, px. */
  edge: number;
}

/** From the mark on the band's edge to where its label stands. */
function leaderPath(from: number, edge: number, mark: number, label: number): string {
  return `M${from} ${mark.toFixed(1)}H${edge + 10}L${edge + 46} ${label.toFixed(1)}H${edge + 52}`;
}

/** Marks move to their new place where the browser can move a path. */
const movingPath = (d: string): { d: string; style: CSSProperties } => ({
  d,
  style: { d: `path("${d}")` } as CSSProperties,
});

function Leader({
  label,
  gases,
  height,
  edge,
}: { label: StripLabel } & Omit<StripMarksProps, "labels" | "exobaseSpread">) {
  const mark = height - label.mark;
  const stand = height - label.label;
  switch (label.kind) {
    case "caption":
      return null;
    case "homopause": {
      const path = movingPath(leaderPath(edge - 12, edge, mark, stand));
      const stroke = gasStyle(label.gas!, gases).colour;
      return <path className="strip-leader" {...path} style={{ ...path.style, stroke }} />;
    }
    case "base":
      return <path className="strip-base" {...movingPath(leaderPath(0, edge, mark, stand))} />;
    case "exobase":
      return <path className="strip-exobase" {...movingPath(leaderPath(0, edge, mark, stand))} />;
    case "lower":
    case "upper":
      return <path className="strip-knudsen" {...movingPath(leaderPath(edge + 5, edge, mark, stand))} />;
  }
}

function LabelText({
  label,
  gases,
  exobaseSpread,
}: { label: StripLabel } & Pick<StripMarksProps, "gases" | "exobaseSpread">) {
  switch (label.kind) {
    case "caption":
      return (
        <text y="4" className="strip-caption">
          homopauses
        </text>
      );
    case "homopause":
      return (
        <text y="4" className="strip-label">
          <tspan className="strip-strong" style={{ fill: gasStyle(label.gas!, gases).colour }}>
            <RichTspans text={[...formatGas(label.gas!), "\u00a0"]} />
          </tspan>
          {formatKilometres(label.altitude)}
        </text>
      );
    case "base":
      return (
        <text y="4" className="strip-label">
          <tspan className="strip-strong">base</tspan> {formatKilometres(label.altitude)}
        </text>
      );
    case "exobase":
      return (
        <>
          <text y="-5" className="strip-label strip-strong">
            exobase
          </text>
          <text y="10" className="strip-label">
            {exobaseText(label.altitude, exobaseSpread)}
          </text>
        </>
      );
    case "lower":
      return (
        <text y="4" className="strip-tick">
          Kn 0.1
        </text>
      );
    case "upper":
      return (
        <text y="4" className="strip-tick">
          Kn 10
        </text>
      );
  }
}

/** Base, homopauses, Knudsen band and exobase, each with its leader and its label. */
export function StripMarks({ labels, gases, exobaseSpread, height, edge }: StripMarksProps) {
  const key = ({ kind, gas }: StripLabel) => `${kind}${gas ?? ""}`;
  return (
    <g>
      {labels.map((label) => (
        <Leader key={key(label)} label={label} gases={gases} height={height} edge={edge} />
      ))}
      {labels.map((label) => (
        <g
          key={key(label)}
          className="strip-moves"
          style={{ transform: `translate(${edge + 56}px, ${(height - label.label).toFixed(1)}px)` }}
        >
          <LabelText label={label} gases={gases} exobaseSpread={exobaseSpread} />
        </g>
      ))}
    </g>
  );
}
