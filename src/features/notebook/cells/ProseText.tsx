import { lazy, memo, Suspense } from "react";
import { fetchPart } from "../../../lib/fetchPart";
import { PartBoundary } from "../../../ui/PartBoundary";

const MarkdownProse = lazy(() => fetchPart(() => import("./MarkdownProse")));
const MathProse = lazy(() => fetchPart(() => import("./MathProse")));

interface ProseTextProps {
  text: string;
  /** Names that are set apart where they stand after an @. */
  mentions?: readonly string[];
}

/** Prose as it reads. Until the code for it has come, or where it can't, the text stands as it was typed. */
export const ProseText = memo(function ProseText({ text, mentions }: ProseTextProps) {
  const Prose = text.includes("$") ? MathProse : MarkdownProse;
  const asTyped = <p className="whitespace-pre-wrap">{text}</p>;
  return (
    <div className="prose">
      <PartBoundary instead={asTyped}>
        <Suspense fallback={asTyped}>
          <Prose text={text} mentions={mentions} />
        </Suspense>
      </PartBoundary>
    </div>
  );
});
