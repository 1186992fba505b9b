import { escapeSpeed } from "../body/escapeSpeed";
import { requireFinite, requirePositive } from "../guards";
import { jeansCorrections } from "../handbook/jeansCorrections";
import { exponential, logarithm } from "../numerics/elementary";
import { references } from "../references";
import type { PhysicsNote } from "../types";
import { escapeParameter } from "./escapeParameter";
import { escapeRegime, type EscapeRegime } from "./escapeRegime";
import { logEffusionVelocity } from "./logEffusionVelocity";
import { thermalSpeed } from "./thermalSpeed";

/** Below this escape parameter a gas is told how far published calculations depart from the Jeans flux. */
export const looselyBound = 15;

/** Drift speed over √(kT/m) above which the gas at the exobase is no longer near rest. */
export const largestDrift = 0.1;

export interface ThermalEscapeInput {
  gravitationalParameter: number;
  radius: number;
  temperature: number;
  meanMass: number;
  /** null where there is no star to reckon with. */
  hillRadius: number | null;
  gases: readonly { formula: string; mass: number; logNumberDensity: number }[];
}

/** A magnitude below 1e-300 is null; its logarithm carries it. */
export interface GasEscape {
  formula: string;
  escapeParameter: number;
  thermalSpeed: number;
  effusionVelocity: number | null;
  log10EffusionVelocity: number;
  jeansFlux: number | null;
  log10JeansFlux: number;
  rate: number | null;
  log10Rate: number;
  massRate: number | null;
  log10MassRate: number;
  notes: PhysicsNote[];
}

export interface ThermalEscape {
  escapeSpeed: number;
  bulkEscapeParameter: number;
  regime: EscapeRegime;
  /** In the order of the input. */
  gases: GasEscape[];
  /** Of the exobase as a whole; those of one gas stand with it. */
  notes: PhysicsNote[];
}

/**
 * Thermal (Jeans) escape of every gas from an exobase, with the regime and the cautions that belong to it.
 *
 *   Φ = n w,   F = 4πr² Φ,   Ṁ = m F,   w as in `effusionVelocity`; all in logarithms
 *
 * @param exobase.gravitationalParameter    GM    [m³ s⁻²]    above zero
 * @param exobase.radius                    r     [m]         above zero; from the centre
 * @param exobase.temperature               T     [K]         above zero
 * @param exobase.meanMass                  m̄     [kg]        above zero
 * @param exobase.hillRadius                r_H   [m]         above zero, or null
 * @param exobase.gases[].mass              m     [kg]        above zero; one particle
 * @param exobase.gases[].logNumberDensity  ln n  [n in m⁻³]  finite
 * @returns  escape speed [m s⁻¹]; λ̄ of the mean mass and its regime; for each gas λ, v_p and w [m s⁻¹], Φ [m⁻² s⁻¹],
 *           F [s⁻¹] and Ṁ [kg s⁻¹], outward positive, with their decimal logarithms
 *
 * @assumes Maxwellian gases under one sharp, collisionless exobase, the same all around
 * @valid   `escapeRegimeBounds`, `looselyBound`, `largestDrift`, exobase within half the Hill radius; outside, a note
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Jeans1925], [ChamberlainHunten1987]; the notes name theirs
 * @explained escape_rate, mass_rate
 */
export function thermalEscape(exobase: ThermalEscapeInput): ThermalEscape {
  const { gravitationalParameter, radius, temperature, meanMass, hillRadius, gases } = exobase;
  const place = { gravitationalParameter, temperature, radius };
  const bulkEscapeParameter = escapeParameter({ ...place, particleMass: meanMass });
  const { regime, notes } = escapeRegime(bulkEscapeParameter);
  return {
    escapeSpeed: escapeSpeed({ gravitationalParameter, radius }),
    bulkEscapeParameter,
    regime,
    gases: gases.map((gas) => gasEscape(gas, place)),
    notes: [...notes, ...hillNotes(radius, hillRadius)],
  };
}

function gasEscape(
  { formula, mass, logNumberDensity }: ThermalEscapeInput["gases"][number],
  place: { gravitationalParameter: number; temperature: number; radius: number },
): GasEscape {
  requireFinite(`logarithm of the number density of ${formula}`, logNumberDensity);
  const { temperature, radius } = place;
  const lambda = escapeParameter({ ...place, particleMass: mass });
  const logVelocity = logEffusionVelocity({ temperature, particleMass: mass, escapeParameter: lambda });
  const logFlux = logNumberDensity + logVelocity;
  const logRate = logFlux + logarithm(4 * Math.PI * radius * radius);
  const logMassRate = logRate + logarithm(mass);
  return {
    formula,
    escapeParameter: lambda,
    thermalSpeed: thermalSpeed({ temperature, particleMass: mass }),
    effusionVelocity: magnitude(logVelocity),
    log10EffusionVelocity: logVelocity / Math.LN10,
    jeansFlux: magnitude(logFlux),
    log10JeansFlux: logFlux / Math.LN10,
    rate: magnitude(logRate),
    log10Rate: logRate / Math.LN10,
    massRate: magnitude(logMassRate),
    log10MassRate: logMassRate / Math.LN10,
    notes: [...correctionNotes(formula, lambda), ...driftNotes(formula, lambda)],
  };
}

/** e^x, or null below 1e-300. */
function magnitude(log: number): number | null {
  return log < -300 * Math.LN10 ? null : exponential(log);
}

function correctionNotes(formula: string, lambda: number): PhysicsNote[] {
  if (lambda >= looselyBound) return [];
  const published = jeansCorrections
    .filter((correction) => correction.formula === null || correction.formula === formula)
    .map(
      ({ gas, low, high, provenance }) =>
        `${low} to ${high} for ${gas} (${shortCitation(provenance.source)})`,
    )
    .join("; ");
  const message = `The escape parameter of ${formula} is ${lambda.toFixed(2)}. Below ${looselyBound}, published ratios of actual to Jeans escape are ${published}.`;
  return [{ level: "remark", code: "jeans_correction_range", message }];
}

/** "Volkov et al. 2011" from the key Volkov2011 and its citation. */
function shortCitation(key: string): string {
  const [authors, year] = references[key].split(/ \(|\)/);
  const surnames = authors.split(/, | and /).map((name) => name.replace(/^(\S\. ?)+/, ""));
  const names = surnames.length > 2 ? `${surnames[0]} et al.` : surnames.join(" and ");
  return `${names} ${year}`;
}

function driftNotes(formula: string, lambda: number): PhysicsNote[] {
  const drift = ((1 + lambda) * exponential(-lambda)) / Math.sqrt(2 * Math.PI);
  if (drift <= largestDrift) return [];
  const message = `${formula} drifts through the exobase at ${drift.toFixed(2)} of √(kT/m), over ${largestDrift}: it is no longer near rest, as the Jeans flux and the hydrostatic column take it to be.`;
  return [{ level: "caution", code: "fast_drift", message }];
}

function hillNotes(radius: number, hillRadius: number | null): PhysicsNote[] {
  if (hillRadius === null) return [];
  requirePositive("Hill radius", hillRadius);
  const share = radius / hillRadius;
  if (share <= 0.5) return [];
  const message = `The exobase lies at ${share.toFixed(2)} of the Hill radius, over half of it: the star's tide, which is left out of gravity here, pulls the gas off more easily.`;
  return [{ level: "caution", code: "exobase_near_hill_radius", message }];
}
