import { orifice } from '../../numerics/smooth.ts';

/** Half width of the laminar zone of an edge [Pa], overlap of the spool (share of its travel). */
export const LAMINAR = 2e4;
export const OVERLAP = 0.1;
/** Pressure at which the plate's spool leakage is stated [Pa]. */
const LEAKAGE_PRESSURE = 200e5;

/** Coefficient of a fully open edge from its rated flow at its rated drop. */
export function edgeCoefficient(ratedFlow: number, ratedDrop: number): number {
  return ratedFlow / orifice(1, ratedDrop, LAMINAR);
}

/** Coefficient of a closed edge from a leakage per Pa, stated at 200 bar. */
export function closedEdge(leakage: number): number {
  return leakage * Math.sqrt(LEAKAGE_PRESSURE);
}
