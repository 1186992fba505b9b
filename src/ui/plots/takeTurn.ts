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

/**
 * Figures draw one after the other, each in a task of its own, so that a key waits for one of them at most.
 * Returns what gives the turn back.
 */
export function takeTurn(draw: () => void): () => void {
  waiting.add(draw);
  if (!isCalled) {
    isCalled = true;
    setTimeout(callNext, 0);
  }
  return () => waiting.delete(draw);
}
