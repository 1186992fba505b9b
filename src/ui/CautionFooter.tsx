import { cautionText } from "../../shared/notebook/cautionText";

interface CautionFooterProps {
  className?: string;
  /** Of the page it stands under, its padding included, in pixels. */
  maxWidth?: number;
}

/** The foot of each page: what its numbers rest on and what they are not for. */
export function CautionFooter({ className = "", maxWidth }: CautionFooterProps) {
  return (
    <footer className={className} style={{ maxWidth }}>
      <p className="max-w-[646px] border-t border-rule pt-16 font-sans text-[13px]/[19px] text-ink3">
        {cautionText}
      </p>
    </footer>
  );
}
