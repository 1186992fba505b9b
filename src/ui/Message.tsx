import { StateMark, type State } from "./StateMark";

interface MessageProps {
  state: State;
  children: React.ReactNode;
  /** A word to press at the end. */
  action?: React.ReactNode;
  /** Faults interrupt those who listen; the rest waits its turn. */
  live?: "off" | "polite" | "assertive";
  className?: string;
}

const spoken: Record<State, string> = {
  fault: "Fault:",
  caution: "Caution:",
  remark: "Remark:",
  holds: "Done:",
  waits: "Waiting:",
};

/** A state's mark and a sentence between two hairlines; never a coloured ground. */
export function Message({ state, children, action, live = "off", className = "" }: MessageProps) {
  const role = live === "assertive" ? "alert" : live === "polite" ? "status" : undefined;
  return (
    <div
      role={role}
      className={`flex items-baseline gap-12 border-t border-b border-t-ink border-b-rule py-10 font-sans text-[14.5px]/[22px] text-ink ${className}`}
    >
      <StateMark state={state} className="translate-y-1" />
      <div className="min-w-0 flex-1">
        <span className="visually-hidden">{spoken[state]} </span>
        {children}
      </div>
      {action}
    </div>
  );
}
