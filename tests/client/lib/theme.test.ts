import { act, renderHook } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { setTheme, useTheme } from "../../../src/lib/theme";

afterEach(() => setTheme("system"));

describe("the light", () => {
  it("is the device's until one is chosen", () => {
    expect(renderHook(() => useTheme()).result.current[0]).toBe("system");
  });

  it("is forced on the page, kept on the device and told to every part at once", () => {
    const one = renderHook(() => useTheme());
    const other = renderHook(() => useTheme());
    act(() => one.result.current[1]("dark"));
    expect(document.documentElement.dataset.theme).toBe("dark");
    expect(localStorage.getItem("tenuity.theme")).toBe("dark");
    expect(other.result.current[0]).toBe("dark");
  });

  it("goes back to the device's without a trace", () => {
    setTheme("light");
    setTheme("system");
    expect(document.documentElement.dataset.theme).toBeUndefined();
    expect(localStorage.getItem("tenuity.theme")).toBeNull();
  });
});
