import { orifice, orificeSlope, smoothStep } from '../../numerics/smooth.ts';
import { indices } from '../build.ts';
import type { Block, Plate, RunConstants, Workspace } from '../kind.ts';
import { closedEdge, edgeCoefficient, LAMINAR, OVERLAP } from './laws.ts';

/** Five edges between four ports: P→A and B→T open to one side, P→B and A→T to the other, P→T only in the centre.
 *  For the 4/2 valve spool 0 … 1 runs from one end to the other. */
export const valveCoefficients = ['edge', 'leak', 'centrePT', 'centreToTank', 'centreFromPump', 'twoPositions'] as const;
const C = indices(valveCoefficients);

/** Ports in the order of the kind, and edges as pairs of them. */
export const P = 0;
export const T = 1;
export const A = 2;
export const B = 3;
const FROM = [P, B, P, A, P] as const;
const TO = [A, T, B, T, T] as const;
const EDGES = 5;

export function prepareValve(plate: Plate, run: RunConstants, centre: string): Record<(typeof valveCoefficients)[number], number> {
  const edge = plate.given('raw.edge') ?? edgeCoefficient(plate.number('ratedFlow'), plate.number('ratedDrop'));
  const joined = centre === '' ? 0 : (plate.given('raw.centre') ?? edge);
  const thinner = run.referenceViscosity / run.viscosity;
  return {
    edge,
    leak: plate.given('raw.edgeLeakage') ?? closedEdge(plate.number('leakage') * thinner),
    centrePT: centre === 'tandem' || centre === 'open' ? joined : 0,
    centreToTank: centre === 'float' || centre === 'open' ? joined : 0,
    centreFromPump: centre === 'open' ? joined : 0,
    twoPositions: centre === '' ? 1 : 0,
  };
}

/** Coefficients of the five edges of the valve last evaluated. */
const edges = new Float64Array(EDGES);

/** Spool position −1 … 1 of instance i. */
export function spoolOf(block: Block, i: number, w: Workspace): number {
  const u = w.u[block.input[i * block.inputCount]!]!;
  return block.c[i * block.coefficientCount + C.twoPositions]! !== 0 ? 2 * u - 1 : u;
}

function evaluateEdges(block: Block, i: number, w: Workspace): Float64Array {
  const { c } = block;
  const b = i * block.coefficientCount;
  const s = spoolOf(block, i, w);
  const full = c[b + C.edge]!;
  const leak = c[b + C.leak]!;
  const toA = full * smoothStep((s - OVERLAP) / (1 - OVERLAP)) + leak;
  const toB = full * smoothStep((-s - OVERLAP) / (1 - OVERLAP)) + leak;
  const centre = smoothStep(1 - Math.abs(s) / OVERLAP);
  edges[0] = toA + c[b + C.centreFromPump]! * centre;
  edges[1] = toA + c[b + C.centreToTank]! * centre;
  edges[2] = toB + c[b + C.centreFromPump]! * centre;
  edges[3] = toB + c[b + C.centreToTank]! * centre;
  edges[4] = c[b + C.centrePT]! * centre + leak;
  return edges;
}

export function valveFlow(block: Block, w: Workspace): void {
  const { balance, y } = w;
  for (let i = 0; i < block.count; i += 1) {
    const k = evaluateEdges(block, i, w);
    for (let e = 0; e < EDGES; e += 1) {
      const from = 4 * i + FROM[e]!;
      const to = 4 * i + TO[e]!;
      const q = orifice(k[e]!, y[block.port[from]!]! - y[block.port[to]!]!, LAMINAR);
      const out = block.balance[from]!;
      const into = block.balance[to]!;
      balance[out] = balance[out]! - q;
      balance[into] = balance[into]! + q;
    }
  }
}

/** Every port sees every other it shares an edge with: rows in the order of the edges, four entries each. */
export const valveEntries = FROM.flatMap((from, e) => {
  const names = ['P', 'T', 'A', 'B'] as const;
  const f = names[from]!;
  const t = names[TO[e]!]!;
  return [[f, f] as const, [f, t] as const, [t, f] as const, [t, t] as const];
});

export function valveJacobian(block: Block, w: Workspace): void {
  const { jac, y } = w;
  for (let i = 0; i < block.count; i += 1) {
    const k = evaluateEdges(block, i, w);
    for (let e = 0; e < EDGES; e += 1) {
      const d = y[block.port[4 * i + FROM[e]!]!]! - y[block.port[4 * i + TO[e]!]!]!;
      const slope = k[e]! * orificeSlope(d, LAMINAR);
      const at = i * block.entryCount + 4 * e;
      const ff = block.slot[at]!;
      const ft = block.slot[at + 1]!;
      const tf = block.slot[at + 2]!;
      const tt = block.slot[at + 3]!;
      jac[ff] = jac[ff]! - slope;
      jac[ft] = jac[ft]! + slope;
      jac[tf] = jac[tf]! + slope;
      jac[tt] = jac[tt]! - slope;
    }
  }
}

/** Heat made in the five edges [W]. */
export function valveHeat(block: Block, i: number, w: Workspace): number {
  const k = evaluateEdges(block, i, w);
  let heat = 0;
  for (let e = 0; e < EDGES; e += 1) {
    const d = w.y[block.port[4 * i + FROM[e]!]!]! - w.y[block.port[4 * i + TO[e]!]!]!;
    heat += orifice(k[e]!, d, LAMINAR) * d;
  }
  return heat;
}
