/** What a result rests on besides its formula: a choice of the notebook, or an assumption of the model, in a sentence. */
import { waterPerParticle } from "../../physics";
import {
  entryOf,
  entryText,
  relatedCell,
  type ExplainedCell,
  type ExplainedNotebook,
} from "./explainedNotebook";

/** The result that is explained. */
export interface ExplainedPlace {
  notebook: ExplainedNotebook;
  cell: ExplainedCell;
  /** The gas or ion that it speaks of. */
  gas: string | null;
}

type Convention = (place: ExplainedPlace) => string | null;

const related = ({ notebook, cell }: ExplainedPlace, kind: "body" | "column" | "escape") =>
  relatedCell(notebook, cell, kind);

/** " by default" where the entry is left out. */
const byDefault = (cell: ExplainedCell, key: string): string => (entryOf(cell, key) ? "" : ", by default");

const criteria: Readonly<Record<string, string>> = {
  bulk: "where the mean free path of the whole gas is its scale height, l = H",
  simple: "where 1/Σnσ is the scale height of the whole gas, without the √2 of the mean free path",
  unit_depth: "where the depth of collisions from there up is 1",
};

function criterion(place: ExplainedPlace): string | null {
  const escape = related(place, "escape");
  if (!escape) return null;
  const written = entryOf(escape, "criterion");
  const word = written ? entryText(escape, written) : "bulk";
  const gas = entryOf(escape, "gas");
  const where =
    word === "gas"
      ? `where the mean free path of ${gas ? entryText(escape, gas) : "one gas"} is the scale height of that gas`
      : criteria[word];
  return where === undefined
    ? null
    : `Exobase ${where} (*criterion = ${word}*${byDefault(escape, "criterion")}).`;
}

function coupling(place: ExplainedPlace): string | null {
  const escape = related(place, "escape");
  const convention = escape?.evaluation.convention;
  if (!escape || !convention) return null;
  const how =
    convention.coupling === "coupled"
      ? "Column solved together with what escapes from it"
      : "Column without a flux, the Jeans flux evaluated after";
  return `${how} (*coupling = ${convention.coupling}*${byDefault(escape, "coupling")}).`;
}

function correction(place: ExplainedPlace): string | null {
  const escape = related(place, "escape");
  const written = escape && entryOf(escape, "correction");
  if (!escape || !written) return "No factor on the Jeans rate, c = 1.";
  return `Rates with the factors of *correction = ${entryText(escape, written)}*; a gas that is not named has none.`;
}

function centrifugal(place: ExplainedPlace): string | null {
  const body = related(place, "body");
  const latitude = body && entryOf(body, "latitude");
  if (!body || !latitude) return "Gravity without the centrifugal term.";
  const acts = !body.evaluation.result.notes.some(({ code }) => code === "latitude_without_rotation");
  return acts
    ? `Gravity less the centrifugal term at latitude ${entryText(body, latitude)}.`
    : "Gravity without the centrifugal term.";
}

function eddyMixing(place: ExplainedPlace): string | null {
  const column = related(place, "column");
  if (!column) return null;
  const eddy = entryOf(column, "eddy");
  return eddy
    ? `Eddy mixing in ${column.cell.name}: *${entryText(column, eddy)}*.`
    : `No eddy mixing in ${column.cell.name}, by default.`;
}

function limitLevel({ cell, gas }: ExplainedPlace): string {
  const atBase = cell.evaluation.result.notes.find(({ code }) => code === "limits_at_base");
  const isAtBase = gas !== null && (atBase?.message.split(/[^A-Za-z0-9]+/).includes(gas) ?? false);
  const level = isAtBase
    ? "the base of the column, for want of a homopause"
    : `the homopause of ${gas ?? "the gas"}`;
  return `Taken at ${level}, and referred to the area of the exobase.`;
}

function crossoverGases({ cell }: ExplainedPlace): string | null {
  return cell.evaluation.result.notes.find(({ code }) => code === "crossover_gases")?.message ?? null;
}

