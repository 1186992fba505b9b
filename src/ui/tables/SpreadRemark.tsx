import type { CellResult } from "../../../shared/notebook/result";
import { StateMark } from "../StateMark";
import { thinSpace } from "../../lib/format";

interface SpreadRemarkProps {
  values: CellResult["values"];
  /** Names of the values that are shown. */
  names: readonly string[];
}

/** Where values carry ±: what it is, whose it is, and whether its draws were all done. */
export function SpreadRemark({ values, names }: SpreadRemarkProps) {
  const cells = new Map<string, boolean>();
  for (const name of names) {
    const spread = values[name]?.spread;
    if (spread) cells.set(spread.cell, cells.get(spread.cell) === true || spread.isPartial === true);
  }
  return [...cells].map(([cell, isPartial]) => (
    <p key={cell} className="spread-remark">
      {isPartial && <StateMark state="remark" label="remark" />}
      <span>
        ± holds the middle 68{thinSpace}% of the draws of <i>{cell}</i>
        {isPartial && ", which was stopped before all of them were done"}.
      </span>
    </p>
  ));
}
