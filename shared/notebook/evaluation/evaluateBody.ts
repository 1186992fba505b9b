import {
  angularSpeed,
  energyLimitedMassRate,
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
import { checkName } from "./checkName";
import type { BodyModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { readEntry, readQuantityEntry, sayIfBothStand } from "./readEntries";
import { measured } from "./resultValue";
import { shortCitation } from "./shortCitation";
import { readHandbook } from "../language/readHandbook";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";

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
  const xuv = readXuv(cell);
  const centrifugal = readCentrifugal(cell, ownOrLike("rotation_period", like?.rotationPeriod));
  sayWhichCentresAct(cell);

  const values: CellResult["values"] = {};
  if (gm !== undefined) {
    values.mass = measured(mass ?? massFromGravitationalParameter(gm), "kg");
    values.gm = measured(gm, "m^3 s^-2");
  }
  if (radius !== undefined) values.radius = measured(radius, "m");
  if (gm === undefined || radius === undefined) return { values: { ...values, ...xuvValues(xuv.flux) } };

  const place = { gravitationalParameter: gm, radius };
  values.surface_gravity = measured(gravity(place), "m s^-2");
  values.surface_escape_speed = measured(escapeSpeed(place), "m s^-1");
  values.mean_density = measured(meanDensity(place), "kg m^-3");

  const hill = readHillRadius(cell, gm, starDistance, starMass);
  if (hill !== null) values.hill_radius = measured(hill, "m");
  const tide = xuvRadius === undefined ? null : readTide(cell, hill, xuvRadius);
  if (hill !== null && tide !== null) values.tidal_factor = measured(tide, "1");
  Object.assign(values, xuvValues(xuv.flux));
  const doesXuvRadiusAct = hill !== null || (xuv.flux !== undefined && xuv.efficiency !== undefined);
  if (doesXuvRadiusAct && !cell.entry("xuv_radius")) cell.actByDefault("xuv_radius");
  const limit = energyLimit(place, xuv, xuvRadius, tide);
  return {
    values,
    model: { kind: "body", ...place, centrifugal, hillRadius: hill, energyLimitedMassRate: limit },
  };
}

interface Xuv {
  flux: number | undefined;
  efficiency: number | undefined;
}

function xuvValues(flux: number | undefined): CellResult["values"] {
  return flux === undefined ? {} : { xuv_flux: measured(flux, "W m^-2") };
}

function readXuv(cell: OpenCell): Xuv {
  const xuv = {
    flux: readQuantityEntry(cell, "xuv_flux"),
    efficiency: readQuantityEntry(cell, "heating_efficiency"),
  };
  const [fluxEntry, efficiencyEntry] = [cell.entry("xuv_flux"), cell.entry("heating_efficiency")];
  const given = fluxEntry ?? efficiencyEntry;
  if (given && !(fluxEntry && efficiencyEntry)) {
    const missing = fluxEntry ? "heating_efficiency" : "xuv_flux";
    const message = `The energy-limited mass rate needs *${missing}* beside *${given.key}*; it has no default.`;
    cell.say("remark", "energy_limit_incomplete", message, given);
  }
  return xuv;
}

/** null where the entries do not suffice. */
function energyLimit(
  place: { gravitationalParameter: number; radius: number },
  { flux, efficiency }: Xuv,
  xuvRadius: number | undefined,
  tide: number | null,
): number | null {
  if (flux === undefined || efficiency === undefined || xuvRadius === undefined || tide === null) return null;
  return energyLimitedMassRate({
    ...place,
    heatingEfficiency: efficiency,
    xuvFlux: flux,
    xuvRadius,
    tidalFactor: tide,
  });
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

/** 1 without a star; null, with a caution, where the body overflows its Hill sphere. */
function readTide(cell: OpenCell, hill: number | null, xuvRadius: number): number | null {
  if (hill === null) return 1;
  if (hill > xuvRadius) return tidalFactor({ hillRadius: hill, xuvRadius });
  const message =
    "The Hill radius lies below the radius at which the radiation is absorbed: the star takes the gas, and no tidal factor exists.";
  cell.say("caution", "inside_hill_radius", message, cell.entry("xuv_radius") ?? cell.entry("star_distance"));
  return null;
}
