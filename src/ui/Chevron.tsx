/** Says that a word opens a menu. */
export function Chevron({ className = "" }: { className?: string }) {
  return (
    <svg
      className={`inline-block h-6 w-9 flex-none self-center ${className}`}
      viewBox="0 0 9 6"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      aria-hidden="true"
    >
      <path d="M1 1l3.5 3.6L8 1" />
    </svg>
  );
}
