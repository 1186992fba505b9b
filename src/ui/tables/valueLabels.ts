/** Names of results in plain words, in the order they are shown; what a cell's entries state already is left out. */
export const valueLabels: Readonly<Record<string, string>> = {
  surface_gravity: "Surface gravity",
  surface_escape_speed: "Escape speed",
  mean_density: "Mean density",
  hill_radius: "Hill radius",
  tidal_factor: "Tidal factor",
  xuv_flux: "XUV flux",
  "base.number_density": "Density at the base",
  "base.pressure": "Pressure at the base",
  "exobase.altitude": "Exobase",
  "exobase.temperature": "Temperature there",
  "exobase.escape_speed": "Escape speed there",
  bulk_escape_parameter: "λ of the mean mass",
  energy_limited_mass_rate: "Energy limit",
  crossover_mass: "Crossover mass",
  wind_mass_rate: "Isothermal wind",
};

/** A label for any name: its own, or its words. */
export const valueLabel = (name: string): string => valueLabels[name] ?? name.replace(/[._]/g, " ");
