import type { GasStyle } from "../../lib/gasStyle";

/** A short piece of a gas's line, as its curve is drawn. */
export function GasMark({ style, width = 26 }: { style: GasStyle; width?: number }) {
  return (
    <svg className="gas-mark" width={width} height="8" viewBox={`0 0 ${width} 8`} aria-hidden="true">
      <line
        x1="0"
        x2={width}
        y1="4"
        y2="4"
        style={{ stroke: style.colour }}
        strokeWidth={style.width}
        strokeDasharray={style.dash || undefined}
      />
    </svg>
  );
}