function satellites({ cell }: ExplainedPlace): string {
  const written = entryOf(cell, "satellites");
  return written
    ? `Satellite orbits filled to *satellites = ${entryText(cell, written)}* up to the reach.`
    : "Satellite orbits, which never cross the exobase, are empty, by default.";
}

function xuvLaw({ cell }: ExplainedPlace): string {
  if (entryOf(cell, "history"))
    return "XUV light by the history that is written, as a power between its points.";
  const { defaults } = cell.evaluation;
  const standard = defaults.find(({ key }) => key === "xuv_exponent");
  return standard
    ? `XUV light by the power law of ${standard.note ?? "the Sun and its like"} (*${standard.text}*, by default).`
    : "XUV light by the power law that is written.";
}

function water({ gas }: ExplainedPlace): string | null {
  const share = gas === null ? null : waterPerParticle(gas);
  return share === null ? null : `w = ${share} molecules of water for each ${gas}.`;
}

function draws({ cell }: ExplainedPlace): string {
  const done = cell.evaluation.result.values.draws?.value;
  const count = typeof done === "number" ? `${done} draws` : "Draws";
  return `${count} of a scrambled Sobol sequence, in eight scramblings.`;
}

function faultedDraws({ cell }: ExplainedPlace): string | null {
  const share = cell.evaluation.result.values.faulted_share?.value;
  if (typeof share !== "number") return null;
  return share === 0 ? "No draw had a fault." : "Draws with a fault count in no quantile.";
}

function givenAtBase(place: ExplainedPlace): string | null {
  const column = related(place, "column");
  if (!column) return null;
  const key = ["number_density", "pressure"].find((one) => entryOf(column, one));
  return key === undefined
    ? "The densities of the gases are written; the pressure follows."
    : `The entry *${key}* gives one of density and pressure; the other follows.`;
}

function topOfColumn(place: ExplainedPlace): string | null {
  const column = related(place, "column");
  if (!column) return null;
  return entryOf(column, "top")
    ? "As the entry *top* says, as long as there is gas to speak of."
    : "Well above the exobase and the band round it, by default.";
}

const conventions = {
  criterion,
  coupling,
  correction,
  centrifugal,
  eddyMixing,
  limitLevel,
  crossoverGases,
  satellites,
  xuvLaw,
  waterPerParticle: water,
  draws,
  faultedDraws,
  givenAtBase,
  topOfColumn,
  stationary: () => "A stationary column without chemistry; one temperature for all gases.",
  withoutFlux: () => "The column by itself, without a flux; what escapes changes it in the escape cell only.",
  withoutRotation: () => "A body that does not rotate.",
  crossSections: () =>
    "Cross sections σ = πd², with d of the handbook unless a gas cell gives one; the mean free path is that of the whole gas, with √2.",
  bandIsBulk: () => "The band is that of the whole gas, Kn = l/H, whatever the criterion.",
  inventory: () => "Counted from the base of the column up to the exobase.",
  windTemperature: () =>
    "One temperature throughout: that of the exobase or, where there is none, of the top of the column.",
  withoutTide: () => "K is 1 where no star is given.",
  gammaShare: () => "P is the regularised incomplete gamma function P(3/2, ·), and Q = 1 − P.",
  singlyCharged: () => "The ion carries one elementary charge.",
  channelsOfHandbook: ({ cell }) =>
    cell.evaluation.result.notes.find(({ code }) => code === "handbook_recombination")?.message ??
    "Channels of the handbook.",
  sweepPoints: () => "Each point is the notebook as written but for what is varied.",
} as const satisfies Record<string, Convention>;

export type ConventionName = keyof typeof conventions;

export function conventionSentences(names: readonly ConventionName[], place: ExplainedPlace): string[] {
  return names.flatMap((name) => (conventions[name] as Convention)(place) ?? []);
}
