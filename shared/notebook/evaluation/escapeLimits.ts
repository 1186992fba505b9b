/** Limits and markers beside the rates of an escape cell: what diffusion, energy and a wind would allow. */
import {
  columnCrossoverMass,
  columnDiffusionLimit,
  columnInventory,
  depletionTime,
  isothermalWind,
  PhysicsDomainError,
  supplyFraction,
  type ColumnDiffusionLimit,
  type ColumnLevel,
} from "../../physics";
import { formatPlainNumber } from "../language/formatQuantity";
import { inWords } from "../language/notes";
import type { CellResult } from "../result";
import type { ColumnModel } from "./models";
import type { OpenCell } from "./openCell";
import type { EscapeConvention } from "./readEscape";
import { carried, measured } from "./resultValue";
import type { LeavingGas } from "./solveEscape";

/** Diffusion limit, share of it, and time to empty the column, of each gas, by its formula. */
export function limitValues(
  cell: OpenCell,
  { column }: ColumnModel,
  exobase: ColumnLevel,
  leaving: readonly LeavingGas[],
  coupling: EscapeConvention["coupling"],
): Record<string, CellResult["values"]> {
  const byGas: Record<string, CellResult["values"]> = {};
  const inventories = inventoriesOf(cell, column, exobase, leaving);
  const limits = leaving.map(({ formula, index, log10Rate }) => {
    const values: CellResult["values"] = (byGas[formula] = {});
    const limit = columnDiffusionLimit(column, index, exobase.radius);
    if (limit.exists && limit.flux > 0) {
      const { share, log10Share } = supplyFraction({
        log10Rate,
        diffusionLimit: limit.flux,
        exobaseRadius: exobase.radius,
      });
      values[`${formula}.diffusion_limit`] = measured(limit.flux, "m^-2 s^-1");
      Object.assign(values, carried(`${formula}.supply_fraction`, share, log10Share, "1"));
      saySupply(cell, formula, share, coupling);
    }
    const logParticles = inventories.get(index);
    if (logParticles !== undefined) {
      const { time, log10Time } = depletionTime({ logParticles, log10Rate });
      Object.assign(values, carried(`${formula}.depletion_time`, time, log10Time, "s"));
    }
    return { formula, limit };
  });
  sayWhereLimitsAre(cell, limits);
  return byGas;
}

/** ln of the particles up to the exobase, by the place of the gas; of those whose time is asked for. */
function inventoriesOf(
  cell: OpenCell,
  column: ColumnModel["column"],
  exobase: ColumnLevel,
  leaving: readonly LeavingGas[],
): Map<number, number> {
  const indices = leaving
    .filter(({ formula }) =>
      ["depletion_time", "log10_depletion_time"].some((name) => cell.isWanted(`${formula}.${name}`)),
    )
    .map(({ index }) => index);
  if (indices.length === 0) return new Map();
  const inventories = columnInventory(column, indices, column.input.baseAltitude, exobase.altitude);
  return new Map(inventories.map(({ logParticles }, place) => [indices[place], logParticles]));
}

/** Of a coupled column its own solution says where the supply sets the rate. */
function saySupply(
  cell: OpenCell,
  formula: string,
  share: number | null,
  coupling: EscapeConvention["coupling"],
): void {
  if (coupling === "coupled" || share === null || share <= 1) return;
  const message = `${formula} leaves at ${formatPlainNumber(share, 3)} times the rate that diffusion supplies: more than the column can keep up. On an open column its rate is an upper bound; coupling = coupled reckons with the supply.`;
  cell.say("caution", "above_diffusion_limit", message, cell.entry("column"));
}

const whyNone = {
  not_lighter: "no lighter than the rest of the gas, so that diffusion does not lift it",
  held_by_thermal_diffusion: "held back by thermal diffusion where the limit is taken",
  no_other_gas: "the only gas, with nothing to diffuse through",
} as const;

function sayWhereLimitsAre(
  cell: OpenCell,
  limits: readonly { formula: string; limit: ColumnDiffusionLimit }[],
): void {
  const say = (code: string, message: string) => cell.say("remark", code, message, cell.entry("column"));
  const formulasWhere = (holds: (limit: ColumnDiffusionLimit) => boolean) =>
    limits.filter(({ limit }) => holds(limit)).map(({ formula }) => formula);

  const atBase = formulasWhere((limit) => limit.exists && !limit.isAtHomopause);
  if (atBase.length > 0) {
    const message = `The diffusion limit of ${inWords(atBase, "and")} is taken at the base of the column, for want of a homopause.`;
    say("limits_at_base", message);
  }
  for (const reason of Object.keys(whyNone) as (keyof typeof whyNone)[]) {
    const without = formulasWhere((limit) => !limit.exists && limit.reason === reason);
    if (without.length === 0) continue;
    const each = without.length > 1 ? "each " : "";
    say("no_diffusion_limit", `No diffusion limit of ${inWords(without, "and")}: ${each}${whyNone[reason]}.`);
  }
}

/** Of the gas with the largest mass rate; `leaving` are all gases of the column, in its order. */
export function crossoverValues(
  cell: OpenCell,
  { column }: ColumnModel,
  leaving: readonly LeavingGas[],
): CellResult["values"] {
  const crossover = columnCrossoverMass(
    column,
    leaving.map(({ log10Rate }) => log10Rate),
  );
  const say = (code: string, message: string) => cell.say("remark", code, message, cell.entry("column"));
  if (!crossover.exists) {
    say(
      "no_crossover_mass",
      "No crossover mass: no gas is heavier than the one that carries most mass away.",
    );
    return {};
  }
  const [light, heavy] = [crossover.light, crossover.heavy].map((index) => leaving[index].formula);
  const place = column.homopauses[crossover.light].found ? `at the homopause of ${light}` : "at the base";
  say("crossover_gases", `The crossover mass is that of ${light} flowing through ${heavy}, ${place}.`);
  return { crossover_mass: measured(crossover.mass, "kg") };
}

/** What the star's light could lift off the body, where its cell says enough. */
export function energyLimitValues({ body }: ColumnModel): CellResult["values"] {
  const limit = body.energyLimitedMassRate;
  return limit === null ? {} : { energy_limited_mass_rate: measured(limit, "kg s^-1") };
}

/** An isothermal wind from the column's base, of one temperature throughout. */
export function windValues(
  cell: OpenCell,
  { column, body }: ColumnModel,
  temperature: number,
): CellResult["values"] {
  const base = column.levelAt(column.input.baseAltitude);
  try {
    const { massRate, log10MassRate, notes } = isothermalWind({
      gravitationalParameter: body.gravitationalParameter,
      radius: base.radius,
      temperature,
      particleMass: base.meanMass,
      massDensity: base.massDensity,
    });
    for (const { level, code, message } of notes) cell.say(level, code, message, cell.entry("column"));
    return carried("wind_mass_rate", massRate, log10MassRate, "kg s^-1");
  } catch (error) {
    if (!(error instanceof PhysicsDomainError)) throw error;
    cell.say("remark", "no_wind", `No wind can be computed. ${error.message}`, cell.entry("column"));
    return {};
  }
}
