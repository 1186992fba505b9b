import { describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { finishTask } from "../../../../shared/notebook/finishTask";
import { runTask } from "../../../../shared/notebook/runTask";
import { notebookOf, type WrittenCell } from "../evaluateCells";
import { planet } from "./taskNotebooks";

const spread: WrittenCell = ["spread", "sure", "watch = leak.H2.rate\nsamples = 64"];
const cells = [...planet, spread];

function keyOf(changed: readonly WrittenCell[]): string {
  return evaluateNotebook(notebookOf(changed)).tasks[0].key;
}

const withText = (place: number, from: string, to: string): WrittenCell[] =>
  cells.map(([kind, name, text], index) => [kind, name, index === place ? text.replace(from, to) : text]);

describe("the key of a task", () => {
  const key = keyOf(cells);

  it("stays when remarks, spaces, entries that do not matter and other cells change", () => {
    expect(keyOf(withText(0, "240 ± 30 K", "240  ±  30 K # two occultations"))).toBe(key);
    expect(keyOf(withText(0, "idle = 3 km", "idle = 4 km"))).toBe(key);
    expect(keyOf([["values", "more", "a = 1 km"], ["prose", "", "Words."], ...cells])).toBe(key);
  });

  it.each([
    [0, "240 ± 30 K", "241 ± 30 K"],
    [0, "240 ± 30 K", "240 ± 31 K"],
    [1, "4943 km", "4944 km"],
    [2, "15 ppm", "16 ppm"],
    [4, "samples = 64", "samples = 128"],
    [4, "leak.H2.rate", "leak.O.rate"],
  ])("changes with cell %s, %s to %s", (place, from, to) => {
    expect(keyOf(withText(place, from, to))).not.toBe(key);
  });

  it("changes when a gas cell comes to act", () => {
    expect(keyOf([["gas", "O", "cross_section = 4e-15 cm^2"], ...cells])).not.toBe(key);
  });
});

describe("answers of tasks", () => {
  const document = notebookOf(cells);
  const { evaluation, memory, tasks } = evaluateNotebook(document);
  const answer = finishTask(document, tasks[0], [runTask(document, tasks[0], 0, 64)]);
  const answered = evaluateNotebook(document, memory, new Map([[answer.key, answer]]));

  it("change the cells that they concern, and no other object", () => {
    const same = answered.evaluation.cells.map((cell, place) => cell === evaluation.cells[place]);
    // The values cell loses its remark, the escape cell gains a spread.
    expect(same).toEqual([false, true, true, false, false]);
    expect(answered.tasks).toEqual([]);
  });

  it("stay in the memory, with the same objects", () => {
    const again = evaluateNotebook(document, answered.memory);
    expect(again.tasks).toEqual([]);
    again.evaluation.cells.forEach((cell, place) => expect(cell).toBe(answered.evaluation.cells[place]));
  });

  it("are the same with a memory and without", () => {
    const fresh = evaluateNotebook(document, undefined, new Map([[answer.key, answer]]));
    expect(fresh.evaluation).toEqual(answered.evaluation);
  });

  it("go when the text they rest on changes", () => {
    const changed = notebookOf(withText(1, "4943 km", "4944 km"));
    const later = evaluateNotebook(changed, answered.memory);
    expect(later.tasks).toHaveLength(1);
    expect(later.evaluation.cells[3].result.values["H2.rate"]).not.toHaveProperty("spread");
    expect(later.evaluation.cells[0].result.notes).toMatchObject([{ code: "acts_by_centre" }]);
  });

  it("are refused for a document that has no such task", () => {
    const changed = notebookOf(withText(1, "4943 km", "4944 km"));
    expect(() => runTask(changed, tasks[0], 0, 1)).toThrow("no task for sure");
  });
});
