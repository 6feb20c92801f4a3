/** Thermal expansion of mineral oil [1/K] (common practice, no source). */
export const THERMAL_EXPANSION = 7e-4;
/** Temperature to which an entered density belongs [K]: 15 °C. */
export const DENSITY_TEMPERATURE = 288.15;

/** Density [kg/m³] at a temperature [K] from the density at 15 °C. */
export function densityAt(densityAt15: number, temperature: number): number {
  return densityAt15 / (1 + THERMAL_EXPANSION * (temperature - DENSITY_TEMPERATURE));
}
