import { Rich } from "../../lib/Rich";
import type { GasStyle } from "../../lib/gasStyle";
import { GasMark } from "./GasMark";

interface FigureNamesProps {
  gases: readonly string[];
  styles: ReadonlyMap<string, GasStyle>;
  hidden: ReadonlySet<string>;
  onToggle: (gas: string) => void;
  /** Gases whose names found no place beside their curves; then the row is always in sight. */
  unnamed: readonly string[];
}

/** Names that show or hide their curves, for those who come by key; in sight only when in use or needed. */
export function FigureNames({ gases, styles, hidden, onToggle, unnamed }: FigureNamesProps) {
  return (
    <div
      className="figure-names"
      data-print="never"
      role="group"
      aria-label="Curves shown"
      data-shown={unnamed.length > 0 || undefined}
    >
      {gases.map((gas) => (
        <button key={gas} type="button" aria-pressed={!hidden.has(gas)} onClick={() => onToggle(gas)}>
          <GasMark style={styles.get(gas)!} />
          <Rich text={styles.get(gas)!.name} />
        </button>
      ))}
    </div>
  );
}
