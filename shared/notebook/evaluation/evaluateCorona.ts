import {
  coronaDensity,
  coronaShareAtExobase,
  escapeParameter,
  limbColumn,
  overheadColumn,
  powerOfTen,
  type Corona,
} from "../../physics";
import { checkName } from "./checkName";
import type { CellAnswer } from "./cellAnswer";
import type { EscapeModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { readCellEntry, readEntry, readQuantityEntry } from "./readEntries";
import { measured } from "./resultValue";
import { quantityKinds } from "../language/dimensions";
import { formatPlainNumber, formatQuantity } from "../language/formatQuantity";
import { readGasName } from "../language/readGasName";
import { readLevels } from "../language/readLevels";
import type { CoronaBeginning, ResultRow } from "../result";

export function evaluateCorona(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  const escape = readCellEntry(cell, "escape");
  const gas = escape && readGas(cell, escape);
  const satellites = cell.entry("satellites") ? readQuantityEntry(cell, "satellites") : 0;
  if (!cell.entry("satellites")) cell.actByDefault("satellites");
  const reach = escape && readReach(cell, escape);
  const levels = readEntry(cell, "levels", (node) => readLevels(node, cell.surroundings));
  sayWhichCentresAct(cell);
  if (!escape || gas === undefined || satellites === undefined || reach === undefined) return {};

  const place = coronaOf(escape, gas, satellites, reach);
  sayStep(cell, place.corona, gas);
  sayIfBeyondHillRadius(cell, place, levels ?? []);
  const density = escape.exobase.numberDensities[place.index];
  const values = { "exobase.number_density": measured(density === 0 ? null : density, "m^-3") };
  if (cell.isDraw) return { gases: [gas], values };
  return {
    gases: [gas],
    values,
    tables: {
      ...(levels ? { levels: tabulate(cell, place, levels) } : {}),
      lines_of_sight: linesOfSight(place),
    },
    profiles: profilesOf(place),
    corona: beginningOf(place.corona),
  };
}

/** A corona over a body, with what its altitudes count from. */
interface CoronaPlace {
  corona: Corona;
  /** Of the gas in its column. */
  index: number;
  bodyRadius: number;
  hillRadius: number | null;
  exobaseAltitude: number;
}

function readGas(cell: OpenCell, { source }: EscapeModel): string | undefined {
  const all = source.column.input.gases.map(({ formula }) => formula);
  return readEntry(cell, "gas", (node) => readGasName(node, all));
}

/** Default: so many radii of the body. */
const defaultReach = 10;

/** Altitude; undefined where it does not lie above the exobase. */
function readReach(cell: OpenCell, { source, exobase }: EscapeModel): number | undefined {
  const entry = cell.entry("reach");
  const reach = entry ? readQuantityEntry(cell, "reach") : defaultReach * source.body.radius;
  if (reach === undefined) return undefined;
  if (!entry) cell.actByDefault("reach", { text: `reach = ${kilometres(cell, reach)}` });
  if (reach > exobase.altitude) return reach;
  const message = `*reach* must lie above the exobase, which is at ${kilometres(cell, exobase.altitude)}.`;
  cell.say("fault", "reach_below_exobase", message, entry ?? cell.entry("escape"));
  return undefined;
}

function kilometres(cell: OpenCell, altitude: number): string {
  return formatQuantity(altitude, quantityKinds.length.dimension, { unitSystem: cell.unitSystem });
}

function coronaOf(
  { source, exobase }: EscapeModel,
  gas: string,
  satelliteFraction: number,
  reach: number,
): CoronaPlace {
  const { body, column } = source;
  const index = column.input.gases.findIndex(({ formula }) => formula === gas);
  const exobaseEscapeParameter = escapeParameter({
    gravitationalParameter: body.gravitationalParameter,
    temperature: exobase.temperature,
    radius: exobase.radius,
    particleMass: column.input.gases[index].mass,
  });
  const corona: Corona = {
    exobaseRadius: exobase.radius,
    exobaseEscapeParameter,
    logExobaseNumberDensity: exobase.logNumberDensities[index],
    satelliteFraction,
    reach: body.radius + reach,
  };
  const { radius: bodyRadius, hillRadius } = body;
  return { corona, index, bodyRadius, hillRadius, exobaseAltitude: exobase.altitude };
}

function sayStep(cell: OpenCell, { exobaseEscapeParameter }: Corona, gas: string): void {
  const share = formatPlainNumber(coronaShareAtExobase(exobaseEscapeParameter), 4);
  const lambda = formatPlainNumber(exobaseEscapeParameter, 4);
  const message = `At the exobase, where the escape parameter of ${gas} is ${lambda}, ballistic and escaping particles together are ${share} of the column's density, ½[1 + P(3/2, λ)]: what would come down from above and has never left below is missing.`;
  cell.say("remark", "corona_step", message, cell.entry("escape"));
}

function sayIfBeyondHillRadius(
  cell: OpenCell,
  { corona, bodyRadius, hillRadius }: CoronaPlace,
  levels: readonly number[],
): void {
  if (hillRadius === null) return;
  const isReachBeyond = corona.reach > hillRadius;
  if (!isReachBeyond && !levels.some((altitude) => bodyRadius + altitude > hillRadius)) return;
  const message = `The corona is followed beyond the Hill radius, ${kilometres(cell, hillRadius)} from the centre: out there the star's tide, which is left out here, shapes it. Trust it well inside only.`;
  const entry = isReachBeyond ? (cell.entry("reach") ?? cell.entry("escape")) : cell.entry("levels");
  cell.say("caution", "corona_beyond_hill_radius", message, entry);
}

function tabulate(cell: OpenCell, place: CoronaPlace, levels: readonly number[]): ResultRow[] {
  const { corona, bodyRadius, exobaseAltitude } = place;
  const entry = cell.entry("levels")!;
  const ranges = entry.node.type === "list" ? entry.node.items.map(({ range }) => range) : [entry.valueRange];
  return levels.flatMap((altitude, index) => {
    if (altitude >= exobaseAltitude) {
      const radius = Math.max(bodyRadius + altitude, corona.exobaseRadius);
      const density = coronaDensity(corona, radius);
      const { numberDensity, ballistic, satellite, escaping } = density;
      return [
        {
          radius,
          altitude,
          number_density: numberDensity,
          ballistic,
          satellite,
          escaping,
          limb_column: limbColumn(corona, radius).column,
          overhead_column: overheadColumn(corona, radius).column,
        },
      ];
    }
    const message = `This altitude lies below the exobase, at ${kilometres(cell, exobaseAltitude)}; the column cell answers there.`;
    cell.say("fault", "level_below_exobase", message, ranges[index]);
    return [];
  });
}

/** Levels of the profiles, evenly spaced in the potential: dense where the gas falls off fast. */
const profileLevels = 161;

/** Radius and altitude at a share of the way in the potential, from the exobase to the reach. */
function placeAt({ corona, bodyRadius, exobaseAltitude }: CoronaPlace, share: number) {
  const { exobaseRadius, reach } = corona;
  if (share === 0) return { radius: exobaseRadius, altitude: exobaseAltitude };
  const inside = exobaseRadius / (1 - share * (1 - exobaseRadius / reach));
  const radius = share === 1 ? reach : Math.min(inside, reach);
  return { radius, altitude: radius - bodyRadius };
}

/** A column takes hundreds of densities; evenly spaced in the potential its logarithm runs almost straight. */
const sightLines = 9;

/** Columns along the limb and overhead, from the exobase to the reach. */
function linesOfSight(place: CoronaPlace): ResultRow[] {
  const { corona } = place;
  return Array.from({ length: sightLines }, (_, i) => {
    const { radius, altitude } = placeAt(place, i / (sightLines - 1));
    return {
      altitude,
      limb_column: limbColumn(corona, radius).column,
      overhead_column: overheadColumn(corona, radius).column,
    };
  });
}

function beginningOf({ satelliteFraction, exobaseEscapeParameter }: Corona): CoronaBeginning {
  return {
    satellites: satelliteFraction,
    escapeParameter: exobaseEscapeParameter,
    share: coronaShareAtExobase(exobaseEscapeParameter),
  };
}

function profilesOf(place: CoronaPlace): Record<string, number[]> {
  const profiles: Record<string, number[]> = {
    altitude: [],
    number_density: [],
    ballistic: [],
    satellite: [],
    escaping: [],
  };
  for (let i = 0; i < profileLevels; i += 1) {
    const { radius, altitude } = placeAt(place, i / (profileLevels - 1));
    const density = coronaDensity(place.corona, radius);
    profiles.altitude.push(altitude);
    profiles.number_density.push(powerOfTen(density.log10NumberDensity));
    profiles.ballistic.push(powerOfTen(density.log10Ballistic));
    profiles.satellite.push(density.log10Satellite === null ? 0 : powerOfTen(density.log10Satellite));
    profiles.escaping.push(powerOfTen(density.log10Escaping));
  }
  return profiles;
}
