import { describe, expect, it } from "vitest";
import { keyThreads, threadKey, unreadIn } from "../../../../../src/features/notebook/comments/keyedThreads";
import { aNotebook } from "../aNotebook";
import { aThread } from "./aThread";

describe("the keys of threads", () => {
  it("are the printers' marks, doubled when they are used up", () => {
    expect([0, 1, 2, 3, 4, 5, 11].map(threadKey)).toEqual(["†", "‡", "§", "‖", "¶", "††", "‡‡‡"]);
  });

  it("follow the cells through moves, and put what has lost its cell last", () => {
    const { cells } = aNotebook();
    const threads = [
      aThread({ id: "lost", cellId: "gone" }),
      aThread({ id: "on air", cellId: "air" }),
      aThread({ id: "on body", cellId: "body" }),
    ];
    const keysOf = (of: typeof cells) =>
      keyThreads(threads, of).map(({ thread, key, cell }) => [thread.id, key, cell?.id ?? null]);
    expect(keysOf(cells)).toEqual([
      ["on body", "†", "body"],
      ["on air", "‡", "air"],
      ["lost", "§", null],
    ]);
    expect(keysOf([...cells].reverse()).map(([id]) => id)).toEqual(["on air", "on body", "lost"]);
  });

  it("count what others have written and is not yet read", () => {
    expect(unreadIn(aThread({ isUnread: true }))).toBe(1);
    expect(unreadIn(aThread())).toBe(0);
  });
});
