import type { Reporter, TestModule } from "vitest/node";

/**
 * Prints `N passed, N failed` as the last line of a run. A module that can't be loaded, a failing hook and an
 * unhandled error count as failed, so that the line never looks better than the run.
 */
export default class ClosingLine implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], unhandledErrors: readonly unknown[]): void {
    let passed = 0;
    let failed = unhandledErrors.length;
    for (const module of modules) {
      failed += module.errors().length;
      for (const suite of module.children.allSuites()) failed += suite.errors().length;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === "passed") passed += 1;
        if (state === "failed") failed += 1;
      }
    }
    process.on("exit", () => process.stdout.write(`\n${passed} passed, ${failed} failed\n`));
  }
}
