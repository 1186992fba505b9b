/** Shapes that the physics core takes and gives. A bare number is SI. */

/** A remark, caution or fault that a model attaches to its result. */
export interface PhysicsNote {
  level: "remark" | "caution" | "fault";
  /** Stable, snake_case; one code per cause. */
  code: string;
  /** Plain words with the numbers behind them: what, why, what to do. */
  message: string;
}

/** T(z); see `temperatureAt`. Altitudes in m above the body's radius, temperatures in K. */
export type TemperatureProfile =
  | { kind: "constant"; temperature: number }
  | { kind: "bates"; base: number; exosphere: number; shape: number; referenceAltitude: number }
  | { kind: "points"; altitudes: Float64Array; temperatures: Float64Array };

/** K(z), m² s⁻¹. `power` is K₀ (n₀/n)^exponent up to the ceiling, n₀ the total density at the base. */
export type EddyProfile =
  | { kind: "none" }
  | { kind: "constant"; coefficient: number }
  | { kind: "power"; base: number; exponent: number; ceiling: number | null }
  | { kind: "points"; altitudes: Float64Array; coefficients: Float64Array };

/** One gas of a column. Mass of one particle in kg; diameter in m (σ = πd²). */
export interface ColumnGas {
  formula: string;
  mass: number;
  collisionDiameter: number;
  thermalDiffusionFactor: number;
  moleFraction: number;
}

/** b(T) = A (T/1 K)^s, in m⁻¹ s⁻¹. */
export interface CollisionParameter {
  coefficient: number;
  exponent: number;
  /** A key of `references`, or "given" where the notebook states it. */
  source: string;
  isEstimate: boolean;
}

export interface ColumnInput {
  /** GM, m³ s⁻². */
  gravitationalParameter: number;
  /** Radius that altitudes count from, m. */
  radius: number;
  /** Where given, the centrifugal term is taken off gravity in the column. */
  centrifugal: { angularSpeed: number; latitude: number } | null;
  baseAltitude: number;
  /** Total number density at the base, m⁻³. */
  baseNumberDensity: number;
  gases: readonly ColumnGas[];
  /** Symmetric, S × S; the diagonal is not read. */
  collisionParameters: readonly (readonly CollisionParameter[])[];
  temperature: TemperatureProfile;
  eddy: EddyProfile;
  top: number | "auto";
}

/** The gas at one altitude. Arrays run over the gases in the order of the input. */
export interface ColumnLevel {
  altitude: number;
  radius: number;
  temperature: number;
  /** dT/dz, K m⁻¹ */
  temperatureGradient: number;
  pressure: number;
  numberDensity: number;
  massDensity: number;
  /** kg */
  meanMass: number;
  /** m s⁻², the centrifugal term included where it was asked for */
  gravity: number;
  scaleHeight: number;
  meanFreePath: number;
  knudsen: number;
  /** K, m² s⁻¹ */
  eddyCoefficient: number;
  moleFractions: Float64Array;
  numberDensities: Float64Array;
  /** ln(nᵢ/1 m⁻³): holds what is too small for a number. */
  logNumberDensities: Float64Array;
  scaleHeights: Float64Array;
}

/** The same as columns; `gases[i]` belongs to the i-th gas. */
export interface ColumnProfiles {
  altitude: Float64Array;
  temperature: Float64Array;
  pressure: Float64Array;
  numberDensity: Float64Array;
  massDensity: Float64Array;
  meanMass: Float64Array;
  gravity: Float64Array;
  scaleHeight: Float64Array;
  meanFreePath: Float64Array;
  knudsen: Float64Array;
  gases: { numberDensity: Float64Array; moleFraction: Float64Array; scaleHeight: Float64Array }[];
}

export type HomopauseOutcome =
  | { found: true; altitude: number }
  | { found: false; reason: "no_eddy_mixing" | "mixed_throughout" | "separated_throughout" | "single_gas" };

