import { use, useLayoutEffect, useRef, useState } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import { cellElement } from "../cells/useCellCommands";
import { useMediaQuery } from "../page/useMediaQuery";
import { NewThread, ThreadIn } from "./CellThreads";
import { CommentsContext, type Comments } from "./commentsContext";
import { noMargin } from "./noMargin";
import { placeThreads } from "./placeThreads";

/** Between two threads, px. */
const gap = 22;

/** From the top of a cell to its name, px. */
const headOffset = 44;

/** The id under which a thread that is being begun is placed. */
const newId = "new";

interface Placed {
  tops: ReadonlyMap<string, number>;
  height: number;
}

/** In the margin: each thread beside its cell, or as near as the others let it. */
export function MarginThreads({ cells }: { cells: readonly Cell[] }) {
  const comments = use(CommentsContext);
  const isNarrow = useMediaQuery(noMargin);
  if (!comments || isNarrow) return null;
  if (comments.threads.length === 0 && comments.writingOn === null) return null;
  return <ThreadStack comments={comments} cells={cells} />;
}

function ThreadStack({ comments, cells }: { comments: Comments; cells: readonly Cell[] }) {
  const { threads, writingOn } = comments;
  const stack = useRef<HTMLDivElement>(null);
  const [activeId, setActiveId] = useState<string | null>(null);
  const isPressed = useRef(false);
  const isFirst = new Map(cells.map(({ id }, index) => [id, index]));
  const newCell = cells.find(({ id }) => id === writingOn) ?? null;
  const entries = threads.map((keyed) => ({ id: keyed.thread.id, keyed, cellId: keyed.cell?.id ?? null }));
  // A new thread stands after those that its cell has already.
  const newAt = newCell
    ? entries.filter(({ cellId }) => cellId !== null && isFirst.get(cellId)! <= isFirst.get(newCell.id)!)
        .length
    : null;
  const order = [
    ...entries.slice(0, newAt ?? entries.length),
    ...(newCell ? [{ id: newId, keyed: null, cellId: newCell.id }] : []),
    ...entries.slice(newAt ?? entries.length),
  ];
  const weighted = newCell ? newId : (activeId ?? comments.openedId);
  const placed = usePlaced(stack, order, weighted);

  return (
    <div
      ref={stack}
      className="margin-threads"
      style={{ height: placed.height }}
      // A press ends where it began only if nothing moves meanwhile, so that one counts when it is over.
      onPointerDown={() => (isPressed.current = true)}
      onKeyDown={() => (isPressed.current = false)}
      onFocus={({ target }) => !isPressed.current && setActiveId(itemAround(target))}
      onClick={({ target }) => {
        isPressed.current = false;
        setActiveId(itemAround(target as Element));
      }}
    >
      {order.map(({ id, keyed }) => (
        <div
          key={id}
          className="margin-thread"
          data-margin-item={id}
          style={{ top: placed.tops.get(id) ?? 0 }}
        >
          {keyed ? (
            <ThreadIn keyed={keyed} comments={comments} />
          ) : (
            newCell && <NewThread cell={newCell} comments={comments} />
          )}
        </div>
      ))}
    </div>
  );
}

const itemAround = (element: Element): string | null =>
  element.closest<HTMLElement>("[data-margin-item]")?.dataset.marginItem ?? null;

/** Follows the heights of threads and the places of cells. */
function usePlaced(
  stack: React.RefObject<HTMLDivElement | null>,
  order: readonly { id: string; cellId: string | null }[],
  weighted: string | null,
): Placed {
  const [placed, setPlaced] = useState<Placed>({ tops: new Map(), height: 0 });
  const key = JSON.stringify(order.map(({ id, cellId }) => [id, cellId]));

  useLayoutEffect(
    function placeThem() {
      const element = stack.current;
      if (!element) return;
      const inOrder = JSON.parse(key) as [id: string, cellId: string | null][];
      const place = () => setPlaced((before) => unlessSame(before, measure(element, inOrder, weighted)));
      place();
      if (typeof ResizeObserver === "undefined") return;
      const observer = new ResizeObserver(place);
      for (const item of element.children) observer.observe(item);
      const body = document.querySelector(".sheet-body");
      if (body) observer.observe(body);
      for (const cell of document.querySelectorAll(".cell")) observer.observe(cell);
      return () => observer.disconnect();
    },
    [stack, key, weighted],
  );
  return placed;
}

function measure(
  element: HTMLElement,
  order: readonly [id: string, cellId: string | null][],
  weighted: string | null,
): Placed {
  const top = element.getBoundingClientRect().top;
  const body = document.querySelector(".sheet-cells")?.getBoundingClientRect();
  const items = order.map(([id, cellId]) => {
    const cell = cellId === null ? null : cellElement(cellId);
    // What has lost its cell stands after the last one.
    const at = cell ? cell.getBoundingClientRect().top + headOffset : (body?.bottom ?? top);
    const own = [...element.children].find((child) => (child as HTMLElement).dataset.marginItem === id);
    const height = (own as HTMLElement | undefined)?.offsetHeight ?? 0;
    return { id, anchor: at - top, height, weight: id === weighted ? 10_000 : 1 };
  });
  const tops = placeThreads(items, { floor: gap, gap });
  const ends = items.map(({ id, height }) => tops.get(id)! + height);
  return { tops, height: Math.max(0, ...ends) };
}

/** The same object while nothing has moved, so that measuring does not draw again. */
function unlessSame(before: Placed, after: Placed): Placed {
  const isSame =
    before.height === after.height &&
    before.tops.size === after.tops.size &&
    [...after.tops].every(([id, top]) => before.tops.get(id) === top);
  return isSame ? before : after;
}
