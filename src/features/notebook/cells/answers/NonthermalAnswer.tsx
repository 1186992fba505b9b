import { ChannelsTable } from "../../../../ui/tables/ChannelsTable";
import { ValueList } from "../../../../ui/tables/ValueList";
import { formatIon } from "../../../../lib/format";
import type { AnswerProps } from "./answerProps";

const quantities = [
  { key: "escape_rate", words: "Fragments leave" },
  { key: "pickup_energy", words: "Most energy in the wind" },
  { key: "gyroradius", words: "Gyroradius in the wind" },
];

/** What becomes of an ion: which fragments of it leave, and what the wind makes of it. */
export function NonthermalAnswer({ evaluation: { result, ion = "" }, unitSystem, tableNumber }: AnswerProps) {
  const labels = Object.fromEntries(
    quantities.map(({ key, words }) => [`${ion}.${key}`, [`${words}, `, ...formatIon(ion)]]),
  );
  return (
    <>
      <ChannelsTable result={result} ion={ion} unitSystem={unitSystem} number={tableNumber} />
      <ValueList result={result} unitSystem={unitSystem} names={Object.keys(labels)} labels={labels} />
    </>
  );
}
