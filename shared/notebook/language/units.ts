/**
 * The units that a cell may use. Each is a whole number times a power of ten times SI, so that a quantity such as
 * `2.5e5 /cm^3` is rounded once, when its digits and the power of ten meet, and is exact where SI makes it so.
 */
import {
  astronomicalUnit,
  atomicMass,
  gravitationalConstant,
  julianYear,
  nominalEarthGravitationalParameter,
  nominalEarthRadius,
  nominalJupiterGravitationalParameter,
  nominalJupiterRadius,
  nominalSolarGravitationalParameter,
  nominalSolarRadius,
} from "../../physics";
import { dimensionless, quantityKinds, type Dimension } from "./dimensions";

export interface Unit {
  symbol: string;
  name: string;
  dimension: Dimension;
  /** SI = factor × 10^powerOfTen. */
  factor: number;
  powerOfTen: number;
}

interface UnitDefinition extends Unit {
  /** Prefixes that go with it; no entry means none. */
  prefixes: readonly Prefix[];
  /** Offered by completion: with these prefixes ("" for none). */
  offered: readonly string[];
}

interface Prefix {
  symbol: string;
  name: string;
  powerOfTen: number;
}

/** SI Brochure, 9th edition (2019), table 7. Those of 2022 are left out: no magnitude here needs them. */
const siPrefixes: readonly Prefix[] = [
  { symbol: "Y", name: "yotta", powerOfTen: 24 },
  { symbol: "Z", name: "zetta", powerOfTen: 21 },
  { symbol: "E", name: "exa", powerOfTen: 18 },
  { symbol: "P", name: "peta", powerOfTen: 15 },
  { symbol: "T", name: "tera", powerOfTen: 12 },
  { symbol: "G", name: "giga", powerOfTen: 9 },
  { symbol: "M", name: "mega", powerOfTen: 6 },
  { symbol: "k", name: "kilo", powerOfTen: 3 },
  { symbol: "h", name: "hecto", powerOfTen: 2 },
  { symbol: "da", name: "deca", powerOfTen: 1 },
  { symbol: "d", name: "deci", powerOfTen: -1 },
  { symbol: "c", name: "centi", powerOfTen: -2 },
  { symbol: "m", name: "milli", powerOfTen: -3 },
  { symbol: "u", name: "micro", powerOfTen: -6 },
  { symbol: "µ", name: "micro", powerOfTen: -6 },
  { symbol: "μ", name: "micro", powerOfTen: -6 },
  { symbol: "n", name: "nano", powerOfTen: -9 },
  { symbol: "p", name: "pico", powerOfTen: -12 },
  { symbol: "f", name: "femto", powerOfTen: -15 },
  { symbol: "a", name: "atto", powerOfTen: -18 },
  { symbol: "z", name: "zepto", powerOfTen: -21 },
  { symbol: "y", name: "yocto", powerOfTen: -24 },
];

const only = (...symbols: string[]): readonly Prefix[] =>
  siPrefixes.filter((prefix) => symbols.includes(prefix.symbol));

function unit(
  symbol: string,
  name: string,
  dimension: Dimension,
  [factor, powerOfTen]: readonly [number, number],
  prefixes: readonly Prefix[] = [],
  offered: readonly string[] = [""],
): UnitDefinition {
  return { symbol, name, dimension, factor, powerOfTen, prefixes, offered };
}

const one = [1, 0] as const;
const kinds = quantityKinds;

/** Nominal masses are nominal GM over G, so that GM comes back exactly as the IAU states it. */
const massOf = (gravitationalParameter: number): readonly [number, number] => [
  gravitationalParameter / gravitationalConstant.value,
  0,
];

