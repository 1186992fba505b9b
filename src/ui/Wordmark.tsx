/** Seven letters that lose weight and part as they rise: weight, then the space after, in em. */
const letters = [
  ["T", 760, 0.002],
  ["e", 600, 0.012],
  ["n", 480, 0.03],
  ["u", 390, 0.058],
  ["i", 310, 0.1],
  ["t", 250, 0.155],
  ["y", 200, 0],
] as const;

interface WordmarkProps {
  /** Size of the letters; a number is in pixels. */
  size?: number | string;
  className?: string;
}

/** The name as it is drawn. */
export function Wordmark({ size = 24, className = "" }: WordmarkProps) {
  return (
    <span
      role="img"
      aria-label="Tenuity"
      className={`font-serif leading-none whitespace-nowrap text-ink ${className}`}
      style={{ fontSize: size, letterSpacing: "-.01em" }}
    >
      {letters.map(([letter, weight, space]) => (
        <span key={letter} aria-hidden="true" style={{ fontWeight: weight, marginRight: `${space}em` }}>
          {letter}
        </span>
      ))}
    </span>
  );
}
