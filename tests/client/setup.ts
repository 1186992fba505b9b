import { cleanup } from "@testing-library/react";
import { afterEach, vi } from "vitest";

/** Anything written to the console by a component fails the test that caused it. */
const refuse =
  (kind: string) =>
  (...parts: unknown[]): never => {
    throw new Error(`console.${kind}: ${parts.map(String).join(" ")}`);
  };
vi.spyOn(console, "error").mockImplementation(refuse("error"));
vi.spyOn(console, "warn").mockImplementation(refuse("warn"));

afterEach(cleanup);
