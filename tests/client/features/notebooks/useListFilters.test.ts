import { describe, expect, it } from "vitest";
import { readListFilters, writeListFilters } from "../../../../src/features/notebooks/useListFilters";

const usual = { q: "", order: "changed", place: "shelf" } as const;

describe("filters in the address", () => {
  it("are as usual where the address says nothing", () => {
    expect(readListFilters(new URLSearchParams())).toEqual(usual);
  });

  it("are as usual where the address says something else", () => {
    expect(readListFilters(new URLSearchParams("order=colour&place=moon"))).toEqual(usual);
  });

  it("are left out of the address where they are as usual", () => {
    expect(writeListFilters(usual)).toEqual({});
  });

  it("come back from the address as they went", () => {
    const filters = { q: "Ilmara & co", order: "title", place: "bin" } as const;
    expect(readListFilters(new URLSearchParams(writeListFilters(filters)))).toEqual(filters);
  });

  it("never ask the server for more than it takes", () => {
    expect(readListFilters(new URLSearchParams({ q: "x".repeat(500) })).q).toHaveLength(200);
  });
});
