import { lazy, Suspense } from "react";
import { fetchPart } from "../../../lib/fetchPart";
import { PartBoundary } from "../../../ui/PartBoundary";

const MathProse = lazy(() => fetchPart(() => import("../cells/MathProse")));

/** Mathematics in TeX. Until the code for it has come, or where it can't, the TeX stands as it is. */
export function Tex({ tex, isDisplayed = false }: { tex: string; isDisplayed?: boolean }) {
  const asWritten = <code className="explain-tex">{tex}</code>;
  return (
    <PartBoundary instead={asWritten}>
      <Suspense fallback={asWritten}>
        <MathProse text={isDisplayed ? `$$\n${tex}\n$$` : `$${tex}$`} />
      </Suspense>
    </PartBoundary>
  );
}
