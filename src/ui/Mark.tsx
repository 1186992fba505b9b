interface MarkProps {
  size?: number;
  className?: string;
}

/** The mark: ground, two arcs, one that breaks up, free dots. Beside a name it says nothing of its own. */
export function Mark({ size = 28, className = "" }: MarkProps) {
  return (
    <svg
      className={`block flex-none text-ink ${className}`}
      width={size}
      height={size}
      viewBox="0 0 32 32"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
    >
      <path d="M2 30.5A34 34 0 0 1 30 30.5Z" fill="currentColor" stroke="none" />
      <path d="M2 24.6Q16 18.4 30 24.6" strokeWidth="2.6" />
      <path d="M2 19.2Q16 13 30 19.2" strokeWidth="1.5" />
      <path d="M2 12.6Q16 6.4 30 12.6" strokeWidth="1.5" strokeDasharray="1.7 2.5" />
      <g fill="currentColor" stroke="none">
        <circle cx="8.4" cy="4.6" r=".85" />
        <circle cx="16.4" cy="2.2" r=".85" />
        <circle cx="24.9" cy="5.4" r=".85" />
      </g>
    </svg>
  );
}
