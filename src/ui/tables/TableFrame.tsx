import { useId, useState, type PropsWithChildren, type ReactNode } from "react";
import { ScrollBox } from "./ScrollBox";
import "./tables.css";

interface TableFrameProps {
  number: number;
  caption: ReactNode;
  /** The table as tab-separated text, SI and every digit. */
  text: () => string;
  /** Notes under the table. */
  notes?: ReactNode;
}

/** A table with its caption above and its notes below; it can be copied, and seen with all its digits. */
export function TableFrame({ number, caption, text, notes, children }: PropsWithChildren<TableFrameProps>) {
  const [copied, setCopied] = useState<string | null>(null);
  const id = useId();

  const handleCopy = async () => {
    try {
      await navigator.clipboard.writeText(text());
      setCopied("Copied.");
    } catch {
      setCopied("The browser did not let the table be copied. Open all digits below and copy from there.");
    }
  };

  return (
    <section className="table-frame" aria-labelledby={id}>
      <p className="table-caption">
        <button type="button" className="table-copy" data-print="never" onClick={() => void handleCopy()}>
          Copy as TSV
        </button>
        <span id={id}>
          <b>Table {number}.</b> {caption}
        </span>
      </p>
      <p className="table-said" role="status">
        {copied}
      </p>
      <ScrollBox label={`Table ${number}`}>{children}</ScrollBox>
      {notes}
      <AllDigits text={text} />
    </section>
  );
}

/** Every digit in SI, opened on demand. */
function AllDigits({ text }: { text: () => string }) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <details
      className="table-digits"
      data-print="never"
      onToggle={(event) => setIsOpen(event.currentTarget.open)}
    >
      <summary>All digits, in SI</summary>
      {isOpen && (
        <pre tabIndex={0} aria-label="All digits, in SI">
          {text()}
        </pre>
      )}
    </details>
  );
}
