import type { CellEvaluation, Note, ResultSpread } from "../result";
import type { EvaluatedCell } from "./evaluateCell";
import { holdsUncertainty, saysWhichCentresAct } from "./openCell";

/** A cell's evaluation as it is shown, with the spreads of its results. */
export interface DecoratedCell {
  plain: CellEvaluation;
  /** What was added, as text; the same text gives the same object again. */
  added: string;
  shown: CellEvaluation;
}

interface Remembered {
  evaluated: EvaluatedCell;
  evaluation: CellEvaluation;
  decorated?: DecoratedCell;
}

/**
 * Gives results that a spread cell watches their spread, and takes back that uncertain entries act by their centres
 * where a spread drew them. Of two spreads that watch the same result, the first counts.
 */
export function withSpreads(cells: readonly Remembered[]): DecoratedCell[] {
  const spreads = new Map<string, ResultSpread>();
  const drawn = new Set<string>();
  for (const { evaluated, evaluation } of cells) {
    for (const name of evaluated.taskAnswer?.drawn ?? []) drawn.add(name);
    for (const [name, spread] of Object.entries(evaluated.taskAnswer?.spreads ?? {}))
      if (!spreads.has(name)) spreads.set(name, { ...spread, cell: evaluation.result.name });
  }
  return cells.map((cell) => decorate(cell, spreads, drawn));
}

function decorate(
  { evaluated, evaluation, decorated }: Remembered,
  spreads: ReadonlyMap<string, ResultSpread>,
  drawn: ReadonlySet<string>,
): DecoratedCell {
  const { kind, name, values } = evaluation.result;
  const own = Object.keys(values).flatMap((key) => {
    const spread = spreads.get(`${name}.${key}`) ?? (kind === "values" ? spreads.get(key) : undefined);
    return spread ? [{ key, spread }] : [];
  });
  const centres = centresThatAct(evaluated, drawn);
  const added = own.length === 0 && centres === null ? "" : JSON.stringify([own, centres]);
  if (decorated && decorated.plain === evaluation && decorated.added === added) return decorated;
  if (added === "") return { plain: evaluation, added, shown: evaluation };

  const spread = Object.fromEntries(own.map(({ key, spread }) => [key, { ...values[key], spread }]));
  const notes = centres === null ? evaluation.result.notes : withCentres(evaluation.result.notes, centres);
  const result = { ...evaluation.result, values: { ...values, ...spread }, notes };
  return { plain: evaluation, added, shown: { ...evaluation, result } };
}

/** Keys of the uncertain entries of a cell that no spread drew; null where all of them stay as they were said. */
function centresThatAct({ above }: EvaluatedCell, drawn: ReadonlySet<string>): string[] | null {
  const uncertain = above.entries.filter(({ node }) => holdsUncertainty(node)).map(({ key }) => key);
  const prefix = above.kind === "values" ? "" : `${above.name}.`;
  const isDrawn = (key: string) =>
    [...drawn].some((name) => {
      const full = `${prefix}${key}`;
      return name === full || name.startsWith(`${full}.`) || name.startsWith(`${full}[`);
    });
  const left = uncertain.filter((key) => !isDrawn(key));
  return left.length === uncertain.length ? null : left;
}

function withCentres(notes: readonly Note[], centres: readonly string[]): Note[] {
  return notes.flatMap((note) => {
    if (note.code !== "acts_by_centre") return [note];
    return centres.length === 0 ? [] : [{ ...note, message: saysWhichCentresAct(centres) }];
  });
}
