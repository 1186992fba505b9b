import { gravitationalConstant } from "../constants/codata2022";
import { astronomicalUnit, nominalSolarGravitationalParameter } from "../constants/iau";
import type { Provenance } from "./provenance";

/** A body as the handbook knows it. SI. */
export interface HandbookBody {
  name: string;
  kind: "planet" | "dwarf planet" | "moon";
  /** GM, m³ s⁻². */
  gravitationalParameter: number;
  /** Mean radius, m; of the giant planets at a pressure of 1 bar. */
  radius: number;
  /** m */
  equatorialRadius?: number;
  /** Sidereal, s; negative where the body turns backwards. */
  rotationPeriod?: number;
  /** Semi-major axis of the orbit about the star, m. */
  starDistance?: number;
  /** kg */
  starMass?: number;
  /** The planet that a moon goes round, and the semi-major axis of that orbit, m. */
  primary?: { name: string; distance: number };
  sources: Partial<Record<Exclude<keyof HandbookBody, "name" | "kind" | "sources">, Provenance>>;
}

interface BodyRow {
  name: string;
  kind: HandbookBody["kind"];
  gravitationalParameter: number;
  radius: number;
  equatorialRadius?: number;
  rotationHours?: number;
  rotationDays?: number;
  starDistanceAu?: number;
  primary?: { name: string; distance: number };
}

const rows: readonly BodyRow[] = [
  {
    name: "Mercury",
    kind: "planet",
    gravitationalParameter: 22031868551400.004,
    radius: 2439400,
    equatorialRadius: 2439700,
    rotationHours: 1407.6,
    starDistanceAu: 0.38709927,
  },
  {
    name: "Venus",
    kind: "planet",
    gravitationalParameter: 324858592000000,
    radius: 6051800,
    equatorialRadius: 6051800,
    rotationHours: -5832.6,
    starDistanceAu: 0.72333566,
  },
  {
    name: "Earth",
    kind: "planet",
    gravitationalParameter: 398600435507022.7,
    radius: 6371008.4,
    equatorialRadius: 6378136.6,
    rotationHours: 23.9345,
    starDistanceAu: 1.00000261,
  },
  {
    name: "Moon",
    kind: "moon",
    gravitationalParameter: 4902800118457.55,
    radius: 1737400,
    equatorialRadius: 1737400,
    rotationDays: 27.321661,
    primary: { name: "Earth", distance: 384400000 },
  },
  {
    name: "Mars",
    kind: "planet",
    gravitationalParameter: 42828373620699.09,
    radius: 3389500,
    equatorialRadius: 3396190,
    rotationHours: 24.6229,
    starDistanceAu: 1.52371034,
  },
  { name: "Ceres", kind: "dwarf planet", gravitationalParameter: 62628886440, radius: 469700 },
  {
    name: "Jupiter",
    kind: "planet",
    gravitationalParameter: 1.266865319003704e17,
    radius: 69911000,
    equatorialRadius: 71492000,
    rotationHours: 9.925,
    starDistanceAu: 5.202887,
  },
  {
    name: "Io",
    kind: "moon",
    gravitationalParameter: 5959915466180.539,
    radius: 1821490,
    rotationDays: 1.769138,
    primary: { name: "Jupiter", distance: 421800000 },
  },
  {
    name: "Europa",
    kind: "moon",
    gravitationalParameter: 3202712099607.295,
    radius: 1560800,
    rotationDays: 3.551181,
    primary: { name: "Jupiter", distance: 671100000 },
  },
  {
    name: "Ganymede",
    kind: "moon",
    gravitationalParameter: 9887832752719.639,
    radius: 2631200,
    equatorialRadius: 2631200,
    rotationDays: 7.154553,
    primary: { name: "Jupiter", distance: 1070400000 },
  },
  {
    name: "Callisto",
    kind: "moon",
    gravitationalParameter: 7179283402579.837,
    radius: 2410300,
    equatorialRadius: 2410300,
    rotationDays: 16.689017,
    primary: { name: "Jupiter", distance: 1882700000 },
  },
  {
    name: "Saturn",
    kind: "planet",
    gravitationalParameter: 3.793120623436167e16,
    radius: 58232000,
    equatorialRadius: 60268000,
    rotationHours: 10.656,
    starDistanceAu: 9.53667594,
  },
  {
    name: "Enceladus",
    kind: "moon",
    gravitationalParameter: 7210366688.598896,
    radius: 252100,
    rotationDays: 1.370218,
    primary: { name: "Saturn", distance: 238042000 },
  },
  {
    name: "Titan",
    kind: "moon",
    gravitationalParameter: 8978137095521.047,
    radius: 2574730,
    rotationDays: 15.945421,
    primary: { name: "Saturn", distance: 1221870000 },
  },
  {
    name: "Uranus",
    kind: "planet",
    gravitationalParameter: 5793950610340896,
    radius: 25362000,
    equatorialRadius: 25559000,
    rotationHours: -17.24,
    starDistanceAu: 19.18916464,
  },
  {
    name: "Neptune",
    kind: "planet",
    gravitationalParameter: 6835103145462294,
    radius: 24622000,
    equatorialRadius: 24764000,
    rotationHours: 16.11,
    starDistanceAu: 30.06992276,
  },
  {
    name: "Triton",
    kind: "moon",
    gravitationalParameter: 1428495462910.464,
    radius: 1353400,
    rotationDays: -5.876854,
    primary: { name: "Neptune", distance: 354759000 },
  },
  {
    name: "Pluto",
    kind: "dwarf planet",
    gravitationalParameter: 869326122631.1508,
    radius: 1188300,
    equatorialRadius: 1188300,
    rotationHours: -153.2928,
    starDistanceAu: 39.48211675,
  },
  {
    name: "Charon",
    kind: "moon",
    gravitationalParameter: 106101138823.6118,
    radius: 606000,
    equatorialRadius: 606000,
    rotationDays: 6.38723,
    primary: { name: "Pluto", distance: 19596000 },
  },
  {
    name: "Eris",
    kind: "dwarf planet",
    gravitationalParameter: 1098900000000,
    radius: 1163000,
    equatorialRadius: 1163000,
  },
];

