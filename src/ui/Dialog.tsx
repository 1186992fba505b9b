import { Dialog as Parts } from "radix-ui";

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** A sentence under the title. */
  description?: React.ReactNode;
  children: React.ReactNode;
  /** Width in pixels where there is room. */
  width?: number;
}

/** A question laid over the page. Escape and a press outside put it away; what was written in it is the caller's to keep. */
export function Dialog({ open, onOpenChange, title, description, children, width = 520 }: DialogProps) {
  return (
    <Parts.Root open={open} onOpenChange={onOpenChange}>
      <Parts.Portal>
        <Parts.Overlay className="fixed inset-0 z-30 bg-[color-mix(in_srgb,var(--paper)_72%,transparent)]" />
        <Parts.Content
          className="fixed top-[max(24px,12vh)] left-1/2 z-30 max-h-[calc(100dvh-48px-8vh)] w-[calc(100vw-36px)] -translate-x-1/2 overflow-y-auto rounded border border-rule2 bg-raised px-28 py-28 shadow-float outline-none"
          style={{ maxWidth: width }}
          {...(description ? {} : { "aria-describedby": undefined })}
        >
          <Parts.Title className="type-section">{title}</Parts.Title>
          {description && (
            <Parts.Description className="pt-4 type-meta text-ink2">{description}</Parts.Description>
          )}
          {children}
        </Parts.Content>
      </Parts.Portal>
    </Parts.Root>
  );
}

/** The row of verbs that ends a dialog, the main one first. */
export function DialogActions({ children }: { children: React.ReactNode }) {
  return <div className="flex flex-wrap items-center gap-x-18 gap-y-12 pt-18">{children}</div>;
}
