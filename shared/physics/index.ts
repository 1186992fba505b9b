/** The public list of the physics core. Everything else imports from here. */

export * from "./types";
export { PhysicsDomainError } from "./errors";
export * from "./guards";
export { references } from "./references";

export type { PhysicalConstant } from "./constants/physicalConstant";
export * from "./constants/codata2022";
export * from "./constants/iau";

export type { Provenance } from "./handbook/provenance";
export { findBody, handbookBodies, type HandbookBody } from "./handbook/handbookBodies";
export { findGas, handbookGases, type HandbookGas } from "./handbook/handbookGases";
export { collisionRows, type CollisionRow } from "./handbook/collisionRows";
export { collisionParameter } from "./handbook/collisionParameter";

export {
  cosine,
  exponential,
  expm1,
  log10,
  log1p,
  logarithm,
  power,
  powerOfTen,
  sine,
} from "./numerics/elementary";
export { cubicSlope, cubicValue, monotoneCubic, type MonotoneCubic } from "./numerics/monotoneCubic";

export { temperatureAt } from "./temperature/temperatureAt";
export { temperatureCurve, type TemperatureCurve } from "./temperature/temperatureCurve";
export { logTemperatureSlope } from "./temperature/logTemperatureSlope";

export { angularSpeed } from "./body/angularSpeed";
export { escapeSpeed } from "./body/escapeSpeed";
export { gravity } from "./body/gravity";
export { hillRadius } from "./body/hillRadius";
export { meanDensity } from "./body/meanDensity";
export { tidalFactor } from "./body/tidalFactor";

export { crossSectionFromDiameter } from "./conversion/crossSectionFromDiameter";
export { diameterFromCrossSection } from "./conversion/diameterFromCrossSection";
export { gravitationalParameterFromMass } from "./conversion/gravitationalParameterFromMass";
export { massFromGravitationalParameter } from "./conversion/massFromGravitationalParameter";
export { meanMass } from "./conversion/meanMass";
export { numberDensityFromPressure } from "./conversion/numberDensityFromPressure";
export { pressureFromNumberDensity } from "./conversion/pressureFromNumberDensity";

export { jeansCorrections, type JeansCorrection } from "./handbook/jeansCorrections";
export { effusionVelocity, type ExobaseParticle } from "./escape/effusionVelocity";
export { escapeParameter } from "./escape/escapeParameter";
export { escapeRegime, escapeRegimeBounds, type EscapeRegime } from "./escape/escapeRegime";
export { jeansFlux, type ExobaseGas } from "./escape/jeansFlux";
export { jeansRate } from "./escape/jeansRate";
export { log10EffusionVelocity } from "./escape/log10EffusionVelocity";
export { log10JeansFlux } from "./escape/log10JeansFlux";
export { logEffusionVelocity } from "./escape/logEffusionVelocity";
export {
  largestDrift,
  looselyBound,
  thermalEscape,
  type GasEscape,
  type ThermalEscape,
  type ThermalEscapeInput,
} from "./escape/thermalEscape";
export { thermalSpeed } from "./escape/thermalSpeed";

export { diffusionCoefficient } from "./column/diffusionCoefficient";
export { defaultTolerance, solveColumn } from "./column/solveColumn";

export { supplyLimitedShare } from "./coupling/coupledNotes";
export { solveCoupledColumn } from "./coupling/solveCoupledColumn";

export { magnitude } from "./numerics/magnitude";
export { incompleteGamma, scaledUpperGamma } from "./numerics/incompleteGamma";
export { scaledErfc } from "./numerics/scaledErfc";
export { lowerLambertLogarithm, principalLambertLogarithm } from "./numerics/lambertW";

export { type CoronaColumn, limbColumn, overheadColumn } from "./corona/coronaColumn";
export { type Corona, coronaDensity, type CoronaDensity } from "./corona/coronaDensity";
export { coronaShareAtExobase } from "./corona/coronaShareAtExobase";
export { type CoronaPlace, partitionFunctions, type PartitionFunctions } from "./corona/partitionFunctions";

export { columnCrossoverMass, type ColumnCrossoverMass } from "./limits/columnCrossoverMass";
export { columnDiffusionLimit, type ColumnDiffusionLimit } from "./limits/columnDiffusionLimit";
export { columnInventory, type Inventory } from "./limits/columnInventory";
export { crossoverMass, type OutflowingGas } from "./limits/crossoverMass";
export { depletionTime } from "./limits/depletionTime";
export { diffusionLimit, type DiffusionLimit, type DiffusionLimitPlace } from "./limits/diffusionLimit";
export { energyLimitedMassRate, type HeatedBody } from "./limits/energyLimitedMassRate";
export { isothermalWind, type IsothermalWind, type WindBase } from "./limits/isothermalWind";
export { limitLevel, type LimitLevel } from "./limits/limitLevel";
export { supplyFraction } from "./limits/supplyFraction";

export { equivalentTime, type LossSpan } from "./loss/equivalentTime";
export { lossHistory, type LossHistory } from "./loss/lossHistory";
export { moleculesFromWaterLayer } from "./loss/moleculesFromWaterLayer";
export { particlesFromSurfacePressure } from "./loss/particlesFromSurfacePressure";
export { relativeXuv } from "./loss/relativeXuv";
export { solarXuvAges } from "./loss/solarXuvAges";
export { surfacePressureFromParticles } from "./loss/surfacePressureFromParticles";
export { waterDensity, waterLayerFromMolecules, waterMass } from "./loss/waterLayerFromMolecules";
export { waterPerParticle } from "./loss/waterPerParticle";
export { solarXuvExponent, type XuvHistory } from "./loss/xuvHistory";

export {
  findRecombiningIon,
  recombiningIons,
  type RecombinationChannel,
  type RecombinationPiece,
  type RecombiningIon,
} from "./handbook/recombination";
export { escapeEnergy } from "./nonthermal/escapeEnergy";
export {
  escapingFragments,
  type ChannelAnswer,
  type Fragment,
  type FragmentYield,
} from "./nonthermal/escapingFragments";
export { fragmentEnergy } from "./nonthermal/fragmentEnergy";
export { pickupEnergy } from "./nonthermal/pickupEnergy";
export { pickupGyroradius } from "./nonthermal/pickupGyroradius";
export { recombinationCoefficient } from "./nonthermal/recombinationCoefficient";
export {
  recombinationEscape,
  type Ionosphere,
  type RecombinationEscape,
} from "./nonthermal/recombinationEscape";

export type { Distribution, PhysicalBounds } from "./spread/distribution";
export { histogram, type HistogramBin } from "./spread/histogram";
export { normalProbability } from "./spread/normalProbability";
export { normalQuantile } from "./spread/normalQuantile";
export { rankCorrelation } from "./spread/rankCorrelation";
export { sampleQuantile } from "./spread/sampleQuantile";
export { scrambledSobol, type ScrambledSobol } from "./spread/scrambledSobol";
export { largestSobolDimension } from "./spread/sobolDirections";
export { truncatedDistribution, type TruncatedDistribution } from "./spread/truncatedDistribution";
export { varianceShare, type VarianceShare } from "./spread/varianceShare";
