import { useRef } from "react";
import type { ColumnCorona } from "../../../lib/columnCorona";
import type { UnitSystem } from "../../../lib/format";
import { useSettled } from "../../../lib/useSettled";
import { CrossingFigure } from "../../../ui/plots/CrossingFigure";
import { DensityFigure } from "../../../ui/plots/DensityFigure";
import type { ColumnFigureProps } from "../../../ui/plots/figureProps";
import type { ShownColumn } from "./drawnColumn";
import { useOnScreen } from "./useOnScreen";

interface ColumnFiguresProps {
  drawn: ShownColumn;
  coronae: readonly ColumnCorona[];
  unitSystem: UnitSystem;
  /** Number of the first of them. */
  number: number;
}

/** How long writing rests before figures that nobody sees are drawn anew, ms. */
const rest = 500;

/** The figures of a column. */
export function ColumnFigures({ number, ...column }: ColumnFiguresProps) {
  return (
    <>
      <SeenFigure figure={DensityFigure} {...column} number={number} />
      <SeenFigure figure={CrossingFigure} {...column} number={number + 1} />
    </>
  );
}

/** On the screen a figure follows every key; off it, it waits for a rest and costs the writer nothing. */
function SeenFigure({
  figure: Figure,
  drawn,
  coronae,
  unitSystem,
  number,
}: ColumnFiguresProps & { figure: React.ComponentType<ColumnFigureProps> }) {
  const place = useRef<HTMLDivElement>(null);
  const isOnScreen = useOnScreen(place);
  const settled = useSettled(drawn, rest);
  const { profiles, strip, escape } = isOnScreen ? drawn : settled;

  return (
    <div ref={place}>
      <Figure
        profiles={profiles}
        strip={strip}
        escape={escape}
        coronae={coronae}
        unitSystem={unitSystem}
        number={number}
      />
    </div>
  );
}