export type ExobaseOutcome =
  | {
      found: true;
      level: ColumnLevel;
      /** Altitudes of Kn = 0.1 and Kn = 10 (bulk), null where the column ends before. */
      lower: number | null;
      upper: number | null;
      /** Further upward crossings below the one chosen. */
      otherAltitudes: number[];
      notes: PhysicsNote[];
    }
  | {
      found: false;
      reason: "base_above_exobase" | "base_unbound" | "runaway" | "top_below_exobase";
      message: string;
      /** The largest Knudsen number or, by another criterion, of the number that is 1 at the exobase; and where, m. */
      largestKnudsen: number;
      altitudeOfLargest: number;
    };

/** What makes an exobase. Kn, l, H and the band are those of the whole gas whatever the criterion. */
export type ExobaseCriterion =
  /** l = H of the whole gas: Kn = 1. */
  | { kind: "bulk" }
  /** lᵢ = Hᵢ of one gas in the mixture. */
  | { kind: "gas"; formula: string }
  /** 1/(Σ nⱼσⱼ) = H, without √2. */
  | { kind: "simple" }
  /** ∫ Σ nⱼσⱼ dz = 1 from there up. */
  | { kind: "unit_depth" };

/** A column without flux (F = 0), or, of a coupled solution, with the fluxes of its gases up to the exobase. */
export interface Column {
  input: ColumnInput;
  topAltitude: number;
  /** By the bulk criterion, l = H; of a coupled solution the one that its fluxes leave from. */
  exobase: ExobaseOutcome;
  /** The exobase of the same column by another criterion. */
  exobaseBy(criterion: ExobaseCriterion): ExobaseOutcome;
  homopauses: HomopauseOutcome[];
  levelAt(altitude: number): ColumnLevel;
  /** Altitudes ascending, between base and top. */
  profilesAt(altitudes: Float64Array): ColumnProfiles;
  notes: PhysicsNote[];
  /** Right-hand sides evaluated, for benchmarks. */
  evaluations: number;
}

/** A column and how its gases escape. */
export interface CoupledInput extends ColumnInput {
  criterion: ExobaseCriterion;
  /** By formula the factor c on the Jeans rate, above zero; 1 for a gas that is not named. */
  corrections: Readonly<Record<string, number>>;
}

/** What leaves of one gas. Logarithms hold what is too small for a number; −Infinity for an absent gas. */
export interface CoupledGas {
  formula: string;
  /** ln of the flux through the exobase with its correction, m⁻² s⁻¹. */
  logFlux: number;
  /** ln of the Jeans flux of the exobase without correction, m⁻² s⁻¹. */
  logJeansFlux: number;
  /** ln of the global rate with its correction, F = 4πr²Φ, s⁻¹; the same at every altitude below. */
  logRate: number;
  /** wJ/(1 + wJ): near 0 the Jeans flux takes what is there, near 1 diffusion from below sets the rate. */
  supplyShare: number;
}

/** A column whose gases flow up as they escape, or why there is none. */
export type CoupledOutcome =
  | {
      converged: true;
      /** With fluxes up to the exobase, hydrostatic (F = 0) above. */
      column: Column;
      /** By the criterion asked for; the same as `column.exobase`. */
      exobase: Extract<ExobaseOutcome, { found: true }>;
      /** In the order of the input. */
      gases: CoupledGas[];
      /** Of the coupling alone: `column` and `exobase` have their own. */
      notes: PhysicsNote[];
      /** Marches through the column and right-hand sides evaluated. */
      marches: number;
      evaluations: number;
    }
  | {
      converged: false;
      reason: "base_above_exobase" | "base_unbound" | "runaway" | "turn" | "not_converged";
      message: string;
      /** The largest number that is 1 at the exobase (Knudsen's for bulk), about; and where, m. */
      largestKnudsen: number;
      altitudeOfLargest: number;
      marches: number;
      evaluations: number;
    };
