import {
  collisionParameter,
  collisionRows,
  type CollisionParameter,
  type CollisionRow,
  type HandbookGas,
} from "../physics";

/** Two gases of the handbook, the lighter first, and what is known of their diffusion through each other. */
export interface CollisionPair {
  gases: readonly [string, string];
  /** What a column uses unless a gas cell says otherwise. */
  acting: CollisionParameter;
  /** The published row that acts; undefined where the estimate does. */
  row: CollisionRow | undefined;
  /** The other published rows of the pair, which do not act. */
  others: readonly CollisionRow[];
}

const isOf = ({ gases }: CollisionRow, first: string, second: string): boolean =>
  (gases[0] === first && gases[1] === second) || (gases[0] === second && gases[1] === first);

/** Every pair of the gases, in their order. */
export function collisionPairs(gases: readonly HandbookGas[]): CollisionPair[] {
  return gases.flatMap((first, index) =>
    gases.slice(index + 1).map((second): CollisionPair => {
      const acting = collisionParameter(first, second);
      const published = collisionRows.filter((row) => isOf(row, first.formula, second.formula));
      const row = acting.isEstimate ? undefined : published.find(({ basis }) => basis === "measured");
      return {
        gases: [first.formula, second.formula],
        acting,
        row,
        others: published.filter((other) => other !== row),
      };
    }),
  );
}

/** Published rows of a gas in air, or in what is lumped together: they act for no pair. */
export function lumpedRows(gases: readonly HandbookGas[]): CollisionRow[] {
  const known = new Set(gases.map(({ formula }) => formula));
  return collisionRows.filter(({ gases: [first, second] }) => !known.has(first) || !known.has(second));
}
