import type { CSSProperties } from "react";
import { formatGas, quantityRich } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { ReadOutPlate } from "./ReadOutPlate";
import type { StripReading } from "./stripSentences";

interface StripReadOutProps {
  reading: StripReading;
  gases: readonly string[];
  style: CSSProperties;
  side: "over" | "under";
}

/** The strip's plate: altitude, temperature, density, the gas there is most of, Knudsen number. */
export function StripReadOut({ reading, gases, style, side }: StripReadOutProps) {
  const most = (
    <>
      <b style={{ color: gasStyle(reading.gas, gases).colour }}>
        <Rich text={formatGas(reading.gas)} />
      </b>{" "}
      {reading.share}
    </>
  );
  return (
    <ReadOutPlate
      style={style}
      side={side}
      rows={[
        { key: "z", symbol: "z", value: reading.altitude },
        { key: "T", symbol: "T", value: reading.temperature },
        { key: "n", symbol: "n", value: <Rich text={quantityRich(reading.density)} /> },
        { key: "most", symbol: "most", value: most },
        { key: "Kn", symbol: "Kn", value: <Rich text={reading.knudsen} /> },
      ]}
    />
  );
}
