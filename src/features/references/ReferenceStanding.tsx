import type { ReferenceState } from "../../../shared/schemas/references";
import { StateMark, type State } from "../../ui/StateMark";

const marks: Record<ReferenceState, State> = { current: "holds", superseded: "remark", withdrawn: "fault" };

/** Current, superseded or withdrawn: mark and word. */
export function ReferenceStanding({ state }: { state: ReferenceState }) {
  return (
    <span className="whitespace-nowrap">
      <StateMark state={marks[state]} /> {state}
    </span>
  );
}
