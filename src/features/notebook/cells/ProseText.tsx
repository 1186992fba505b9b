import { lazy, memo, Suspense } from "react";

const MarkdownProse = lazy(() => import("./MarkdownProse"));
const MathProse = lazy(() => import("./MathProse"));

/** Prose as it reads. Until the code for it has come, the text stands as it was typed, in the same type. */
export const ProseText = memo(function ProseText({ text }: { text: string }) {
  const Prose = text.includes("$") ? MathProse : MarkdownProse;
  return (
    <div className="prose">
      <Suspense fallback={<p className="whitespace-pre-wrap">{text}</p>}>
        <Prose text={text} />
      </Suspense>
    </div>
  );
});
