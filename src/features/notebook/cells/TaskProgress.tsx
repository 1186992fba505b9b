import { useState } from "react";
import { formatFixed, unitSpace } from "../../../lib/format";
import { useSettled } from "../../../lib/useSettled";
import { Message } from "../../../ui/Message";
import { TextButton } from "../../../ui/TextButton";
import type { TaskState } from "../evaluation/createTaskQueue";

interface TaskProps {
  task: TaskState;
}

const wordOf = ({ task }: TaskState): string => (task.kind === "sweep" ? "points" : "draws");

/** "about 46 s left": seconds up to a minute and a half, then minutes. */
export function timeLeft(seconds: number): string {
  if (seconds < 90) return `about ${Math.max(1, Math.round(seconds))}${unitSpace}s left`;
  return `about ${formatFixed(Math.round(seconds / 60))}${unitSpace}min left`;
}

function progressWords(state: TaskState): string {
  const { done, points, secondsLeft } = state;
  if (done === 0) return `${formatFixed(points)} ${wordOf(state)} to compute.`;
  const counted = `${formatFixed(done)} of ${formatFixed(points)} ${wordOf(state)}`;
  return secondsLeft === null || done === points ? `${counted}.` : `${counted}, ${timeLeft(secondsLeft)}.`;
}

/** The button goes with the press; reading goes on from its cell. */
function pressed(act: () => void) {
  return ({ currentTarget }: React.MouseEvent<HTMLElement>) => {
    currentTarget.closest<HTMLElement>("section")?.focus();
    act();
  };
}

/** A sweep or spread under way: a line that fills, what is done, the time left, and a word to stop it. */
export function TaskProgress({ task: state }: TaskProps) {
  const { task, done, points, status, stop } = state;
  const words = progressWords(state);
  return (
    <div className="task-progress">
      <div
        className="task-line"
        role="progressbar"
        aria-label={`Computing ${task.name}`}
        aria-valuemin={0}
        aria-valuemax={points}
        aria-valuenow={done}
        aria-valuetext={words}
      >
        <span style={{ transform: `scaleX(${done / points})` }} />
      </div>
      <p>
        <span>
          {words} {status === "stopping" ? "Stopping after those in hand." : "No numbers until all are in."}
        </span>
        {(status === "waiting" || status === "running") && (
          <TextButton aria-label={`Stop computing ${task.name}`} onClick={pressed(stop)}>
            Stop
          </TextButton>
        )}
      </p>
    </div>
  );
}

/** A sweep or spread that was stopped or broke, with what can be done about it. */
export function TaskHalt({ task: state }: TaskProps) {
  const { task, done, points, status, failure, resume } = state;
  const isFailed = status === "failed";
  const word = isFailed ? "Try again" : done === 0 ? "Compute it" : "Compute the rest";
  return (
    <Message
      state={isFailed ? "fault" : done === 0 ? "waits" : "caution"}
      live="polite"
      className="mt-18"
      action={
        <TextButton aria-label={`${word}: ${task.name}`} onClick={pressed(resume)}>
          {word}
        </TextButton>
      }
    >
      {isFailed
        ? `The ${task.kind} ${task.name} could not be computed: ${sentence(failure ?? "the work broke off")} What is written is safe.`
        : done === 0
          ? `Stopped before any of ${formatFixed(points)} ${wordOf(state)} was done.`
          : `Stopped: the answer is that of the first ${formatFixed(done)} of ${formatFixed(points)} ${wordOf(state)}.`}
    </Message>
  );
}

const sentence = (text: string): string => (/[.!?]$/.test(text) ? text : `${text}.`);

const quarters = ["", "a quarter is done", "half is done", "three quarters are done"];

/** What is heard of long work: its beginning, each quarter, its end; no more often than it can be listened to. */
export function TaskNews({ name, task }: { name: string; task: TaskState | undefined }) {
  const isActive = task !== undefined && isUnderWay(task);
  const [wasActive, setWasActive] = useState(isActive);
  if (isActive && !wasActive) setWasActive(true);
  const quarter = task ? Math.min(3, Math.floor((4 * task.done) / task.points)) : 0;
  const now = isActive
    ? `Computing ${name}${quarter > 0 ? `: ${quarters[quarter]}` : ""}.`
    : wasActive && task === undefined
      ? `${name} is computed.`
      : "";
  const told = useSettled(now, 1000);
  return (
    <p className="visually-hidden" role="status">
      {told}
    </p>
  );
}

/** Whether numbers are on their way, so that none are shown. */
export const isUnderWay = ({ status }: TaskState): boolean => status !== "stopped" && status !== "failed";
