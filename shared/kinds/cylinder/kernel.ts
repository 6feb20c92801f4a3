import { sine } from '../../fluid/elementary.ts';
import { indices } from '../build.ts';
import type { Block, Plate, RunConstants, Workspace } from '../kind.ts';
import { Memo } from '../memo.ts';
import {
  capArea,
  friction,
  frictionSlope,
  GRAVITY,
  hydraulicForce,
  rodSideArea,
  workHold,
  workHoldSlope,
  workShare,
  workShareSlope,
} from './laws.ts';

export const cylinderCoefficients = [
  'areaA',
  'areaB',
  'stroke',
  'mass',
  'weight',
  'coulomb',
  'stiction',
  'viscous',
  'leakage',
  'bypass',
  'bound',
  'springRate',
  'springFrom',
  'workContact',
  'workTravel',
  'workForce',
  'workShape',
  'springback',
  'stopStiffness',
  'stopDamping',
  'start',
] as const;
const C = indices(cylinderCoefficients);
export const cylinderInputIds = ['load', 'piston-bypass', 'bound-rod'] as const;
const U = indices(cylinderInputIds);

const STOP_STIFFNESS = 1e8;
const STOP_DAMPING = 20;
/** Pressure across the piston by which the faults are measured [Pa], rod speed that a full bypass stops [m/s]. */
const FAULT_PRESSURE = 100e5;
const BYPASS_SPEED = 0.1;
/** Force with which an unloaded rod rests against its stop at the start [N]. */
const RESTING = 10;

export function prepareCylinder(plate: Plate, run: RunConstants): Record<(typeof cylinderCoefficients)[number], number> {
  const bore = plate.number('bore');
  const areaA = capArea(bore);
  const stroke = plate.number('stroke');
  const mass = plate.number('mass');
  const coulomb = plate.number('coulomb');
  const contact = plate.number('workContact');
  const coefficients = {
    areaA,
    areaB: rodSideArea(bore, Math.min(plate.number('rod'), 0.99 * bore)),
    stroke,
    mass,
    weight: mass * GRAVITY * sine(plate.number('angle')),
    coulomb,
    stiction: Math.max(coulomb, plate.number('stiction')),
    viscous: plate.number('viscous'),
    leakage: plate.given('raw.crossLeakage') ?? (plate.number('crossLeakage') * run.referenceViscosity) / run.viscosity,
    bypass: (areaA * BYPASS_SPEED) / FAULT_PRESSURE,
    bound: areaA * FAULT_PRESSURE,
    springRate: plate.number('springRate'),
    springFrom: plate.number('springFrom'),
    workContact: contact,
    workTravel: Math.max(1e-3, plate.number('workFull') - contact),
    workForce: plate.number('workForce'),
    workShape: Number(plate.choice('workShape')),
    springback: plate.number('workSpringback'),
    stopStiffness: plate.given('raw.stopStiffness') ?? STOP_STIFFNESS,
    stopDamping: plate.given('raw.stopDamping') ?? STOP_DAMPING,
    start: 0,
  };
  return { ...coefficients, start: startPosition(plate, coefficients) };
}

type Loads = Readonly<
  Record<
    'weight' | 'springRate' | 'springFrom' | 'workContact' | 'workTravel' | 'workForce' | 'workShape' | 'stroke' | 'stopStiffness',
    number
  >
>;

/** Position on the nameplate, or in contact balance with the load at an end stop. */
function startPosition(plate: Plate, c: Loads): number {
  const stroke = c.stroke;
  const x = Math.min(stroke, plate.number('startPosition'));
  const spring = x > c.springFrom ? c.springRate * (x - c.springFrom) : 0;
  const work = c.workForce * workShare(x, c.workContact, c.workTravel, c.workShape);
  const load = plate.number('loadForce') + c.weight + spring + work;
  if (x <= 0 && load >= 0) return -Math.max(RESTING, load) / c.stopStiffness;
  if (x >= stroke && load <= 0) return stroke + Math.max(RESTING, -load) / c.stopStiffness;
  return x;
}

/** Working of one cylinder at one instant. */
export interface CylinderPoint {
  /** Hydraulic force out, load against coming out, friction against motion, end-stop force out [N]. */
  force: number;
  load: number;
  friction: number;
  stop: number;
  /** Elastic energy of the end stop's rate of change [W]. */
  stopStored: number;
  leak: number;
  leakage: number;
  acceleration: number;
  loadByPosition: number;
  loadByVelocity: number;
  frictionByVelocity: number;
  stopByPosition: number;
  stopByVelocity: number;
}

const point: CylinderPoint = {
  force: 0,
  load: 0,
  friction: 0,
  stop: 0,
  stopStored: 0,
  leak: 0,
  leakage: 0,
  acceleration: 0,
  loadByPosition: 0,
  loadByVelocity: 0,
  frictionByVelocity: 0,
  stopByPosition: 0,
  stopByVelocity: 0,
};

/** End stops: k·penetration·(1 + d·v into the stop), never pulling. */
function evaluateStop(x: number, v: number, stroke: number, stiffness: number, damping: number): void {
  point.stop = 0;
  point.stopStored = 0;
  point.stopByPosition = 0;
  point.stopByVelocity = 0;
  const out = x > stroke;
  if (!out && x >= 0) return;
  const deep = out ? x - stroke : x;
  point.stopStored = stiffness * deep * v;
  const pressing = out ? 1 + damping * v : 1 - damping * v;
  if (pressing <= 0) return;
  point.stop = -stiffness * deep * pressing;
  point.stopByPosition = -stiffness * pressing;
  point.stopByVelocity = (out ? -1 : 1) * stiffness * deep * damping;
}

