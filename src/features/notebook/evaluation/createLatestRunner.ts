interface LatestRunnerOptions<Input, Output> {
  run: (input: Input) => Promise<Output>;
  onResult: (output: Output, input: Input) => void;
  onFailure: (error: unknown, input: Input) => void;
  /** How long the work itself took, ms; the whole wait where it is left out. */
  tookOf?: (output: Output) => number;
  /** Duration of one run, ms, from which the next waits until inputs have rested. */
  slowFrom?: number;
  /** That rest, ms. */
  rest?: number;
}

/**
 * Runs one thing at a time on the newest input. What came in between is never run: the latest wins. Once a run has
 * been slow, the next begins only when inputs have rested, so that writing isn't chased by work already out of date.
 */
export function createLatestRunner<Input, Output>({
  run,
  onResult,
  onFailure,
  tookOf,
  slowFrom = 100,
  rest = 600,
}: LatestRunnerOptions<Input, Output>) {
  let next: { input: Input } | null = null;
  let isRunning = false;
  let isStopped = false;
  /** The first run computes everything, by code that no one has run yet: it says nothing of the next. */
  let isFirst = true;
  let wasSlow = false;
  let timer: ReturnType<typeof setTimeout> | null = null;

  async function runNext(): Promise<void> {
    timer = null;
    if (isRunning || isStopped || next === null) return;
    const { input } = next;
    next = null;
    isRunning = true;
    const begun = performance.now();
    let took: number | undefined;
    try {
      const output = await run(input);
      took = tookOf?.(output);
      if (!isStopped) onResult(output, input);
    } catch (error) {
      if (!isStopped) onFailure(error, input);
    }
    wasSlow = !isFirst && (took ?? performance.now() - begun) > slowFrom;
    isFirst = false;
    isRunning = false;
    if (next !== null) schedule();
  }

  function schedule(): void {
    if (timer !== null) clearTimeout(timer);
    timer = null;
    if (wasSlow) timer = setTimeout(() => void runNext(), rest);
    else void runNext();
  }

  return {
    offer(input: Input): void {
      next = { input };
      if (!isRunning) schedule();
    },
    stop(): void {
      isStopped = true;
      if (timer !== null) clearTimeout(timer);
    },
  };
}