/** Sources: SI Brochure, 9th edition; CODATA 2022; IAU 2012 resolution B2 (au) and 2015 resolution B3 (nominal). */
const definitions: readonly UnitDefinition[] = [
  unit("m", "metre", kinds.length.dimension, one, siPrefixes, ["", "c", "k"]),
  unit("angstrom", "ångström", kinds.length.dimension, [1, -10]),
  unit("au", "astronomical unit", kinds.length.dimension, [astronomicalUnit.value, 0]),
  unit("earth_radius", "nominal Earth radius", kinds.length.dimension, [nominalEarthRadius.value, 0]),
  unit("jupiter_radius", "nominal Jupiter radius", kinds.length.dimension, [nominalJupiterRadius.value, 0]),
  unit("solar_radius", "nominal solar radius", kinds.length.dimension, [nominalSolarRadius.value, 0]),
  unit("g", "gram", kinds.mass.dimension, [1, -3], siPrefixes, ["", "k"]),
  unit("u", "dalton", kinds.mass.dimension, [Math.round(atomicMass.value * 1e38), -38]),
  unit(
    "earth_mass",
    "nominal Earth mass",
    kinds.mass.dimension,
    massOf(nominalEarthGravitationalParameter.value),
  ),
  unit(
    "jupiter_mass",
    "nominal Jupiter mass",
    kinds.mass.dimension,
    massOf(nominalJupiterGravitationalParameter.value),
  ),
  unit(
    "solar_mass",
    "nominal solar mass",
    kinds.mass.dimension,
    massOf(nominalSolarGravitationalParameter.value),
  ),
  unit("s", "second", kinds.time.dimension, one, siPrefixes),
  unit("min", "minute", kinds.time.dimension, [60, 0]),
  unit("h", "hour", kinds.time.dimension, [3600, 0]),
  unit("day", "day of 86,400 s", kinds.time.dimension, [86_400, 0]),
  unit("yr", "Julian year", kinds.time.dimension, [julianYear.value, 0], only("M", "G"), ["", "M", "G"]),
  unit("K", "kelvin", kinds.temperature.dimension, one, siPrefixes),
  unit("mol", "mole", kinds.amount.dimension, one, siPrefixes),
  unit("A", "ampere", kinds.current.dimension, one, siPrefixes),
  unit("deg", "degree", dimensionless, [Math.PI / 180, 0]),
  unit("rad", "radian", dimensionless, one, only("m", "u", "µ", "μ")),
  unit("%", "percent", dimensionless, [1, -2]),
  unit("ppm", "part per million", dimensionless, [1, -6]),
  unit("Hz", "hertz", kinds.frequency.dimension, one, siPrefixes),
  unit("N", "newton", kinds.force.dimension, one, siPrefixes),
  unit("Pa", "pascal", kinds.pressure.dimension, one, siPrefixes, ["", "h"]),
  unit("bar", "bar", kinds.pressure.dimension, [1, 5], only("m", "u", "µ", "μ", "n"), ["", "m", "u"]),
  unit("J", "joule", kinds.energy.dimension, one, siPrefixes),
  unit("erg", "erg", kinds.energy.dimension, [1, -7]),
  unit("eV", "electronvolt", kinds.energy.dimension, [1_602_176_634, -28], siPrefixes),
  unit("W", "watt", kinds.power.dimension, one, siPrefixes, ["", "m"]),
  unit("T", "tesla", kinds.magneticField.dimension, one, siPrefixes, ["n"]),
];

/** T is how everyone calls a temperature, so it stays free for names; after a number it is the tesla. */
const free = new Set(["T"]);

function withPrefix(definition: UnitDefinition, prefix: Prefix): Unit {
  return {
    symbol: `${prefix.symbol}${definition.symbol}`,
    name: `${prefix.name}${definition.name}`,
    dimension: definition.dimension,
    factor: definition.factor,
    powerOfTen: definition.powerOfTen + prefix.powerOfTen,
  };
}

function allUnits(): Map<string, Unit> {
  const table = new Map<string, Unit>();
  for (const definition of definitions)
    for (const prefix of definition.prefixes)
      table.set(`${prefix.symbol}${definition.symbol}`, withPrefix(definition, prefix));
  // A unit of its own goes before a prefixed one: `min` is the minute, `Pa` the pascal.
  for (const { symbol, name, dimension, factor, powerOfTen } of definitions)
    table.set(symbol, { symbol, name, dimension, factor, powerOfTen });
  table.set("Å", { ...table.get("angstrom")!, symbol: "Å" });
  return table;
}

const units = allUnits();

export const findUnit = (symbol: string): Unit | undefined => units.get(symbol);

/** Whether the word is a unit and so can't be a name. */
export const isReservedUnit = (word: string): boolean => units.has(word) && !free.has(word);

