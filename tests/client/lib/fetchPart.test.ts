import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { fetchPart } from "../../../src/lib/fetchPart";

const online = vi.spyOn(navigator, "onLine", "get");
beforeEach(() => {
  vi.useFakeTimers();
  online.mockReturnValue(true);
});
afterEach(() => vi.useRealTimers());

it("waits out a lost connection, however long it lasts", async () => {
  online.mockReturnValue(false);
  const load = vi.fn().mockRejectedValueOnce(new TypeError("offline")).mockResolvedValue("part");
  const part = fetchPart<string>(load);
  await vi.advanceTimersByTimeAsync(3_600_000);
  expect(load).toHaveBeenCalledTimes(1);
  online.mockReturnValue(true);
  window.dispatchEvent(new Event("online"));
  await expect(part).resolves.toBe("part");
});

it("tries again after a while when the server does not answer", async () => {
  const load = vi.fn().mockRejectedValueOnce(new TypeError("refused")).mockResolvedValue("part");
  const part = fetchPart<string>(load);
  await vi.advanceTimersByTimeAsync(1000);
  await expect(part).resolves.toBe("part");
});

it("gives up what fails five times although there is a connection", async () => {
  const load = vi.fn().mockRejectedValue(new TypeError("gone"));
  const part = expect(fetchPart(load)).rejects.toThrow("gone");
  await vi.advanceTimersByTimeAsync(60_000);
  await part;
  expect(load).toHaveBeenCalledTimes(5);
});
