/** A line that fills while an answer is computed; no numbers meanwhile. */
export function Computing({ isBeginning = false }: { isBeginning?: boolean }) {
  return (
    <p className="computing" role="status" data-beginning={isBeginning || undefined}>
      <span className="computing-line" aria-hidden="true" />
      Computing
    </p>
  );
}
