/** Exponents of metre, kilogram, second, kelvin, mole and ampere. An angle is a pure number. */
export type Dimension = readonly [number, number, number, number, number, number];

export interface QuantityKind {
  dimension: Dimension;
  /** With its article: "a temperature". */
  words: string;
  /** What a message asks for: "K". */
  unit: string;
}

/** Every kind of quantity that an entry may ask for, or that a message can name. */
export const quantityKinds = {
  number: { dimension: [0, 0, 0, 0, 0, 0], words: "a number without unit", unit: "" },
  angle: { dimension: [0, 0, 0, 0, 0, 0], words: "an angle", unit: "deg" },
  length: { dimension: [1, 0, 0, 0, 0, 0], words: "a length", unit: "km" },
  mass: { dimension: [0, 1, 0, 0, 0, 0], words: "a mass", unit: "kg" },
  time: { dimension: [0, 0, 1, 0, 0, 0], words: "a time", unit: "s" },
  temperature: { dimension: [0, 0, 0, 1, 0, 0], words: "a temperature", unit: "K" },
  amount: { dimension: [0, 0, 0, 0, 1, 0], words: "an amount of substance", unit: "mol" },
  current: { dimension: [0, 0, 0, 0, 0, 1], words: "an electric current", unit: "A" },
  area: { dimension: [2, 0, 0, 0, 0, 0], words: "an area", unit: "m^2" },
  volume: { dimension: [3, 0, 0, 0, 0, 0], words: "a volume", unit: "m^3" },
  speed: { dimension: [1, 0, -1, 0, 0, 0], words: "a speed", unit: "m/s" },
  acceleration: { dimension: [1, 0, -2, 0, 0, 0], words: "an acceleration", unit: "m/s^2" },
  frequency: { dimension: [0, 0, -1, 0, 0, 0], words: "a rate", unit: "1/s" },
  perLength: { dimension: [-1, 0, 0, 0, 0, 0], words: "an inverse length", unit: "/km" },
  numberDensity: { dimension: [-3, 0, 0, 0, 0, 0], words: "a number density", unit: "/cm^3" },
  massDensity: { dimension: [-3, 1, 0, 0, 0, 0], words: "a mass density", unit: "kg/m^3" },
  columnDensity: { dimension: [-2, 0, 0, 0, 0, 0], words: "a column density", unit: "/cm^2" },
  pressure: { dimension: [-1, 1, -2, 0, 0, 0], words: "a pressure", unit: "Pa" },
  diffusion: { dimension: [2, 0, -1, 0, 0, 0], words: "a diffusion coefficient", unit: "cm^2/s" },
  collision: { dimension: [-1, 0, -1, 0, 0, 0], words: "a collision parameter", unit: "/(cm s)" },
  gravitationalParameter: {
    dimension: [3, 0, -2, 0, 0, 0],
    words: "a gravitational parameter",
    unit: "m^3/s^2",
  },
  particleFlux: { dimension: [-2, 0, -1, 0, 0, 0], words: "a particle flux", unit: "/(cm^2 s)" },
  energyFlux: { dimension: [0, 1, -3, 0, 0, 0], words: "an energy flux", unit: "W/m^2" },
  massRate: { dimension: [0, 1, -1, 0, 0, 0], words: "a mass rate", unit: "kg/s" },
  force: { dimension: [1, 1, -2, 0, 0, 0], words: "a force", unit: "N" },
  energy: { dimension: [2, 1, -2, 0, 0, 0], words: "an energy", unit: "J" },
  power: { dimension: [2, 1, -3, 0, 0, 0], words: "a power", unit: "W" },
  magneticField: { dimension: [0, 1, -2, 0, 0, -1], words: "a magnetic field", unit: "nT" },
} as const satisfies Record<string, QuantityKind>;

export type QuantityName = keyof typeof quantityKinds;

export const dimensionless: Dimension = [0, 0, 0, 0, 0, 0];
