import { memo } from "react";
import type { UnitSystem } from "../../../lib/format";
import type { NumberSpread } from "../../../lib/formatSpread";
import type { Strip } from "../../../../shared/notebook/summary";
import { AltitudeStrip } from "../../../ui/strip/AltitudeStrip";
import { LyingStrip } from "../../../ui/strip/LyingStrip";
import { useMediaQuery } from "./useMediaQuery";

interface StripPaneProps {
  strip: Strip | null;
  exobaseSpread: NumberSpread | null;
  unitSystem: UnitSystem;
  /** The strip is being computed anew, or its column is at fault: it is not shown as if it held. */
  isVoid: boolean;
}

/** The altitude strip of the column in view: at the left edge, or lying under the bar where the page is narrow. */
export const StripPane = memo(function StripPane({
  strip,
  exobaseSpread,
  unitSystem,
  isVoid,
}: StripPaneProps) {
  const isLying = useMediaQuery("(max-width: 999.98px)");
  if (!strip) return isLying ? null : <div className="strip-pane" />;
  return (
    <aside
      className="strip-pane"
      aria-label="Altitude strip"
      data-void={isVoid || undefined}
      data-print="never"
    >
      {isLying ? (
        <LyingStrip strip={strip} exobaseSpread={exobaseSpread} unitSystem={unitSystem} />
      ) : (
        <AltitudeStrip strip={strip} exobaseSpread={exobaseSpread} unitSystem={unitSystem} />
      )}
    </aside>
  );
});