const sources: Required<HandbookBody["sources"]> = {
  gravitationalParameter: { source: "NaifGM", mark: "read" },
  radius: { source: "Archinal2018", mark: "from memory", note: "mean radius" },
  equatorialRadius: { source: "NaifPCK", mark: "read" },
  rotationPeriod: { source: "NSSDC", mark: "from memory" },
  starDistance: { source: "JPLElements", mark: "read" },
  starMass: { source: "IAU2015B3", mark: "read", note: "nominal solar GM over the CODATA 2022 value of G" },
  primary: { source: "JPLSatellites", mark: "from memory" },
};

const synchronousRotation: Provenance = {
  source: "JPLSatellites",
  mark: "from memory",
  note: "taken as the period of the orbit",
};

function body(row: BodyRow): HandbookBody {
  const { name, kind, gravitationalParameter, radius } = row;
  const entry: HandbookBody = {
    name,
    kind,
    gravitationalParameter,
    radius,
    sources: { gravitationalParameter: sources.gravitationalParameter, radius: sources.radius },
  };
  if (row.equatorialRadius !== undefined) {
    entry.equatorialRadius = row.equatorialRadius;
    entry.sources.equatorialRadius = sources.equatorialRadius;
  }
  if (row.rotationHours !== undefined) {
    entry.rotationPeriod = row.rotationHours * 3600;
    entry.sources.rotationPeriod = sources.rotationPeriod;
  }
  if (row.rotationDays !== undefined) {
    entry.rotationPeriod = row.rotationDays * 86400;
    entry.sources.rotationPeriod = synchronousRotation;
  }
  if (row.starDistanceAu !== undefined) {
    entry.starDistance = row.starDistanceAu * astronomicalUnit.value;
    entry.sources.starDistance = sources.starDistance;
    entry.starMass = nominalSolarGravitationalParameter.value / gravitationalConstant.value;
    entry.sources.starMass = sources.starMass;
  }
  if (row.primary !== undefined) {
    entry.primary = row.primary;
    entry.sources.primary = sources.primary;
  }
  return entry;
}

/** Bodies of the solar system, outwards from the Sun, moons after their planets. */
export const handbookBodies: readonly HandbookBody[] = rows.map(body);

const byName = new Map(handbookBodies.map((entry) => [entry.name, entry]));

/** The body of a name such as "Mars"; undefined if the handbook has none. */
export function findBody(name: string): HandbookBody | undefined {
  return byName.get(name);
}
