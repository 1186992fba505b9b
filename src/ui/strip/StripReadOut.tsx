import { gasStyle } from "../../lib/gasStyle";
import { formatGas, thinSpace } from "../../lib/format";
import { Rich } from "../../lib/Rich";
import type { StripReading } from "./stripSentences";

interface StripReadOutProps {
  reading: StripReading;
  gases: readonly string[];
  style: React.CSSProperties;
  /** On which side of its line the plate stands. */
  side: "over" | "under";
}

/** The plate: altitude, temperature, density, the gas there is most of, Knudsen number. */
export function StripReadOut({ reading, gases, style, side }: StripReadOutProps) {
  const rows: [symbol: string, value: React.ReactNode][] = [
    ["z", reading.altitude],
    ["T", reading.temperature],
    [
      "n",
      <>
        <Rich text={reading.density.number} />
        {thinSpace}
        <Rich text={reading.density.unit} />
      </>,
    ],
    [
      "most",
      <>
        <b style={{ color: gasStyle(reading.gas, gases).colour }}>
          <Rich text={formatGas(reading.gas)} />
        </b>{" "}
        {reading.share}
      </>,
    ],
    ["Kn", <Rich text={reading.knudsen} />],
  ];
  return (
    <div className="strip-plate" data-side={side} style={style} aria-hidden="true">
      {rows.map(([symbol, value]) => (
        <div key={symbol}>
          <i>{symbol}</i>
          <span>{value}</span>
        </div>
      ))}
    </div>
  );
}
