import { useDeferredValue } from "react";
import { formatGas } from "../../../../lib/format";
import { LossFigure } from "../../../../ui/plots/LossFigure";
import { ValueList } from "../../../../ui/tables/ValueList";
import type { AnswerProps } from "./answerProps";

/** What a loss gives: what has gone in several measures, and how it went. */
export function LossAnswer({ evaluation, unitSystem, figureNumber, isNear }: AnswerProps) {
  const { result, lightHistory, gases } = useDeferredValue(evaluation);
  const gas = gases[0] ?? "";
  const labels = {
    particles: ["Lost in all, particles of ", ...formatGas(gas)],
    mass: ["Mass"],
    water_layer: ["As a layer of water"],
    surface_pressure: ["As pressure"],
  };
  return (
    <>
      <ValueList result={result} unitSystem={unitSystem} names={Object.keys(labels)} labels={labels} />
      {isNear && lightHistory && (
        <LossFigure
          result={result}
          light={lightHistory}
          gas={gas}
          unitSystem={unitSystem}
          number={figureNumber}
        />
      )}
    </>
  );
}
