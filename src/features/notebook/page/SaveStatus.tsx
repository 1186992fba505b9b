import { formatTime } from "../../../lib/format";
import { StateWord } from "../../../ui/StateMark";
import type { SaveState } from "../draft/saveQueue";

interface SaveStatusProps {
  state: SaveState;
  savedAt: string;
  /** Cells in which two states wait for a choice. */
  toSettle: number;
  /** Whether this browser could keep what the server does not have. */
  isKept: boolean;
}

const reasons = {
  offline: "offline",
  server: "the server does not answer",
  signedOut: "signed out",
} as const;

/** Where the draft stands: saved and when, on its way, or not saved and why, and where it is kept meanwhile. */
export function SaveStatus({ state, savedAt, toSettle, isKept }: SaveStatusProps) {
  if (toSettle > 0) {
    const words = toSettle === 1 ? "one cell to settle" : `${toSettle} cells to settle`;
    return (
      <span role="status" className="save-status">
        <StateWord state="caution">not saved: {words}</StateWord>
      </span>
    );
  }
  switch (state.kind) {
    case "saved":
      return <span className="save-status">saved {formatTime(new Date(savedAt))}</span>;
    case "saving":
    case "stale":
      return <span className="save-status">saving</span>;
    case "kept": {
      const since = formatTime(new Date(state.since));
      const kept = isKept ? `kept here since ${since}` : "and this browser has no room to keep it";
      return (
        <span role="status" className="save-status">
          <StateWord state={isKept ? "caution" : "fault"}>
            not saved: {reasons[state.reason]}, {kept}
          </StateWord>
          {state.reason === "signedOut" && (
            <a className="pl-12" href={window.location.pathname}>
              Sign in
            </a>
          )}
        </span>
      );
    }
    case "refused":
      return (
        <span role="alert" className="save-status" title={state.message}>
          <StateWord state="fault">not saved: {state.message}</StateWord>
        </span>
      );
  }
}
