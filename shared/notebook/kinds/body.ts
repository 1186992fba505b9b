import {
  angularSpeed,
  escapeSpeed,
  findBody,
  gravitationalParameterFromMass,
  gravity,
  handbookBodies,
  hillRadius,
  massFromGravitationalParameter,
  meanDensity,
  tidalFactor,
  type HandbookBody,
} from "../../physics";
import { checkName } from "../evaluation/checkName";
import type { BodyModel } from "../evaluation/models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "../evaluation/openCell";
import { readEntry, readQuantityEntry, sayIfBothStand } from "../evaluation/readEntries";
import { measured } from "../evaluation/resultValue";
import { shortCitation } from "../evaluation/shortCitation";
import { readHandbook } from "../language/readHandbook";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";
import type { CellSchema } from "./cellSchema";

/** A planet or moon. */
export const bodySchema: CellSchema = {
  kind: "body",
  group: "set up",
  description: "mass, radius, star; gives gravity and escape speed",
  naming: "name",
  takesAnyKey: false,
  entries: [
    {
      key: "mass",
      needed: "one",
      oneOf: ["mass", "gm", "like"],
      form: "quantity",
      dimension: "mass",
      bounds: { above: 0 },
      description: "Mass of the body.",
      default: null,
      example: "mass = 0.41 earth_mass",
    },
    {
      key: "gm",
      needed: "one",
      oneOf: ["mass", "gm", "like"],
      form: "quantity",
      dimension: "gravitationalParameter",
      bounds: { above: 0 },
      description: "Gravitational parameter G M, where it is known better than the mass.",
      default: null,
      example: "gm = 1.63e14 m^3/s^2",
    },
    {
      key: "radius",
      needed: "one",
      oneOf: ["radius", "like"],
      form: "quantity",
      dimension: "length",
      bounds: { above: 0 },
      description: "Radius that altitudes count from.",
      default: null,
      example: "radius = 4943 km",
    },
    {
      key: "like",
      needed: false,
      form: "handbook",
      dimension: null,
      description: "A body of the handbook; the entries of the cell hold instead of its own.",
      default: null,
      example: "like = handbook(Mars)",
    },
    {
      key: "rotation_period",
      needed: false,
      form: "quantity",
      dimension: "time",
      description: "Sidereal rotation period; negative where the body turns backwards. Acts with latitude.",
      default: null,
      example: "rotation_period = 31 h",
    },
    {
      key: "latitude",
      needed: false,
      form: "quantity",
      dimension: "angle",
      bounds: { atLeast: -Math.PI / 2, atMost: Math.PI / 2 },
      description: "Latitude at which the centrifugal term is taken off gravity in the column.",
      default: null,
      example: "latitude = 20 deg",
    },
    {
      key: "star_distance",
      needed: false,
      form: "quantity",
      dimension: "length",
      bounds: { above: 0 },
      description: "Distance from the star; gives the Hill radius together with star_mass.",
      default: null,
      example: "star_distance = 0.83 au",
    },
    {
      key: "star_mass",
      needed: false,
      form: "quantity",
      dimension: "mass",
      bounds: { above: 0 },
      description: "Mass of the star.",
      default: null,
      example: "star_mass = 0.86 solar_mass",
    },
    {
      key: "xuv_radius",
      needed: false,
      form: "quantity",
      dimension: "length",
      bounds: { above: 0 },
      description: "Radius at which X-rays and extreme ultraviolet are absorbed; acts in the tidal factor.",
      default: { text: "xuv_radius = radius", meaning: "the body's own radius" },
      example: "xuv_radius = 5200 km",
    },
  ],
};