/** Common units without unusual prefixes, for completion and for the nearest right one. */
export const unitsForCompletion: readonly { unit: string; name: string; dimension: Dimension }[] =
  definitions.flatMap((definition) =>
    definition.offered.map((prefix) => {
      const { symbol, name, dimension } = units.get(`${prefix}${definition.symbol}`)!;
      return { unit: symbol, name, dimension };
    }),
  );

interface ForeignUnit {
  /** Why it is not a unit here, or what it is. */
  message: string;
  /** What may stand in its place without a change of the number. */
  replacement?: string;
}

const sameAs = (replacement: string): ForeignUnit => ({
  message: `It is written *${replacement}* here.`,
  replacement,
});
const offset: ForeignUnit = {
  message: "It counts from a zero of its own; temperatures are in kelvin.",
};

/** Units that people write, and what to write instead. */
const foreignUnits: ReadonlyMap<string, ForeignUnit> = new Map(
  Object.entries({
    "°C": offset,
    "℃": offset,
    C: offset,
    degC: offset,
    celsius: offset,
    Celsius: offset,
    "°F": {
      message: "Temperatures are in kelvin; a scale with its own zero can't be multiplied. Write K.",
    },
    "°": sameAs("deg"),
    degree: sameAs("deg"),
    degrees: sameAs("deg"),
    "°K": sameAs("K"),
    degK: sameAs("K"),
    Kelvin: sameAs("K"),
    kelvin: sameAs("K"),
    k: sameAs("K"),
    sec: sameAs("s"),
    second: sameAs("s"),
    seconds: sameAs("s"),
    mins: sameAs("min"),
    minute: sameAs("min"),
    minutes: sameAs("min"),
    hr: sameAs("h"),
    hrs: sameAs("h"),
    hour: sameAs("h"),
    hours: sameAs("h"),
    d: sameAs("day"),
    days: sameAs("day"),
    year: sameAs("yr"),
    years: sameAs("yr"),
    yrs: sameAs("yr"),
    Ma: sameAs("Myr"),
    Ga: sameAs("Gyr"),
    Da: sameAs("u"),
    amu: sameAs("u"),
    dalton: sameAs("u"),
    AU: sameAs("au"),
    angstroms: sameAs("angstrom"),
    Angstrom: sameAs("angstrom"),
    micron: sameAs("um"),
    meter: sameAs("m"),
    metre: sameAs("m"),
    meters: sameAs("m"),
    metres: sameAs("m"),
    KM: sameAs("km"),
    Km: sameAs("km"),
    kms: sameAs("km"),
    cc: sameAs("cm^3"),
    gram: sameAs("g"),
    grams: sameAs("g"),
    Kg: sameAs("kg"),
    KG: sameAs("kg"),
    pa: sameAs("Pa"),
    PA: sameAs("Pa"),
    mb: sameAs("mbar"),
    ev: sameAs("eV"),
    EV: sameAs("eV"),
    percent: sameAs("%"),
    nt: sameAs("nT"),
    Rearth: sameAs("earth_radius"),
    Mearth: sameAs("earth_mass"),
    Rjup: sameAs("jupiter_radius"),
    Mjup: sameAs("jupiter_mass"),
    Rsun: sameAs("solar_radius"),
    Msun: sameAs("solar_mass"),
    ppb: { message: "1 ppb is 1e-3 ppm." },
    "‰": { message: "1 ‰ is 0.1 %." },
    atm: { message: "1 atm is 101325 Pa." },
    torr: { message: "1 torr is 133.322 Pa." },
    Torr: { message: "1 torr is 133.322 Pa." },
    mmHg: { message: "1 mmHg is 133.322 Pa." },
    G: { message: "*G* is the constant of gravitation. A gauss is 1e5 nT." },
    gauss: { message: "1 gauss is 1e5 nT." },
    pc: { message: "1 pc is 206264.8 au." },
    mile: { message: "1 mile is 1.609344 km." },
    miles: { message: "1 mile is 1.609344 km." },
    ft: { message: "1 ft is 0.3048 m." },
    cal: { message: "1 cal is 4.184 J." },
    amagat: { message: "1 amagat is 2.6868e19 /cm^3." },
  }),
);

export const findForeignUnit = (symbol: string): ForeignUnit | undefined => foreignUnits.get(symbol);

/** A temperature scale with a zero of its own. */
export const isCelsius = (symbol: string): boolean => foreignUnits.get(symbol) === offset;