const memo = new Memo();

/** Working of cylinder i at this instant. The object is reused by the next call. */
export function evaluateCylinder(block: Block, i: number, w: Workspace): CylinderPoint {
  if (memo.holds(block, i, w)) return point;
  const { c } = block;
  const b = i * block.coefficientCount;
  const n = i * block.inputCount;
  const { u, y } = w;
  const pA = y[block.port[2 * i]!]!;
  const pB = y[block.port[2 * i + 1]!]!;
  const x = y[block.state[2 * i]!]!;
  const v = y[block.state[2 * i + 1]!]!;

  point.leakage = c[b + C.leakage]! + c[b + C.bypass]! * u[block.input[n + U['piston-bypass']]!]!;
  point.leak = point.leakage * (pA - pB);

  const contact = c[b + C.workContact]!;
  const travel = c[b + C.workTravel]!;
  const shape = c[b + C.workShape]!;
  const full = c[b + C.workForce]!;
  const springback = c[b + C.springback]!;
  const work = full * workShare(x, contact, travel, shape);
  const hold = workHold(v, springback);
  const springOn = x > c[b + C.springFrom]! ? c[b + C.springRate]! : 0;
  point.load = u[block.input[n + U.load]!]! + c[b + C.weight]! + springOn * (x - c[b + C.springFrom]!) + hold * work;
  point.loadByPosition = springOn + hold * full * workShareSlope(x, contact, travel, shape);
  point.loadByVelocity = work * workHoldSlope(v, springback);

  const bound = c[b + C.bound]! * u[block.input[n + U['bound-rod']]!]!;
  const coulomb = c[b + C.coulomb]! + bound;
  const stiction = c[b + C.stiction]! + bound;
  point.friction = friction(v, coulomb, stiction, c[b + C.viscous]!);
  point.frictionByVelocity = frictionSlope(v, coulomb, stiction, c[b + C.viscous]!);

  evaluateStop(x, v, c[b + C.stroke]!, c[b + C.stopStiffness]!, c[b + C.stopDamping]!);
  point.force = hydraulicForce(pA, pB, c[b + C.areaA]!, c[b + C.areaB]!);
  point.acceleration = (point.force - point.load - point.friction + point.stop) / c[b + C.mass]!;
  return point;
}

export function cylinderFlow(block: Block, w: Workspace): void {
  const { balance, dy, volume, y } = w;
  for (let i = 0; i < block.count; i += 1) {
    const { leak, acceleration } = evaluateCylinder(block, i, w);
    const b = i * block.coefficientCount;
    const areaA = block.c[b + C.areaA]!;
    const areaB = block.c[b + C.areaB]!;
    const position = block.state[2 * i]!;
    const velocity = block.state[2 * i + 1]!;
    const x = y[position]!;
    const v = y[velocity]!;
    const flowA = block.balance[2 * i]!;
    const flowB = block.balance[2 * i + 1]!;
    balance[flowA] = balance[flowA]! - areaA * v - leak;
    balance[flowB] = balance[flowB]! + areaB * v + leak;
    const volumeA = block.port[2 * i]!;
    const volumeB = block.port[2 * i + 1]!;
    volume[volumeA] = volume[volumeA]! + areaA * x;
    volume[volumeB] = volume[volumeB]! + areaB * (block.c[b + C.stroke]! - x);
    dy[position] = v;
    dy[velocity] = acceleration;
  }
}

export const cylinderEntries = [
  ['A', 'A'],
  ['A', 'B'],
  ['A', 'state:position'],
  ['A', 'state:velocity'],
  ['B', 'A'],
  ['B', 'B'],
  ['B', 'state:position'],
  ['B', 'state:velocity'],
  ['state:position', 'state:velocity'],
  ['state:velocity', 'A'],
  ['state:velocity', 'B'],
  ['state:velocity', 'state:position'],
  ['state:velocity', 'state:velocity'],
] as const;

function add(block: Block, w: Workspace, entry: number, value: number): void {
  const at = block.slot[entry]!;
  w.jac[at] = w.jac[at]! + value;
}

/** −balance/volume · dV/dx of a node; 0 where the node has no volume of its own (tank). */
function volumeTerm(block: Block, w: Workspace, port: number, volumeByPosition: number): number {
  const volume = w.volume[block.port[port]!]!;
  return volume > 0 ? (-w.balance[block.balance[port]!]! / volume) * volumeByPosition : 0;
}

export function cylinderJacobian(block: Block, w: Workspace): void {
  for (let i = 0; i < block.count; i += 1) {
    const q = evaluateCylinder(block, i, w);
    const b = i * block.coefficientCount;
    const areaA = block.c[b + C.areaA]!;
    const areaB = block.c[b + C.areaB]!;
    const mass = block.c[b + C.mass]!;
    const e = i * block.entryCount;
    add(block, w, e, -q.leakage);
    add(block, w, e + 1, q.leakage);
    add(block, w, e + 2, volumeTerm(block, w, 2 * i, areaA));
    add(block, w, e + 3, -areaA);
    add(block, w, e + 4, q.leakage);
    add(block, w, e + 5, -q.leakage);
    add(block, w, e + 6, volumeTerm(block, w, 2 * i + 1, -areaB));
    add(block, w, e + 7, areaB);
    add(block, w, e + 8, 1);
    add(block, w, e + 9, areaA / mass);
    add(block, w, e + 10, -areaB / mass);
    add(block, w, e + 11, (-q.loadByPosition + q.stopByPosition) / mass);
    add(block, w, e + 12, (-q.loadByVelocity - q.frictionByVelocity + q.stopByVelocity) / mass);
  }
}
