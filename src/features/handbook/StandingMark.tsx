import type { Standing } from "./handbookTable";

const shapes: Record<Standing["shape"], React.ReactNode> = {
  filled: <circle cx="5.5" cy="5.5" r="4.4" fill="currentColor" stroke="none" />,
  half: (
    <>
      <circle cx="5.5" cy="5.5" r="3.8" />
      <path d="M5.5 1.7a3.8 3.8 0 0 0 0 7.6Z" fill="currentColor" stroke="none" />
    </>
  ),
  hollow: <circle cx="5.5" cy="5.5" r="3.8" />,
};

/** How well a row is founded, as a shape beside its word. */
export function StandingMark({ standing }: { standing: Standing }) {
  return (
    <span className="inline-flex items-center gap-7">
      <svg
        className="size-11 flex-none text-ink2"
        viewBox="0 0 11 11"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
        aria-hidden="true"
      >
        {shapes[standing.shape]}
      </svg>
      {standing.word}
    </span>
  );
}
