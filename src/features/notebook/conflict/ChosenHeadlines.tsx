import type { HeadlineItem } from "../../../../shared/notebook/summary";
import type { UnitSystem } from "../../../lib/format";
import { HeadlineNumber } from "../page/Headline";

interface ChosenHeadlinesProps {
  theirs: readonly HeadlineItem[];
  mine: readonly HeadlineItem[];
  chosen: readonly HeadlineItem[];
  other: string;
  unitSystem: UnitSystem;
}

/** The first number of the headline as each state gives it, and as chosen. */
export function ChosenHeadlines({ theirs, mine, chosen, other, unitSystem }: ChosenHeadlinesProps) {
  const states = [
    { label: `${other}’s`, item: theirs[0], tone: "text-dusk" },
    { label: "yours", item: mine[0], tone: "" },
    { label: "as chosen", item: chosen[0], tone: "font-semibold" },
  ];
  const what = (mine[0] ?? theirs[0])?.label;
  if (what === undefined) return null;
  return (
    <dl className="conflict-headlines">
      {states.map(({ label, item, tone }) => (
        <div key={label}>
          <dt>
            {what}, {label}
          </dt>
          <dd className={tone}>{item ? <HeadlineNumber item={item} unitSystem={unitSystem} /> : "–"}</dd>
        </div>
      ))}
    </dl>
  );
}
