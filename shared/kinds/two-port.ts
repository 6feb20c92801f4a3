import { pushedOut } from './access.ts';
import type { Block, ReadingSpec, Workspace } from './kind.ts';
import * as S from './sources.ts';

/** What every part with just an inlet A and an outlet B shares: one flow from A to B that depends on their pressures. */

/** Index of outlet B among the two ports. */
export const B = 1;

export const throughEntries = [
  ['A', 'A'],
  ['A', 'B'],
  ['B', 'A'],
  ['B', 'B'],
] as const;

/** Pressure difference from A to B [Pa]. */
export function dropAcross(block: Block, i: number, w: Workspace): number {
  return w.y[block.port[2 * i]!]! - w.y[block.port[2 * i + 1]!]!;
}

/** Adds a flow from A to B [m³/s] to both balances. */
export function passFlow(block: Block, i: number, w: Workspace, flow: number): void {
  const a = block.balance[2 * i]!;
  const b = block.balance[2 * i + 1]!;
  w.balance[a] = w.balance[a]! - flow;
  w.balance[b] = w.balance[b]! + flow;
}

/** Adds d(flow)/d(drop) [m³/s/Pa] to the four entries. */
export function passSlope(block: Block, i: number, w: Workspace, slope: number): void {
  const e = i * block.entryCount;
  const aa = block.slot[e]!;
  const ab = block.slot[e + 1]!;
  const ba = block.slot[e + 2]!;
  const bb = block.slot[e + 3]!;
  w.jac[aa] = w.jac[aa]! - slope;
  w.jac[ab] = w.jac[ab]! + slope;
  w.jac[ba] = w.jac[ba]! + slope;
  w.jac[bb] = w.jac[bb]! - slope;
}

/** Flow from A to B as a reading, with the equation of the part. */
export function flowReading(equation: string, where: string, inputs: readonly string[], limits: string, source: string): ReadingSpec {
  return {
    id: 'flow',
    label: 'Flow',
    quantity: 'flow',
    value: (block, i, w) => pushedOut(block, i, B, w),
    explain: {
      equation,
      where,
      inputs,
      assumptions: ['Density and viscosity at the run’s oil temperature, the same everywhere.'],
      limits,
      source,
    },
  };
}

export const dropReading: ReadingSpec = {
  id: 'drop',
  label: 'Pressure drop',
  quantity: 'pressure',
  value: dropAcross,
  explain: {
    equation: 'Δp = pA − pB',
    where: 'pA, pB pressures at the two ports',
    inputs: ['A.pressure', 'B.pressure'],
    assumptions: [],
    limits: 'Each port shows the pressure of its net; a net has one pressure.',
    source: S.DEFINITION,
  },
};
