import {
  electronMass,
  elementaryCharge,
  escapingFragments,
  findGas,
  findRecombiningIon,
  handbookGases,
  pickupEnergy,
  pickupGyroradius,
  recombinationEscape,
  recombiningIons,
  type ChannelAnswer,
  type Ionosphere,
  type RecombiningIon,
} from "../../physics";
import { checkName } from "./checkName";
import type { CellAnswer } from "./cellAnswer";
import type { EscapeModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { readCellEntry, readEntry, readQuantityEntry, understandConstant } from "./readEntries";
import { measured } from "./resultValue";
import { shortCitation } from "./shortCitation";
import { quantityKinds, type QuantityName } from "../language/dimensions";
import { formatPlainNumber, formatQuantity, thinSpace } from "../language/formatQuantity";
import { inWords } from "../language/notes";
import { readIon } from "../language/readIon";
import { readSamples, type Samples } from "../language/readSamples";
import type { CellResult, ResultRow } from "../result";

const profileKeys = ["ion_density", "electron_density", "electron_temperature"] as const;
type ProfileKey = (typeof profileKeys)[number];
type Profiles = Record<ProfileKey, Samples>;

export function evaluateNonthermal(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  const ion = readIonEntry(cell);
  const recombining = ion === undefined ? undefined : findRecombiningIon(ion);
  const isAtomic = ion !== undefined && !recombining;
  requireEntries(cell, isAtomic ? profileKeys : []);
  const escape = readCellEntry(cell, "escape");
  const profiles = readProfiles(cell);
  const flowSpeed = readQuantityEntry(cell, "flow_speed");
  const magneticField = readQuantityEntry(cell, "magnetic_field");
  sayWhichCentresAct(cell);
  if (ion === undefined) return {};

  const recombination = escape && recombining ? answerRecombination(cell, escape, recombining, profiles) : {};
  if (isAtomic) sayWithoutRecombination(cell, ion);
  const values = { ...recombination.values, ...pickupValues(cell, ion, flowSpeed, magneticField) };
  return { values, tables: recombination.tables ?? {}, ion };
}

function readIonEntry(cell: OpenCell): string | undefined {
  const ions = [
    ...recombiningIons.map(({ formula }) => formula),
    ...handbookGases.map(({ formula }) => `${formula}+`),
  ];
  return readEntry(cell, "ion", (node) => readIon(node, [...new Set(ions)]));
}

const profileWords: Readonly<Record<ProfileKey, { kind: QuantityName; name: string; example: string }>> = {
  ion_density: { kind: "numberDensity", name: "an ion density", example: "200 km: 8e3 /cm^3" },
  electron_density: { kind: "numberDensity", name: "an electron density", example: "200 km: 1e4 /cm^3" },
  electron_temperature: { kind: "temperature", name: "an electron temperature", example: "200 km: 1200 K" },
};

function readProfiles(cell: OpenCell): Profiles | undefined {
  const read = profileKeys.map((key) => {
    const samples = readEntry(cell, key, (node) => readSamples(node, profileWords[key], cell.surroundings));
    if (samples?.kind === "constant") understandConstant(cell, key);
    return [key, samples] as const;
  });
  if (read.some(([, samples]) => samples === undefined)) return undefined;
  return Object.fromEntries(read) as Profiles;
}

/** Channels of the ion at the exobase, and the rate where the profiles suffice. */
function answerRecombination(
  cell: OpenCell,
  escape: EscapeModel,
  ion: RecombiningIon,
  profiles: Profiles | undefined,
): Pick<CellAnswer, "values" | "tables"> {
  const { source } = escape;
  const place = {
    ion,
    gravitationalParameter: source.body.gravitationalParameter,
    exobaseRadius: escape.exobase.radius,
  };
  const { channels } = escapingFragments(place);
  const tables = { channels: channels.map(channelRow), fragments: channels.flatMap(fragmentRows) };
  sayWhatIsNeeded(cell, channels);
  sayWhereChannelsComeFrom(cell, ion);
  if (!profiles) return { tables };

  const ionosphere = ionosphereOf(cell, escape, profiles);
  if (!ionosphere) return { tables };
  const { rate, notes, from, to } = recombinationEscape({ ...place, ionosphere });
  sayIfTemperatureEnds(cell, profiles.electron_temperature, { from, to, radius: source.body.radius });
  for (const { level, code, message } of notes) {
    if (code !== "branching_unknown") cell.say(level, code, message, cell.entry("ion_density"));
  }
  if (rate !== null) return { tables, values: { [`${ion.formula}.escape_rate`]: measured(rate, "s^-1") } };
  const message = `The handbook has no branching for the channels of ${ion.formula}, so that its escape rate is left out; the energies stand.`;
  cell.say("caution", "branching_unknown", message, cell.entry("ion"));
  return { tables };
}

/** `escapes` counts the fragments of the two that can leave. */
function channelRow(channel: ChannelAnswer): ResultRow {
  const { energy, branching, escaping } = channel;
  return { products: productsOf(channel), energy, branching, escapes: escaping };
}

const fragmentName = ({ formula, state }: ChannelAnswer["fragments"][number]) => `${formula}(${state})`;

const productsOf = ({ fragments }: ChannelAnswer): string => fragments.map(fragmentName).join(" + ");

/** What each of the two gets, and what it needs to leave. */
function fragmentRows(channel: ChannelAnswer): ResultRow[] {
  return channel.fragments.map((fragment) => ({
    products: productsOf(channel),
    fragment: fragmentName(fragment),
    energy: fragment.energy,
    escape_energy: fragment.escapeEnergy,
  }));
}

const electronvolts = (energy: number): string =>
  `${formatPlainNumber(energy / elementaryCharge.value, 4)}${thinSpace}eV`;

function sayWhatIsNeeded(cell: OpenCell, channels: readonly ChannelAnswer[]): void {
  const fragments = channels.flatMap((channel) => channel.fragments);
  const formulas = [...new Set(fragments.map(({ formula }) => formula))];
  const each = formulas.map((formula) => {
    const own = fragments.filter((fragment) => fragment.formula === formula);
    const fastest = Math.max(...own.map(({ energy }) => energy));
    return `${formula} needs ${electronvolts(own[0].escapeEnergy)} and gets ${electronvolts(fastest)} at most`;
  });
  cell.say(
    "remark",
    "escape_energy",
    `To leave from the exobase, ${inWords(each, "and")}.`,
    cell.entry("ion"),
  );
}

function sayWhereChannelsComeFrom(cell: OpenCell, { formula, rate, channels }: RecombiningIon): void {
  const all = [
    rate.provenance,
    ...channels.flatMap(({ provenance }) =>
      provenance.branching ? [provenance.energy, provenance.branching] : [provenance.energy],
    ),
  ];
  const sources = [...new Set(all.map(({ source }) => shortCitation(source)))];
  const memory = all.some(({ mark }) => mark === "from memory")
    ? " Some of these numbers are from memory."
    : "";
  const message = `Recombination of ${formula} is that of the handbook: ${sources.join("; ")}.${memory}`;
  cell.say("remark", "handbook_recombination", message, cell.entry("ion"));
}

/** Profiles against radius; undefined, with a fault, where they do not reach above the exobase. */
function ionosphereOf(
  cell: OpenCell,
  { source, exobase }: EscapeModel,
  profiles: Profiles,
): Ionosphere | undefined {
  const { radius } = source.body;
  const top = source.column.topAltitude;
  const sampled = (samples: Samples): { altitudes: Float64Array; values: Float64Array } =>
    samples.kind === "points"
      ? samples
      : {
          altitudes: Float64Array.of(exobase.altitude, top),
          values: Float64Array.of(samples.value, samples.value),
        };
  const tooLow = (["ion_density", "electron_density"] as const).filter((key) => {
    const { altitudes } = sampled(profiles[key]);
    return !(altitudes[altitudes.length - 1] > exobase.altitude);
  });
  const shown = (altitude: number) =>
    formatQuantity(altitude, quantityKinds.length.dimension, { unitSystem: cell.unitSystem });
  for (const key of tooLow) {
    const message = `*${key}* must reach above the exobase, which is at ${shown(exobase.altitude)}.`;
    cell.say("fault", "profile_below_exobase", message, cell.entry(key));
  }
  if (tooLow.length > 0) return undefined;
  sayWhereConstantsEnd(cell, profiles, shown(top));

  const [ions, electrons, temperatures] = profileKeys.map((key) => sampled(profiles[key]));
  const radii = ({ altitudes }: { altitudes: Float64Array }) =>
    altitudes.map((altitude) => radius + altitude);
  return {
    ions: { radii: radii(ions), numberDensities: ions.values },
    electrons: {
      radii: radii(electrons),
      numberDensities: electrons.values,
      temperatures: temperatures.values,
      temperatureRadii: radii(temperatures),
    },
  };
}

/** A density that is one value goes on to the top of the column, where that is not cut short by the other's points. */
function sayWhereConstantsEnd(cell: OpenCell, profiles: Profiles, top: string): void {
  const densities = ["ion_density", "electron_density"] as const;
  if (densities.some((key) => profiles[key].kind === "points")) return;
  const message = `Both densities are one value each, and act up to the top of the column, ${top}: the rate goes with that height. Give points for a rate to be trusted.`;
  cell.say("caution", "constant_to_top", message, cell.entry("ion_density"));
}

/** Beyond its points a temperature is constant. */
function sayIfTemperatureEnds(
  cell: OpenCell,
  temperature: Samples,
  { from, to, radius }: { from: number; to: number; radius: number },
): void {
  if (temperature.kind === "constant") return;
  const { altitudes } = temperature;
  const last = altitudes[altitudes.length - 1];
  if (radius + altitudes[0] <= from && radius + last >= to) return;
  const shown = (altitude: number) =>
    formatQuantity(altitude, quantityKinds.length.dimension, { unitSystem: cell.unitSystem });
  const message = `The electron temperature is given from ${shown(altitudes[0])} to ${shown(last)}; beyond, up to ${shown(to - radius)}, it is taken as constant.`;
  cell.say("caution", "temperature_extrapolated", message, cell.entry("electron_temperature"));
}

function sayWithoutRecombination(cell: OpenCell, ion: string): void {
  const known = inWords(
    recombiningIons.map(({ formula }) => formula),
    "and",
  );
  const message = `The handbook has no recombination of ${ion} into fast atoms, only of ${known}; what the wind makes of it is given.`;
  cell.say("remark", "no_recombination", message, cell.entry("ion"));
}

/** Of a singly charged ion born at rest in the wind. */
function pickupValues(
  cell: OpenCell,
  ion: string,
  flowSpeed: number | undefined,
  magneticField: number | undefined,
): CellResult["values"] {
  const gas = findGas(ion.replace(/\+$/, ""));
  const field = cell.entry("magnetic_field");
  if (field && !cell.entry("flow_speed")) {
    cell.say("remark", "pickup_incomplete", "*magnetic_field* acts only together with *flow_speed*.", field);
  }
  if (!gas || flowSpeed === undefined) return {};
  const mass = gas.mass - electronMass.value;
  const charge = elementaryCharge.value;
  return {
    ...(magneticField === undefined
      ? {}
      : {
          [`${ion}.gyroradius`]: measured(pickupGyroradius({ mass, charge, flowSpeed, magneticField }), "m"),
        }),
    [`${ion}.pickup_energy`]: measured(pickupEnergy({ mass, flowSpeed }), "J"),
  };
}
