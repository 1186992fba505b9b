import { cautionText } from "./cautionText";

/** The foot of each page: what its numbers rest on and what they are not for. */
export function CautionFooter({ className = "" }: { className?: string }) {
  return (
    <footer className={className}>
      <p className="max-w-[646px] border-t border-rule pt-16 font-sans text-[13px]/[19px] text-ink3">{cautionText}</p>
    </footer>
  );
}
