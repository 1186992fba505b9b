import { cleanup, configure } from "@testing-library/react";
import { afterEach, vi } from "vitest";

/** Anything written to the console by a component fails the test that caused it. */
const refuse =
  (kind: string) =>
  (...parts: unknown[]): never => {
    throw new Error(`console.${kind}: ${parts.map(String).join(" ")}`);
  };
vi.spyOn(console, "error").mockImplementation(refuse("error"));
vi.spyOn(console, "warn").mockImplementation(refuse("warn"));

// Pages fetch parts of themselves; on a busy machine that may take seconds.
configure({ asyncUtilTimeout: 10_000 });
vi.setConfig({ testTimeout: 30_000 });

afterEach(cleanup);
