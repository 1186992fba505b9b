import { useState, type KeyboardEvent, type PointerEvent, type PropsWithChildren } from "react";
import { ReadOutPlate, type ReadOutRow } from "../strip/ReadOutPlate";

interface PointReaderProps {
  /** px */
  height: number;
  panel: { left: number; top: number; width: number; height: number };
  /** px from the left edge of the panel to each point along it; those beyond it cannot be read. */
  across: readonly number[];
  /** px from the top of the panel to each row of points; null where there is but one, and the line is drawn right across. */
  down?: readonly number[];
  /** Where reading begins by key. */
  start: ReadPoint;
  /** Name for those who listen: "Points read in figure 2". */
  label: string;
  rows: (point: ReadPoint) => ReadOutRow[];
  spoken: (point: ReadPoint) => string;
}

export interface ReadPoint {
  column: number;
  row: number;
}

/** Between the point and the plate, px. */
const gap = 12;

const nearest = (places: readonly number[], indices: readonly number[], at: number): number =>
  indices.reduce(
    (best, index) => (Math.abs(places[index]! - at) < Math.abs(places[best]! - at) ? index : best),
    indices[0] ?? 0,
  );

const within = (places: readonly number[], length: number): number[] =>
  places.flatMap((place, index) => (place >= -0.5 && place <= length + 0.5 ? [index] : []));

/** The stage of a figure of computed points: reads out the one nearest to the pointer, or moved to by arrow keys. */
export function PointReader({
  height,
  panel,
  across,
  down,
  start,
  label,
  rows,
  spoken,
  children,
}: PropsWithChildren<PointReaderProps>) {
  const [asked, setAsked] = useState<ReadPoint | null>(null);
  const [isByKey, setIsByKey] = useState(false);
  const columns = within(across, panel.width);
  const lines = down ? within(down, panel.height) : [0];
  const reachable = (point: ReadPoint): ReadPoint => ({
    column: nearest(across, columns, across[point.column] ?? 0),
    row: down ? nearest(down, lines, down[point.row] ?? 0) : 0,
  });
  if (columns.length === 0 || lines.length === 0) return <div style={{ height }}>{children}</div>;
  const point = asked === null ? null : reachable(asked);
  const current = point ?? reachable(start);

  const handlePointer = (event: PointerEvent<HTMLElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    setIsByKey(false);
    setAsked({
      column: nearest(across, columns, event.clientX - box.left - panel.left),
      row: down ? nearest(down, lines, event.clientY - box.top - panel.top) : 0,
    });
  };

  const moved = (list: readonly number[], index: number, by: number): number =>
    list[Math.min(list.length - 1, Math.max(0, list.indexOf(index) + by))]!;

  const handleKey = (event: KeyboardEvent<HTMLElement>) => {
    const many = event.shiftKey ? 10 : 1;
    const { column, row } = current;
    const aside = (by: number): ReadPoint => ({ column: moved(columns, column, by), row });
    // Rows go up the page; a figure of one row has its points moved along by these keys as well.
    const upward = (by: number): ReadPoint => (down ? { column, row: moved(lines, row, by) } : aside(by));
    const moves: Record<string, () => ReadPoint> = {
      ArrowRight: () => aside(many),
      ArrowLeft: () => aside(-many),
      ArrowUp: () => upward(many),
      ArrowDown: () => upward(-many),
      PageUp: () => upward(10),
      PageDown: () => upward(-10),
      Home: () => ({ column: columns[0]!, row }),
      End: () => ({ column: columns.at(-1)!, row }),
    };
    if (event.key === "Escape") return setAsked(null);
    const move = moves[event.key];
    if (!move) return;
    event.preventDefault();
    setIsByKey(true);
    setAsked(move());
  };

  const x = panel.left + across[current.column]!;
  const y = panel.top + (down ? down[current.row]! : 0);
  const isLeft = across[current.column]! > panel.width / 2;
  return (
    <div
      className="figure-stage"
      style={{ height }}
      onPointerMove={handlePointer}
      onPointerDown={handlePointer}
      onPointerLeave={(event) => {
        if (event.pointerType !== "touch" && !isByKey) setAsked(null);
      }}
    >
      {children}
      <div
        className="figure-reader"
        style={panel}
        role="slider"
        tabIndex={0}
        aria-label={label}
        aria-orientation="horizontal"
        aria-valuemin={1}
        aria-valuemax={across.length * (down?.length ?? 1)}
        aria-valuenow={current.row * across.length + current.column + 1}
        aria-valuetext={spoken(current)}
        onKeyDown={handleKey}
        onFocus={() => setAsked((before) => before ?? start)}
        onBlur={() => setAsked(null)}
      />
      {point !== null && (
        <>
          {down ? (
            <div className="figure-point" style={{ left: x, top: y }} aria-hidden="true" />
          ) : (
            <div
              className="figure-upright"
              style={{ left: x, top: panel.top, height: panel.height }}
              aria-hidden="true"
            />
          )}
          <ReadOutPlate
            rows={rows(current)}
            side={down && y > height / 2 ? "over" : "under"}
            style={{
              ...(isLeft ? { right: `calc(100% - ${x - gap}px)` } : { left: x + gap }),
              top: down ? y : panel.top + 20,
              width: "max-content",
            }}
          />
        </>
      )}
    </div>
  );
}
