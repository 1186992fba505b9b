import {
  equivalentTime,
  findGas,
  gravity,
  lossHistory,
  PhysicsDomainError,
  solarXuvAges,
  solarXuvExponent,
  surfacePressureFromParticles,
  waterLayerFromMolecules,
  waterPerParticle,
  type LossSpan,
  type XuvHistory,
} from "../../physics";
import { checkName } from "./checkName";
import type { CellAnswer } from "./cellAnswer";
import type { BodyModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { knownGases, readCellEntry, readEntry, readQuantityEntry, sayIfBothStand } from "./readEntries";
import { measured } from "./resultValue";
import { quantityKinds } from "../language/dimensions";
import { formatQuantity } from "../language/formatQuantity";
import { readGasName } from "../language/readGasName";
import { readHistory } from "../language/readHistory";
import type { CellResult, LightHistory, ResultRow } from "../result";

export function evaluateLoss(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  const body = readCellEntry(cell, "body");
  const rate = readQuantityEntry(cell, "rate");
  const gas = readGas(cell);
  const span = readSpan(cell);
  sayWhichCentresAct(cell);
  if (!body || rate === undefined || !gas || !span) return {};

  sayWhatIsExtrapolated(cell, span);
  const time = timeOf(cell, span);
  if (time === undefined) return { gases: [gas.formula] };
  const particles = rate * time;
  return {
    gases: [gas.formula],
    values: lossValues(cell, body, gas, particles),
    tables: Number.isFinite(particles) && !cell.isDraw ? { history: historyOf(span, rate) } : {},
    lightHistory: lightHistoryOf(span),
  };
}

interface LostGas {
  formula: string;
  mass: number;
}

function readGas(cell: OpenCell): LostGas | undefined {
  const formula = readEntry(cell, "gas", (node) => readGasName(node, knownGases(cell)));
  if (formula === undefined) return undefined;
  const mass = cell.surroundings.gas(formula)?.mass ?? findGas(formula)?.mass;
  if (mass !== undefined) return { formula, mass };
  const message = `The gas cell *${formula}* must give its mass, since the handbook does not know this gas.`;
  cell.say("fault", "unknown_gas", message, cell.entry("gas"));
  return undefined;
}

/** The ages between which the gas is lost, and how the rate went; undefined where an entry has a fault. */
function readSpan(cell: OpenCell): LossSpan | undefined {
  const [begin, end, now] = ["begin", "end", "now"].map((key) => readQuantityEntry(cell, key));
  const exponent = readOr(cell, "exponent", 1);
  const history = readXuvHistory(cell);
  if (begin === undefined || end === undefined) return undefined;
  if (!(end > begin)) {
    cell.say("fault", "end_before_begin", "*end* must be a greater age than *begin*.", cell.entry("end"));
    return undefined;
  }
  if (now === undefined || exponent === undefined || !history) return undefined;
  return { begin, end, now, exponent, history };
}

/** A number that acts by default where it is left out. */
function readOr(cell: OpenCell, key: string, standard: number): number | undefined {
  if (cell.entry(key)) return readQuantityEntry(cell, key);
  cell.actByDefault(key);
  return standard;
}

function readXuvHistory(cell: OpenCell): XuvHistory | undefined {
  if (!cell.entry("history")) {
    const exponent = readOr(cell, "xuv_exponent", solarXuvExponent);
    const saturationAge = readOr(cell, "saturation", 0);
    return exponent === undefined || saturationAge === undefined
      ? undefined
      : { kind: "power", exponent, saturationAge };
  }
  for (const key of ["xuv_exponent", "saturation"] as const) {
    sayIfBothStand(cell, ["history", key], "A history stands in place of the power law; keep one.");
  }
  const read = readEntry(cell, "history", (node) => readHistory(node, cell.surroundings));
  return read && { kind: "table", ...read };
}

function ageText(cell: OpenCell, age: number): string {
  return formatQuantity(age, quantityKinds.time.dimension, { unitSystem: cell.unitSystem });
}

/** A table is constant beyond its ends; the solar law rests on stars of certain ages. */
function sayWhatIsExtrapolated(cell: OpenCell, { begin, end, now, exponent, history }: LossSpan): void {
  if (exponent === 0) return;
  const first = Math.min(begin, now);
  const last = Math.max(end, now);
  if (history.kind === "table") {
    const { ages } = history;
    const [from, to] = [ages[0], ages[ages.length - 1]];
    if (first >= from && last <= to) return;
    const message = `The history goes from ${ageText(cell, from)} to ${ageText(cell, to)}; beyond its ends the light is taken as constant.`;
    cell.say("caution", "history_extrapolated", message, cell.entry("history"));
    return;
  }
  if (history.exponent !== solarXuvExponent) return;
  const { youngest, oldest } = solarXuvAges;
  const earliest = Math.max(first, history.saturationAge);
  if (earliest >= youngest && last <= oldest) return;
  const isYoung = earliest < youngest;
  const remedy = isYoung ? " Give the age of saturation." : "";
  const message = `The power law of the XUV light rests on stars like the Sun of ${ageText(cell, youngest)} to ${ageText(cell, oldest)} (Ribas et al. 2005); here it is carried beyond.${remedy}`;
  cell.say("caution", "xuv_extrapolated", message, cell.entry(isYoung ? "begin" : "end"));
}

/** Time in which the present rate would lose as much; undefined where it has no end. */
function timeOf(cell: OpenCell, span: LossSpan): number | undefined {
  try {
    return equivalentTime(span);
  } catch (error) {
    if (!(error instanceof PhysicsDomainError)) throw error;
    const { exponent, history } = span;
    const isEndless = span.begin === 0 && history.kind === "power" && history.exponent * exponent >= 1;
    const message = isEndless
      ? "From age 0 on, a power law as steep as this has lost without end. Give the age of saturation, or begin later."
      : error.message;
    cell.say("fault", "loss_without_end", message, cell.entry("begin"));
    return undefined;
  }
}

function lossValues(
  cell: OpenCell,
  { gravitationalParameter, radius }: BodyModel,
  { formula, mass }: LostGas,
  particles: number,
): CellResult["values"] {
  const values: CellResult["values"] = {
    particles: measured(particles, "1"),
    mass: measured(particles * mass, "kg"),
  };
  const water = waterPerParticle(formula);
  if (!Number.isFinite(particles)) return values;
  if (water === null) {
    const message = `No layer of water stands for ${formula}; H, H2, O and H2O have one.`;
    cell.say("remark", "no_water_layer", message, cell.entry("gas"));
  } else {
    values.water_layer = measured(waterLayerFromMolecules({ molecules: particles * water, radius }), "m");
  }
  const surfaceGravity = gravity({ gravitationalParameter, radius });
  values.surface_pressure = measured(
    surfacePressureFromParticles({ particles, particleMass: mass, gravity: surfaceGravity, radius }),
    "Pa",
  );
  return values;
}

function lightHistoryOf({ begin, now, exponent, history }: LossSpan): LightHistory {
  const isSaturated =
    history.kind === "power" && history.exponent * exponent !== 0 && history.saturationAge > begin;
  return { now, saturation: isSaturated ? history.saturationAge : null };
}

/** Rows of the history, in equal ratios of the age. */
const historyRows = 101;

function historyOf(span: LossSpan, rate: number): ResultRow[] {
  const { ages, rates, lost } = lossHistory({ ...span, rate }, historyRows);
  return Array.from(ages, (age, index) => ({ age, rate: rates[index], lost: lost[index] })).filter(
    (row) => Number.isFinite(row.rate) && Number.isFinite(row.lost),
  );
}
