import { references } from "../../shared/physics/references";

/**
 * What the checks rest on beside the sources of the product itself. Volumes and pages here are from memory.
 */
const sourcesOfChecks: Readonly<Record<string, string>> = {
  AbramowitzStegun1964:
    "M. Abramowitz and I. A. Stegun (1964), Handbook of Mathematical Functions, National Bureau of Standards.",
  Agren2007:
    "K. Ågren et al. (2007), On magnetospheric electron impact ionisation and dynamics in Titan's ram-side and polar ionosphere, Ann. Geophys. 25, 2359–2369.",
  AndersonHord1971:
    "D. E. Anderson and C. W. Hord (1971), Mariner 6 and 7 ultraviolet spectrometer experiment: analysis of hydrogen Lyman-alpha data, J. Geophys. Res. 76, 6666–6673.",
  Arithmetic:
    "Arithmetic: worked out by hand or by a separate program from the inputs named in the row and the test.",
  BIPM2019: "BIPM (2019, updated 2022), The International System of Units, 9th edition.",
  CatlingZahnle2009:
    "D. C. Catling and K. J. Zahnle (2009), The planetary air leak, Sci. Am. 300 (5), 36–43.",
  ChiSquareTable:
    "Percentage points of the chi-square distribution with three degrees of freedom, as tabulated.",
  EnergyLevels: "Energy levels of the free atoms, as tabulated.",
  IERS: "International Earth Rotation and Reference Systems Service: nominal angular speed of the Earth.",
  IshigamiHomma1990:
    "T. Ishigami and T. Homma (1990), An importance quantification technique in uncertainty analysis for computer models, Proc. ISUMA '90, 398–403.",
  JohnsonKotzBalakrishnan1994:
    "N. L. Johnson, S. Kotz and N. Balakrishnan (1994), Continuous Univariate Distributions, volume 1, 2nd edition, Wiley.",
  Koskinen2013:
    "T. T. Koskinen et al. (2013), The density and temperature structure near the exobase of Saturn from Cassini UVIS solar occultations, Icarus 226, 1318–1330.",
  Krasnopolsky1993:
    "V. A. Krasnopolsky, B. R. Sandel, F. Herbert and R. J. Vervack (1993), Temperature, N2, and N density profiles of Triton's atmosphere: observations and model, J. Geophys. Res. 98, 3065–3078.",
  Levine1978:
    "J. S. Levine, D. S. McDougal, D. E. Anderson and E. S. Barker (1978), Atomic hydrogen on Mars: measurements at solar minimum, Science 200, 1048–1051.",
  Lillis2017:
    "R. J. Lillis et al. (2017), Photochemical escape of oxygen from Mars: first results from MAVEN in situ data, J. Geophys. Res. Space Phys. 122, 3815–3836.",
  Lo2021:
    "D. Y. Lo, R. V. Yelle, R. J. Lillis and J. I. Deighan (2021), Carbon photochemical escape rates from the modern Mars atmosphere, Icarus 360, 114371.",
  MPMath: "mpmath 1.3.0 (Python), in 60 digits or more; numbers in the test files and in tests/fixtures.",
  Pearson1907:
    "K. Pearson (1907), On further methods of determining correlation, Drapers' Company Research Memoirs, Biometric Series IV.",
  Peverall2001:
    "R. Peverall et al. (2001), Dissociative recombination and excitation of O2+: cross sections, product yields and implications for studies of ionospheric airglows, J. Chem. Phys. 114, 6679–6689.",
  SaltelliSobol1995:
    "A. Saltelli and I. M. Sobol (1995), About the use of rank transformation in sensitivity analysis of model output, Reliab. Eng. Syst. Saf. 50, 225–239.",
  SeparateProgram:
    "A separate program in double precision, run before this code existed; its inputs and numbers are in the tests and in tests/fixtures.",
  Strobel2009:
    "D. F. Strobel (2009), Titan's hydrodynamically escaping atmosphere: escape rates and the structure of the exobase region, Icarus 202, 632–641.",
  Strobel2010:
    "D. F. Strobel (2010), Molecular hydrogen in Titan's atmosphere: implications of the measured tropospheric and thermospheric mole fractions, Icarus 208, 878–886.",
  Textbook: "As widely printed in textbooks.",
  Young2018:
    "L. A. Young et al. (2018), Structure and composition of Pluto's atmosphere from the New Horizons solar ultraviolet occultation, Icarus 300, 174–199.",
};

/** The citation of a key of the product's references, or of the sources of the checks. */
export function citation(key: string): string {
  const text = sourcesOfChecks[key] ?? references[key];
  if (!text) throw new Error(`No citation ${key}.`);
  return text;
}

export const isCitedByChecksAlone = (key: string): boolean => key in sourcesOfChecks;
