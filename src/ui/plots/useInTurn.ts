import { useEffect, useState } from "react";

const waiting = new Set<() => void>();
let isCalled = false;

/** Lets one figure draw, then gives the page a breath before the next. */
function callNext(): void {
  const [next] = waiting;
  if (!next) {
    isCalled = false;
    return;
  }
  waiting.delete(next);
  next();
  setTimeout(callNext, 0);
}

function takeTurn(draw: () => void): () => void {
  waiting.add(draw);
  if (!isCalled) {
    isCalled = true;
    setTimeout(callNext, 0);
  }
  return () => waiting.delete(draw);
}

/**
 * What a figure is to draw, handed on when its turn comes: figures draw one after the other, each in a task of
 * its own, so that a key waits for one of them at most; what was overtaken meanwhile is never drawn.
 */
export function useInTurn<Drawing>(latest: Drawing): Drawing {
  const [drawn, setDrawn] = useState(latest);
  useEffect(() => takeTurn(() => setDrawn(latest)), [latest]);
  return drawn;
}
