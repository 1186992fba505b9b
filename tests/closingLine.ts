import type { Reporter, TestModule } from "vitest/node";

import { checkValidation } from "./validation/validationCheck";

/**
 * Prints `N passed, N failed` as the last line of a run. A module that can't be loaded, a failing hook, an unhandled
 * error and a page of checks that is out of date count as failed, so that the line never looks better than the run.
 */
export default class ClosingLine implements Reporter {
  async onTestRunEnd(modules: readonly TestModule[], unhandledErrors: readonly unknown[]): Promise<void> {
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
    const complaint = await checkValidation(modules);
    if (complaint) {
      failed += 1;
      process.exitCode = 1;
    }
    process.on("exit", () => {
      if (complaint) process.stderr.write(`\n${complaint}\n`);
      process.stdout.write(`\n${passed} passed, ${failed} failed\n`);
    });
  }
}
