import type { VettingCheck } from "../../../shared/schemas/vettings";
import { formatMessage } from "../../lib/formatMessage";
import { Rich } from "../../lib/Rich";
import { Button } from "../../ui/Button";
import { StateMark, type State } from "../../ui/StateMark";
import { TextButton } from "../../ui/TextButton";

const titles: Record<VettingCheck["code"], string> = {
  same_numbers: "The server finds the same numbers",
  no_faults: "No faults",
  cautions_answered: "Each caution is answered",
  sources: "Each given value has a source",
  no_open_threads: "No open threads",
  data_present: "Attached data are present",
  not_own_alone: "Not approved by its only owner",
};
const verdicts: Record<VettingCheck["verdict"], { state: State; words: string }> = {
  holds: { state: "holds", words: "holds" },
  to_judge: { state: "caution", words: "yours to judge" },
  fails: { state: "fault", words: "does not hold" },
};

interface CheckListProps {
  checks: readonly VettingCheck[];
  /** null where one only looks. */
  onAccept: ((accepted: string[]) => void) | null;
  isBusy: boolean;
}

/** Verdict, check and reason, in words. */
export function CheckList({ checks, onAccept, isBusy }: CheckListProps) {
  return (
    <section aria-labelledby="checks-heading" className="pt-44">
      <h2 id="checks-heading" className="pb-8 type-section">
        Checks
      </h2>
      <ol className="checks">
        {checks.map((check) => (
          <li key={check.code}>
            <span className="checks-verdict">
              <StateMark state={verdicts[check.verdict].state} /> {verdicts[check.verdict].words}
            </span>
            <div className="min-w-0">
              <h3>{titles[check.code]}</h3>
              <p className="text-ink2">{check.reason}</p>
              <Cautions cautions={check.cautions ?? []} onAccept={onAccept} isBusy={isBusy} />
            </div>
          </li>
        ))}
      </ol>
    </section>
  );
}

function Cautions({
  cautions,
  onAccept,
  isBusy,
}: { cautions: NonNullable<VettingCheck["cautions"]> } & Pick<CheckListProps, "onAccept" | "isBusy">) {
  if (cautions.length === 0) return null;
  const accepted = cautions.filter(({ isAccepted }) => isAccepted).map(({ key }) => key);
  return (
    <ul className="checks-cautions">
      {cautions.map(({ key, cell, message, sentence, isAccepted }) => (
        <li key={key}>
          <p className="type-label">
            <b>{cell}</b>: <Rich text={formatMessage(message)} />
          </p>
          <p className="font-serif italic">{sentence === null ? "No answer that holds." : `“${sentence}”`}</p>
          {sentence !== null && isAccepted && (
            <p className="checks-verdict">
              <StateMark state="holds" /> accepted{" "}
              {onAccept && (
                <TextButton disabled={isBusy} onClick={() => onAccept(accepted.filter((one) => one !== key))}>
                  take back
                </TextButton>
              )}
            </p>
          )}
          {sentence !== null && !isAccepted && onAccept && (
            <Button size="small" disabled={isBusy} onClick={() => onAccept([...accepted, key])}>
              Accept
            </Button>
          )}
        </li>
      ))}
    </ul>
  );
}
