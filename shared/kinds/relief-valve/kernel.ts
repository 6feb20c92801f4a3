import { orifice, orificeSlope, smoothMax, smoothMaxSlope, smoothMinSlope } from '../../numerics/smooth.ts';
import { indices } from '../build.ts';
import type { Block, Workspace } from '../kind.ts';
import { Memo } from '../memo.ts';
import { LAMINAR, LIFT_ROUNDING, reliefCoefficient, wantedLift } from './laws.ts';

/** cracking = crackShare·setting + crackFixed, and so on: a raw value fills the fixed part, the plate the share. */
export const reliefCoefficients = ['crackShare', 'crackFixed', 'fullShare', 'fullFixed', 'reseat', 'lag', 'setFlow', 'k'] as const;
const C = indices(reliefCoefficients);
export const reliefInputIds = ['setPressure', 'stuck-open', 'stuck-shut', 'weak-spring'] as const;
const U = indices(reliefInputIds);

export interface ReliefPoint {
  difference: number;
  cracking: number;
  /** Lift that passes oil, with the faults. */
  opening: number;
  flow: number;
  flowByDifference: number;
  flowByLift: number;
  rate: number;
  rateByDifference: number;
  rateByLift: number;
}

const point: ReliefPoint = {
  difference: 0,
  cracking: 0,
  opening: 0,
  flow: 0,
  flowByDifference: 0,
  flowByLift: 0,
  rate: 0,
  rateByDifference: 0,
  rateByLift: 0,
};

const memo = new Memo();

/** Working of relief valve i at this instant, with the derivatives. The object is reused by the next call. */
export function evaluateRelief(block: Block, i: number, w: Workspace): ReliefPoint {
  if (memo.holds(block, i, w)) return point;
  const c = block.c;
  const b = i * block.coefficientCount;
  const n = i * block.inputCount;
  const { u, y } = w;
  const setting = u[block.input[n + U.setPressure]!]! * (1 - 0.5 * u[block.input[n + U['weak-spring']]!]!);
  const open = u[block.input[n + U['stuck-open']]!]!;
  const shut = u[block.input[n + U['stuck-shut']]!]!;
  const d = y[block.port[2 * i]!]! - y[block.port[2 * i + 1]!]!;
  const lift = y[block.state[i]!]!;

  const weaker = 1 - 0.5 * u[block.input[n + U['weak-spring']]!]!;
  const cracking = c[b + C.crackShare]! * setting + c[b + C.crackFixed]! * weaker;
  const forFull = c[b + C.fullShare]! * setting + c[b + C.fullFixed]!;
  const reseat = c[b + C.reseat]! * cracking;
  // Closing follows a flatter line from the reseat pressure; both meet at half lift, above which there is one line.
  const closingFull = forFull + 2 * (cracking - reseat);

  const opening = (d - cracking) / forFull;
  const closing = (d - reseat) / closingFull;
  const openingLift = wantedLift(d, cracking, forFull);
  const openingSlope = clampSlope(opening) / forFull;
  const oneLine = opening >= closing;
  const closingLift = oneLine ? openingLift : wantedLift(d, reseat, closingFull);
  const closingSlope = oneLine ? openingSlope : clampSlope(closing) / closingFull;

  const lag = c[b + C.lag]!;
  const up = openingLift - lift;
  const down = closingLift - lift;
  // Above the opening line it lifts, below the closing line it falls, between them friction holds it where it is.
  const lifts = up > 0 ? 1 : 0;
  const falls = down < 0 ? 1 : 0;
  point.rate = (lifts * up + falls * down) / lag;
  point.rateByDifference = (lifts * openingSlope + falls * closingSlope) / lag;
  point.rateByLift = -(lifts + falls) / lag;

  const passing = (1 - shut) * (1 - open);
  const effective = lift * passing + open;
  const k = c[b + C.k]! > 0 ? c[b + C.k]! : reliefCoefficient(c[b + C.setFlow]!, setting);
  point.difference = d;
  point.cracking = cracking;
  point.opening = effective;
  point.flow = orifice(k * effective, d, LAMINAR);
  point.flowByDifference = k * effective * orificeSlope(d, LAMINAR);
  point.flowByLift = passing * orifice(k, d, LAMINAR);
  return point;
}

/** Slope of the rounded clamp between 0 and 1. */
function clampSlope(z: number): number {
  return smoothMinSlope(smoothMax(z, 0, LIFT_ROUNDING), 1, LIFT_ROUNDING) * smoothMaxSlope(z, 0, LIFT_ROUNDING);
}

export function reliefFlow(block: Block, w: Workspace): void {
  for (let i = 0; i < block.count; i += 1) {
    const { flow, rate } = evaluateRelief(block, i, w);
    const p = block.balance[2 * i]!;
    const t = block.balance[2 * i + 1]!;
    w.balance[p] = w.balance[p]! - flow;
    w.balance[t] = w.balance[t]! + flow;
    w.dy[block.state[i]!] = rate;
  }
}

export const reliefEntries = [
  ['P', 'P'],
  ['P', 'T'],
  ['P', 'state:lift'],
  ['T', 'P'],
  ['T', 'T'],
  ['T', 'state:lift'],
  ['state:lift', 'P'],
  ['state:lift', 'T'],
  ['state:lift', 'state:lift'],
] as const;

function add(block: Block, w: Workspace, entry: number, value: number): void {
  const at = block.slot[entry]!;
  w.jac[at] = w.jac[at]! + value;
}

export function reliefJacobian(block: Block, w: Workspace): void {
  for (let i = 0; i < block.count; i += 1) {
    const q = evaluateRelief(block, i, w);
    const e = i * block.entryCount;
    add(block, w, e, -q.flowByDifference);
    add(block, w, e + 1, q.flowByDifference);
    add(block, w, e + 2, -q.flowByLift);
    add(block, w, e + 3, q.flowByDifference);
    add(block, w, e + 4, -q.flowByDifference);
    add(block, w, e + 5, q.flowByLift);
    add(block, w, e + 6, q.rateByDifference);
    add(block, w, e + 7, -q.rateByDifference);
    add(block, w, e + 8, q.rateByLift);
  }
}
