import type { CSSProperties, ReactNode } from "react";
import "./strip.css";

export interface ReadOutRow {
  key: string;
  symbol: ReactNode;
  value: ReactNode;
}

interface ReadOutPlateProps {
  rows: readonly ReadOutRow[];
  style: CSSProperties;
  /** On which side of its line the plate stands. */
  side: "over" | "under";
}

/** What is read at one altitude, on a plate beside its line. The same words are heard from the slider. */
export function ReadOutPlate({ rows, style, side }: ReadOutPlateProps) {
  return (
    <div className="strip-plate" data-side={side} style={style} aria-hidden="true">
      {rows.map(({ key, symbol, value }) => (
        <div key={key}>
          <span className="strip-symbol">{symbol}</span>
          <span>{value}</span>
        </div>
      ))}
    </div>
  );
}