/** The body's own entries where they stand, else those of the handbook. */
export function evaluateBody(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  sayIfBothStand(cell, ["mass", "gm"], "Keep the one that is known better.");
  const like = readLike(cell);
  const own = (key: string) => readQuantityEntry(cell, key);
  const ownOrLike = (key: string, likeValue: number | undefined) =>
    cell.entry(key) === undefined ? likeValue : own(key);

  const mass = own("mass");
  const gm = readGravitationalParameter(cell, mass, like);
  const radius = ownOrLike("radius", like?.radius);
  const starDistance = ownOrLike("star_distance", like?.starDistance);
  const starMass = ownOrLike("star_mass", like?.starMass);
  const xuvRadius = ownOrLike("xuv_radius", radius);
  const centrifugal = readCentrifugal(cell, ownOrLike("rotation_period", like?.rotationPeriod));
  sayWhichCentresAct(cell);

  const values: CellResult["values"] = {};
  if (gm !== undefined) {
    values.mass = measured(mass ?? massFromGravitationalParameter(gm), "kg");
    values.gm = measured(gm, "m^3 s^-2");
  }
  if (radius !== undefined) values.radius = measured(radius, "m");
  if (gm === undefined || radius === undefined) return { values };

  const place = { gravitationalParameter: gm, radius };
  values.surface_gravity = measured(gravity(place), "m s^-2");
  values.surface_escape_speed = measured(escapeSpeed(place), "m s^-1");
  values.mean_density = measured(meanDensity(place), "kg m^-3");

  const hill = readHillRadius(cell, gm, starDistance, starMass);
  if (hill !== null) values.hill_radius = measured(hill, "m");
  if (hill !== null && xuvRadius !== undefined) addTidalFactor(cell, values, hill, xuvRadius);
  if (hill !== null && !cell.entry("xuv_radius")) cell.actByDefault("xuv_radius");
  return { values, model: { kind: "body", ...place, centrifugal, hillRadius: hill } };
}

function readLike(cell: OpenCell): HandbookBody | undefined {
  const names = handbookBodies.map(({ name }) => name);
  const name = readEntry(cell, "like", (node) => readHandbook(node, names));
  const body = name === undefined ? undefined : findBody(name);
  if (!body) return undefined;
  const sources = [...new Set(Object.values(body.sources).map(({ source }) => shortCitation(source)))];
  const message = `What ${body.name} has and this cell does not give is that of the handbook: ${sources.join("; ")}.`;
  cell.say("remark", "handbook_body", message, cell.entry("like"));
  return body;
}

/** GM from the mass, else from gm; from the handbook only where neither stands. */
function readGravitationalParameter(
  cell: OpenCell,
  mass: number | undefined,
  like: HandbookBody | undefined,
): number | undefined {
  const gm = readQuantityEntry(cell, "gm");
  if (mass !== undefined) return gravitationalParameterFromMass(mass);
  if (gm !== undefined || cell.entry("gm") || cell.entry("mass")) return gm;
  return like?.gravitationalParameter;
}

function readCentrifugal(cell: OpenCell, rotationPeriod: number | undefined): BodyModel["centrifugal"] {
  const latitude = readQuantityEntry(cell, "latitude");
  const entry = cell.entry("latitude");
  if (!entry || latitude === undefined) return null;
  if (rotationPeriod === undefined) {
    cell.say(
      "remark",
      "latitude_without_rotation",
      "*latitude* acts only together with *rotation_period*.",
      entry,
    );
    return null;
  }
  if (rotationPeriod === 0) {
    cell.say("fault", "bound", "*rotation_period* can't be zero.", cell.entry("rotation_period"));
    return null;
  }
  return { angularSpeed: angularSpeed({ rotationPeriod }), latitude };
}

function readHillRadius(
  cell: OpenCell,
  gravitationalParameter: number,
  starDistance: number | undefined,
  starMass: number | undefined,
): number | null {
  if (starDistance !== undefined && starMass !== undefined) {
    const starGravitationalParameter = gravitationalParameterFromMass(starMass);
    return hillRadius({ gravitationalParameter, starGravitationalParameter, starDistance });
  }
  const given = cell.entry("star_distance") ?? cell.entry("star_mass");
  if (given && (starDistance === undefined) !== (starMass === undefined)) {
    const missing = starDistance === undefined ? "star_distance" : "star_mass";
    if (!cell.entry(missing)) {
      cell.say(
        "remark",
        "hill_radius_incomplete",
        `*${given.key}* acts only together with *${missing}*.`,
        given,
      );
    }
  }
  return null;
}

function addTidalFactor(cell: OpenCell, values: CellResult["values"], hill: number, xuvRadius: number): void {
  if (hill > xuvRadius) {
    values.tidal_factor = measured(tidalFactor({ hillRadius: hill, xuvRadius }), "1");
    return;
  }
  const message =
    "The Hill radius lies below the radius at which the radiation is absorbed: the star takes the gas, and no tidal factor exists.";
  cell.say("caution", "inside_hill_radius", message, cell.entry("xuv_radius") ?? cell.entry("star_distance"));
}
