import { atmosphericPressure } from './atmosphere.ts';
import { densityAt } from './density.ts';
import type { OilModel } from './effective-modulus.ts';
import { type Grade, kinematicViscosity } from './viscosity.ts';

/** Viscosity to which plate leakages and drags belong [Pa·s]: ISO VG 46 at 40 °C, 870 kg/m³. */
export const REFERENCE_VISCOSITY = 46e-6 * 870;

/** The parts of the circuit document that are evaluated once per run. */
export interface FluidData {
  readonly grade: Grade;
  /** [K] */
  readonly temperature: number;
  readonly airFraction: number;
  readonly bulkModulus: number;
  /** At 15 °C [kg/m³]. */
  readonly density: number;
}
export interface SupplyData {
  readonly voltage: number;
  readonly frequency: number;
  readonly impedance: number;
}
export interface SiteData {
  /** [m] */
  readonly altitude: number;
}

/** Everything that is the same for all components of a run; kinds know it as RunConstants (same shape). */
export interface RunValues {
  readonly density: number;
  readonly viscosity: number;
  readonly referenceViscosity: number;
  readonly atmosphere: number;
  readonly supplyVoltage: number;
  readonly supplyFrequency: number;
  readonly supplyImpedance: number;
}

export function runConstants(fluid: FluidData, supply: SupplyData, site: SiteData): RunValues {
  const density = densityAt(fluid.density, fluid.temperature);
  return {
    density,
    viscosity: kinematicViscosity(fluid.grade, fluid.temperature) * density,
    referenceViscosity: REFERENCE_VISCOSITY,
    atmosphere: atmosphericPressure(site.altitude),
    supplyVoltage: supply.voltage,
    supplyFrequency: supply.frequency,
    supplyImpedance: supply.impedance,
  };
}

/** The oil of every node. */
export function oilModel(fluid: FluidData, site: SiteData): OilModel {
  return { modulus: fluid.bulkModulus, airFraction: fluid.airFraction, atmosphere: atmosphericPressure(site.altitude) };
}
