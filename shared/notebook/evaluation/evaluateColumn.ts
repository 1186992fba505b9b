import {
  numberDensityFromPressure,
  PhysicsDomainError,
  pressureFromNumberDensity,
  solveColumn,
  temperatureCurve,
  type Column,
  type ColumnInput,
  type EddyProfile,
  type TemperatureProfile,
} from "../../physics";
import { checkName } from "./checkName";
import { collisionTable, describeGases, sayWhereGasesComeFrom } from "./columnGases";
import { sayWhatColumnLacks, sayWhatColumnMeans } from "./columnNotes";
import { columnProfiles, columnStrip, columnValues, levelRow } from "./columnResults";
import type { BodyModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { knownGases, readCellEntry, readEntry, readQuantityEntry, sayIfBothStand } from "./readEntries";
import { sameValue } from "./sameValue";
import { formatQuantity } from "../language/formatQuantity";
import { quantityKinds } from "../language/dimensions";
import { readEddy } from "../language/readEddy";
import { readGasList, type GasList } from "../language/readGasList";
import { readLevels } from "../language/readLevels";
import { readTemperature } from "../language/readTemperature";
import type { ResultRow } from "../result";
import type { CellAnswer } from "./cellAnswer";

export function evaluateColumn(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  const gasList = readEntry(cell, "gases", (node) => readGasList(node, knownGases(cell), cell.surroundings));
  const gases = gasList?.gases.map(({ formula }) => formula) ?? [];
  const ownDensity = gasList?.numberDensity ?? null;
  requireEntries(cell, ownDensity === null ? [] : ["number_density", "pressure"]);
  sayIfBothStand(cell, ["number_density", "pressure"], "Keep one; the other follows from it.");

  const input = readInput(cell, gasList);
  const levels = readEntry(cell, "levels", (node) => readLevels(node, cell.surroundings));
  sayWhichCentresAct(cell);
  if (!input) return { gases };

  const column = solve(cell, input.column);
  if (!column) return { gases };
  if (!cell.isDraw) sayWhatColumnMeans(cell, column, gasList!.rest);
  sayWhatColumnLacks(cell, column);
  const model = { kind: "column", column, body: input.body } as const;
  if (cell.isDraw) return { gases, values: columnValues(column), model };
  return {
    gases,
    values: columnValues(column),
    tables: levels ? { levels: tabulate(cell, column, levels) } : {},
    profiles: columnProfiles(column),
    strip: columnStrip(cell.name, column),
    model,
  };
}

/** Everything that the entries say of the column; undefined if something needed is missing or has a fault. */
function readInput(
  cell: OpenCell,
  gasList: GasList | undefined,
): { column: ColumnInput; body: BodyModel } | undefined {
  const body = readCellEntry(cell, "body");
  const base = readQuantityEntry(cell, "base");
  const temperature = readTemperatureEntry(cell, base);
  const eddy = readEddyEntry(cell);
  const top = readTop(cell, base);
  const known = gasList && describeGases(cell, gasList.gases);
  const isBaseSound = body !== undefined && base !== undefined && checkBase(cell, body, base);
  const baseTemperature =
    isBaseSound && temperature ? temperatureAtBase(cell, temperature, body, base) : undefined;
  const density = readDensity(cell, baseTemperature, gasList?.numberDensity ?? null);
  if (!isBaseSound || !temperature || !eddy || top === undefined || !known || density === undefined)
    return undefined;

  const table = collisionTable(known);
  if (!cell.isDraw)
    sayWhereGasesComeFrom(cell, cell.entry("gases")!, known, eddy.kind === "none" ? null : table);
  const column: ColumnInput = {
    gravitationalParameter: body.gravitationalParameter,
    radius: body.radius,
    centrifugal: body.centrifugal,
    baseAltitude: base,
    baseNumberDensity: density,
    gases: known.map(({ gas }) => gas),
    collisionParameters: table,
    temperature,
    eddy,
    top,
  };
  return { column, body };
}

function readTemperatureEntry(cell: OpenCell, base: number | undefined): TemperatureProfile | undefined {
  const profile = readEntry(cell, "temperature", (node) => readTemperature(node, cell.surroundings));
  if (profile?.kind !== "bates") return profile;
  if (profile.referenceAltitude === null) {
    return base === undefined ? undefined : { ...profile, referenceAltitude: base };
  }
  const { referenceAltitude } = profile;
  if (base !== undefined && base < referenceAltitude) {
    const message =
      "The column begins below the altitude that *bates* counts from; down there its temperature is an extrapolation.";
    cell.say("caution", "bates_below_reference", message, cell.entry("temperature"));
  }
  return { ...profile, referenceAltitude };
}

function readEddyEntry(cell: OpenCell): EddyProfile | undefined {
  if (cell.entry("eddy")) return readEntry(cell, "eddy", (node) => readEddy(node, cell.surroundings));
  cell.actByDefault("eddy");
  return { kind: "none" };
}

function readTop(cell: OpenCell, base: number | undefined): number | "auto" | undefined {
  const entry = cell.entry("top");
  if (!entry || (entry.node.type === "name" && entry.node.path === "auto")) return "auto";
  const top = readQuantityEntry(cell, "top");
  if (top === undefined || base === undefined || top > base) return top;
  cell.say("fault", "top_below_base", "*top* must lie above *base*.", entry);
  return undefined;
}

function checkBase(cell: OpenCell, body: BodyModel, base: number): boolean {
  const radius = body.radius + base;
  if (!(radius > 0)) {
    cell.say("fault", "base_below_centre", "*base* lies below the centre of the body.", cell.entry("base"));
    return false;
  }
  const gravity = body.gravitationalParameter / radius / radius;
  if (!Number.isFinite(gravity) || gravity === 0) return true;
  if (!cell.isDraw) cell.understand(cell.entry("base")!, `g = ${shown(cell, gravity, "acceleration")}`);
  return true;
}

function temperatureAtBase(
  cell: OpenCell,
  profile: TemperatureProfile,
  body: BodyModel,
  base: number,
): number | undefined {
  const temperature = temperatureCurve(profile, body.radius).at(base);
  if (temperature > 0 && Number.isFinite(temperature)) return temperature;
  cell.say(
    "fault",
    "temperature_at_base",
    "The temperature is not above 0 K at the base.",
    cell.entry("temperature"),
  );
  return undefined;
}

/** Total number density at the base, from whichever entry gives it. */
function readDensity(
  cell: OpenCell,
  temperature: number | undefined,
  ofGases: number | null,
): number | undefined {
  const given = readQuantityEntry(cell, "number_density");
  const pressure = readQuantityEntry(cell, "pressure");
  const entry = cell.entry("number_density") ?? cell.entry("pressure");
  if (ofGases !== null) {
    if (!entry) return ofGases;
    const message = `*${entry.key}* is already given by the number densities of the gases; keep one of the two.`;
    cell.say("fault", "both_given", message, entry.keyRange);
    return undefined;
  }
  if (given !== undefined) {
    if (temperature !== undefined && !cell.isDraw) {
      const ofDensity = pressureFromNumberDensity({ numberDensity: given, temperature });
      cell.understand(cell.entry("number_density")!, `p = ${shown(cell, ofDensity, "pressure")}`);
    }
    return given;
  }
  if (pressure === undefined || temperature === undefined || cell.entry("number_density")) return undefined;
  const density = numberDensityFromPressure({ pressure, temperature });
  if (!cell.isDraw) cell.understand(cell.entry("pressure")!, `n = ${shown(cell, density, "numberDensity")}`);
  return density;
}

function shown(cell: OpenCell, value: number, kind: keyof typeof quantityKinds): string {
  return formatQuantity(value, quantityKinds[kind].dimension, { unitSystem: cell.unitSystem, digits: 3 });
}

/** The column of the last evaluation where its input is the same to the last bit. */
function solve(cell: OpenCell, input: ColumnInput): Column | undefined {
  const last = cell.lastModel;
  if (last?.kind === "column" && sameValue(last.column.input, input)) return last.column;
  try {
    return solveColumn(input);
  } catch (error) {
    if (!(error instanceof PhysicsDomainError)) throw error;
    cell.say("fault", "impossible_column", error.message, cell.entry(entryBehind(error.quantity)));
    return undefined;
  }
}

/** The entry that a refusal of the solver speaks of. */
function entryBehind(quantity: string): string {
  if (/temperature|Bates/.test(quantity)) return "temperature";
  if (/eddy/.test(quantity)) return "eddy";
  if (/top of the column/.test(quantity)) return "top";
  if (/gases|mass of|diameter of|fraction|collision|thermal diffusion/.test(quantity)) return "gases";
  return /base/.test(quantity) ? "base" : "body";
}

function tabulate(cell: OpenCell, column: Column, levels: readonly number[]): ResultRow[] {
  const entry = cell.entry("levels")!;
  const ranges = entry.node.type === "list" ? entry.node.items.map(({ range }) => range) : [entry.valueRange];
  const { baseAltitude } = column.input;
  return levels.flatMap((altitude, index) => {
    if (altitude >= baseAltitude && altitude <= column.topAltitude) return [levelRow(column, altitude)];
    const ends = `${shown(cell, baseAltitude, "length")} to ${shown(cell, column.topAltitude, "length")}`;
    cell.say(
      "fault",
      "level_outside",
      `This altitude lies outside the column, which reaches from ${ends}.`,
      ranges[index],
    );
    return [];
  });
}
