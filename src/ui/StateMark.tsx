/** What a mark may say. A state is never colour alone: each has its shape, and stands beside its word. */
export type State = "fault" | "caution" | "remark" | "holds" | "waits";

const colours: Record<State, string> = {
  fault: "text-redline",
  caution: "text-sodium",
  remark: "text-ink3",
  holds: "text-airglow",
  waits: "text-dusk",
};

const shapes: Record<State, React.ReactNode> = {
  fault: <path d="M1.5 1.5l8 8M9.5 1.5l-8 8" strokeWidth="1.9" />,
  caution: <path d="M5.5 1L10 5.5L5.5 10L1 5.5Z" />,
  remark: <circle cx="5.5" cy="5.5" r="1.8" fill="currentColor" stroke="none" />,
  holds: <circle cx="5.5" cy="5.5" r="4.4" fill="currentColor" stroke="none" />,
  waits: <circle cx="5.5" cy="5.5" r="3.8" />,
};

interface StateMarkProps {
  state: State;
  /** Give it where no word stands beside the mark. */
  label?: string;
  className?: string;
}

/** A state as a shape: cross, diamond, dot, disc, ring. */
export function StateMark({ state, label, className = "" }: StateMarkProps) {
  return (
    <svg
      className={`inline-block size-11 flex-none ${colours[state]} ${className}`}
      viewBox="0 0 11 11"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      role={label ? "img" : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
    >
      {shapes[state]}
    </svg>
  );
}

interface StateWordProps {
  state: State;
  children: React.ReactNode;
  className?: string;
}

/** A mark with its word, in its colour. */
export function StateWord({ state, children, className = "" }: StateWordProps) {
  return (
    <span
      className={`inline-flex items-center gap-6 font-sans text-[13.5px]/[18px] font-medium whitespace-nowrap ${colours[state]} ${className}`}
    >
      <StateMark state={state} />
      {children}
    </span>
  );
}
