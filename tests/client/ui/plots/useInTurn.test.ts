import { act, renderHook } from "@testing-library/react";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { useInTurn } from "../../../../src/ui/plots/useInTurn";

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

it("hands on the latest drawing in a later task, and never one that was overtaken", () => {
  const seen: string[] = [];
  const { rerender } = renderHook(
    ({ latest }) => {
      const drawn = useInTurn(latest);
      if (seen.at(-1) !== drawn) seen.push(drawn);
    },
    { initialProps: { latest: "first" } },
  );
  act(() => {
    vi.runAllTimers();
  });
  rerender({ latest: "second" });
  rerender({ latest: "third" });
  expect(seen).toEqual(["first"]);
  act(() => {
    vi.runAllTimers();
  });
  expect(seen).toEqual(["first", "third"]);
});

it("lets figures draw one after the other", () => {
  const one = renderHook(({ latest }) => useInTurn(latest), { initialProps: { latest: 1 } });
  const two = renderHook(({ latest }) => useInTurn(latest), { initialProps: { latest: 1 } });
  act(() => {
    vi.runAllTimers();
  });
  one.rerender({ latest: 2 });
  two.rerender({ latest: 2 });
  act(() => {
    vi.advanceTimersToNextTimer();
  });
  expect([one.result.current, two.result.current]).toEqual([2, 1]);
  act(() => {
    vi.advanceTimersToNextTimer();
  });
  expect([one.result.current, two.result.current]).toEqual([2, 2]);
});
