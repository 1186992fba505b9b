import { act, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import {
  TaskHalt,
  TaskNews,
  TaskProgress,
  timeLeft,
} from "../../../../src/features/notebook/cells/TaskProgress";
import type { TaskState } from "../../../../src/features/notebook/evaluation/createTaskQueue";

const aTask = (change: Partial<TaskState> = {}): TaskState => ({
  task: { cellId: "sure", kind: "spread", name: "sure", key: "key", points: 16_384 },
  points: 16_384,
  done: 6912,
  secondsLeft: 46.2,
  status: "running",
  failure: null,
  stop: vi.fn(),
  resume: vi.fn(),
  ...change,
});

const plain = (text: string | null | undefined) => text?.replace(/[\u202f\u00a0]/g, " ");

describe("long work under way", () => {
  it("says how much is done, what is left, and that no numbers are shown before all are in", () => {
    render(<TaskProgress task={aTask()} />);
    const bar = screen.getByRole("progressbar", { name: "Computing sure" });
    expect(bar.getAttribute("aria-valuenow")).toBe("6912");
    expect(bar.getAttribute("aria-valuemax")).toBe("16384");
    expect(plain(document.querySelector("p")!.firstElementChild!.textContent)).toBe(
      "6 912 of 16 384 draws, about 46 s left. No numbers until all are in.",
    );
    expect((bar.firstElementChild as HTMLElement).style.transform).toBe(`scaleX(${6912 / 16_384})`);
  });

  it("says of a sweep points, and no time before there is one to tell", () => {
    const { task } = aTask();
    render(<TaskProgress task={aTask({ task: { ...task, kind: "sweep" }, done: 0, secondsLeft: null })} />);
    expect(plain(document.querySelector("p")!.textContent)).toContain("16 384 points to compute.");
  });

  it.each([
    [0.2, "about 1 s left"],
    [89, "about 89 s left"],
    [150, "about 3 min left"],
  ])("%d s are %s", (seconds, words) => expect(plain(timeLeft(seconds))).toBe(words));

  it("is stopped by its button, and reading goes on from the cell", () => {
    const task = aTask();
    render(
      <section tabIndex={-1} aria-label="sure">
        <TaskProgress task={task} />
      </section>,
    );
    const button = screen.getByRole("button", { name: "Stop computing sure" });
    button.focus();
    fireEvent.click(button);
    expect(task.stop).toHaveBeenCalledOnce();
    expect(document.activeElement).toBe(screen.getByRole("region", { name: "sure" }));
  });

  it("offers no second stop", () => {
    render(<TaskProgress task={aTask({ status: "stopping" })} />);
    expect(screen.queryByRole("button")).toBeNull();
    expect(screen.getByText(/Stopping after those in hand/)).toBeTruthy();
  });
});

describe("long work that ended early", () => {
  it("says what the answer is of, and computes the rest when told to", () => {
    const task = aTask({ status: "stopped" });
    render(<TaskHalt task={task} />);
    expect(plain(screen.getByRole("status").textContent)).toContain(
      "Stopped: the answer is that of the first 6 912 of 16 384 draws.",
    );
    fireEvent.click(screen.getByRole("button", { name: "Compute the rest: sure" }));
    expect(task.resume).toHaveBeenCalledOnce();
  });

  it("says that nothing was done where nothing was", () => {
    render(<TaskHalt task={aTask({ status: "stopped", done: 0 })} />);
    expect(plain(screen.getByRole("status").textContent)).toContain(
      "Stopped before any of 16 384 draws was done.",
    );
    expect(screen.getByRole("button", { name: "Compute it: sure" })).toBeTruthy();
  });

  it("says why it broke, and what can be done", () => {
    const task = aTask({ status: "failed", failure: "The worker went away" });
    render(<TaskHalt task={task} />);
    expect(screen.getByRole("status").textContent).toContain(
      "The spread sure could not be computed: The worker went away. What is written is safe.",
    );
    fireEvent.click(screen.getByRole("button", { name: "Try again: sure" }));
    expect(task.resume).toHaveBeenCalledOnce();
  });
});

describe("what is heard of long work", () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());
  const heard = () => screen.getByRole("status").textContent;
  const rest = () => act(() => void vi.advanceTimersByTime(1100));

  it("is its beginning, its quarters and its end, not each part", () => {
    const { rerender } = render(<TaskNews name="sure" task={aTask({ done: 100 })} />);
    expect(heard()).toBe("Computing sure.");
    rerender(<TaskNews name="sure" task={aTask({ done: 2000 })} />);
    rest();
    expect(heard()).toBe("Computing sure.");
    rerender(<TaskNews name="sure" task={aTask({ done: 8200 })} />);
    rest();
    expect(heard()).toBe("Computing sure: half is done.");
    rerender(<TaskNews name="sure" task={undefined} />);
    rest();
    expect(heard()).toBe("sure is computed.");
  });

  it("is nothing where nothing was under way", () => {
    render(<TaskNews name="sure" task={undefined} />);
    rest();
    expect(heard()).toBe("");
  });
});
