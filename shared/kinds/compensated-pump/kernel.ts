import {
  smoothMax,
  smoothMaxSlope,
  smoothMinSlope,
  smoothSign,
  smoothSignSlope,
  smoothStep,
  smoothStepSlope,
} from '../../numerics/smooth.ts';
import { indices } from '../build.ts';
import type { Block, Workspace } from '../kind.ts';
import { Memo } from '../memo.ts';
import {
  compensatorStroke,
  dryFriction,
  FRICTION_SPEED,
  FULL_FILLING,
  fillingArgument,
  fillingSpan,
  idealFlow,
  idealTorque,
  kneePressure,
  NO_FILLING,
  STROKE_ROUNDING,
} from './laws.ts';

export const pumpCoefficients = [
  'displacement',
  'band',
  'destrokeLag',
  'onstrokeLag',
  'leakage',
  'viscous',
  'coulomb',
  'pressureFriction',
  'fullTorque',
  'ratedSpeed',
  'atmosphere',
  'startStroke',
] as const;
const C = indices(pumpCoefficients);
export const pumpInputIds = [
  'compensatorPressure',
  'maxVolumeStop',
  'minVolumeStop',
  'stuck-on-stroke',
  'stuck-off-stroke',
  'slow',
  'worn',
  'dry',
  'seized',
  'coupling-sheared',
] as const;
const U = indices(pumpInputIds);
/** Ports in the order of the kind. */
export const SUCTION = 0;
export const OUTLET = 1;
export const DRAIN = 2;
export const SHAFT = 3;

/** Extra friction of a dry and of a seized pump, in full ideal torques at the setting. */
const DRY = 0.25;
const SEIZED = 5;

/** Working of one pump at one instant, with every derivative the Jacobian needs. */
export interface PumpPoint {
  /** Flow pushed into the outlet before leakage, and from outlet to case drain [m³/s]. */
  delivered: number;
  leak: number;
  leakage: number;
  /** Torque taken from the shaft, and the part of it that friction takes [N·m]. */
  torque: number;
  friction: number;
  filling: number;
  /** Rate of the stroke [1/s]. */
  rate: number;
  knee: number;
  /** d(delivered) by stroke, speed and inlet pressure (outlet pressure when turning backwards). */
  deliveredByStroke: number;
  deliveredBySpeed: number;
  deliveredByInlet: number;
  backwards: boolean;
  torqueByStroke: number;
  torqueBySpeed: number;
  /** Through the pressure difference outlet − suction. */
  torqueByDifference: number;
  /** Through the filling's dependence on inlet pressure. */
  torqueByInlet: number;
  rateByStroke: number;
  /** Through outlet − case drain. */
  rateByPressure: number;
}

export const pumpPoint: PumpPoint = {
  delivered: 0,
  leak: 0,
  leakage: 0,
  torque: 0,
  friction: 0,
  filling: 1,
  rate: 0,
  knee: 0,
  deliveredByStroke: 0,
  deliveredBySpeed: 0,
  deliveredByInlet: 0,
  backwards: false,
  torqueByStroke: 0,
  torqueBySpeed: 0,
  torqueByDifference: 0,
  torqueByInlet: 0,
  rateByStroke: 0,
  rateByPressure: 0,
};

const memo = new Memo();

/** Fills `pumpPoint` for instance i. */
export function evaluatePump(block: Block, i: number, w: Workspace): PumpPoint {
  if (memo.holds(block, i, w)) return pumpPoint;
  const c = block.c;
  const b = i * block.coefficientCount;
  const n = i * block.inputCount;
  const { u, y } = w;
  const input = block.input;
  const p = i * 4;
  const suction = y[block.port[p]!]!;
  const outlet = y[block.port[p + 1]!]!;
  const drain = y[block.port[p + 2]!]!;
  const shaft = y[block.port[p + 3]!]!;
  const stroke = y[block.state[i]!]!;
  const point = pumpPoint;

  // A sheared coupling leaves the pump standing while the shaft turns.
  const coupled = 1 - u[input[n + U['coupling-sheared']]!]!;
  const speed = coupled * shaft;
  const displacement = c[b + C.displacement]!;
  const ratedSpeed = c[b + C.ratedSpeed]!;

  // Filling by the side the oil comes from.
  const backwards = speed < 0;
  const inlet = (backwards ? outlet : suction) + c[b + C.atmosphere]!;
  const z = fillingArgument(inlet, speed, ratedSpeed);
  const fill = smoothStep(z);
  const fillSlope = smoothStepSlope(z);
  const span = fillingSpan(speed, ratedSpeed);
  const ratio = speed / (ratedSpeed * ratedSpeed);
  const fillBySpeed = (fillSlope * 2 * ratio * (-NO_FILLING - z * (FULL_FILLING - NO_FILLING))) / span;
  const fillByInlet = fillSlope / span;

  const ideal = idealFlow(stroke, displacement, speed);
  point.delivered = ideal * fill;
  point.deliveredByStroke = displacement * speed * fill;
  point.deliveredBySpeed = coupled * (stroke * displacement * fill + ideal * fillBySpeed);
  point.deliveredByInlet = ideal * fillByInlet;
  point.backwards = backwards;
  point.filling = fill;

  point.leakage = c[b + C.leakage]! * (1 + 9 * u[input[n + U.worn]!]!);
  point.leak = point.leakage * (outlet - drain);

  const difference = outlet - suction;
  const turning = idealTorque(stroke, displacement, difference);
  const extra = c[b + C.fullTorque]! * (DRY * u[input[n + U.dry]!]! + SEIZED * u[input[n + U.seized]!]!);
  const share = c[b + C.pressureFriction]!;
  const dry = dryFriction(c[b + C.coulomb]! + extra, share, displacement, difference);
  const sign = smoothSign(speed / FRICTION_SPEED);
  const viscous = c[b + C.viscous]!;
  point.friction = coupled * (viscous * speed + dry * sign);
  point.torque = coupled * (turning * fill + viscous * speed + dry * sign);
  point.torqueByStroke = coupled * displacement * difference * fill;
  point.torqueBySpeed =
    coupled * coupled * (viscous + (dry * smoothSignSlope(speed / FRICTION_SPEED)) / FRICTION_SPEED + turning * fillBySpeed);
  point.torqueByDifference = coupled * (stroke * displacement * fill + (difference < 0 ? -share : share) * displacement * sign);
  point.torqueByInlet = coupled * turning * fillByInlet;

  evaluateStroke(block, i, w, stroke, outlet - drain);
  return point;
}

/** The compensator: rate of the stroke and its derivatives. */
function evaluateStroke(block: Block, i: number, w: Workspace, stroke: number, pressure: number): void {
  const c = block.c;
  const b = i * block.coefficientCount;
  const n = i * block.inputCount;
  const { u } = w;
  const input = block.input;
  const displacement = c[b + C.displacement]!;
  const setting = u[input[n + U.compensatorPressure]!]!;
  const most = u[input[n + U.maxVolumeStop]!]! / displacement;
  const least = u[input[n + U.minVolumeStop]!]! / displacement;
  const band = c[b + C.band]!;
  const held = u[input[n + U['stuck-on-stroke']]!]!;
  const slack = u[input[n + U['stuck-off-stroke']]!]!;
  const free = (1 - held) * (1 - slack);

  const wanted = (setting - pressure) / band;
  const command = compensatorStroke(pressure, setting, band, least, most);
  const raised = smoothMax(wanted, least, STROKE_ROUNDING);
  const commandSlope = smoothMinSlope(raised, most, STROKE_ROUNDING) * smoothMaxSlope(wanted, least, STROKE_ROUNDING);
  const target = free === 1 ? command : (1 - slack) * (command + held * (most - command)) + slack * least;

  const slower = 1 + 9 * u[input[n + U.slow]!]!;
  const down = 1 / (c[b + C.destrokeLag]! * slower);
  const up = 1 / (c[b + C.onstrokeLag]! * slower);
  const error = target - stroke;
  const sign = smoothSign(error / STROKE_ROUNDING);
  const speed = down + ((up - down) * (1 + sign)) / 2;
  const speedSlope = ((up - down) * smoothSignSlope(error / STROKE_ROUNDING)) / (2 * STROKE_ROUNDING);

  const point = pumpPoint;
  point.rate = error * speed;
  const rateByError = speed + error * speedSlope;
  point.rateByStroke = -rateByError;
  point.rateByPressure = (-rateByError * free * commandSlope) / band;
  point.knee = kneePressure(setting, band, most);
}

/** Adds flows, torque and the stroke's derivative. */
export function pumpFlow(block: Block, w: Workspace): void {
  const { balance, dy } = w;
  for (let i = 0; i < block.count; i += 1) {
    const point = evaluatePump(block, i, w);
    const p = i * 4;
    const suction = block.balance[p]!;
    const outlet = block.balance[p + 1]!;
    const drain = block.balance[p + 2]!;
    const shaft = block.balance[p + 3]!;
    balance[suction] = balance[suction]! - point.delivered;
    balance[outlet] = balance[outlet]! + (point.delivered - point.leak);
    balance[drain] = balance[drain]! + point.leak;
    balance[shaft] = balance[shaft]! - point.torque;
    dy[block.state[i]!] = point.rate;
  }
}

/** Jacobian pattern, in the order in which `pumpJacobian` writes it. */
export const pumpEntries = [
  ['suction', 'suction'],
  ['suction', 'outlet'],
  ['suction', 'shaft'],
  ['suction', 'state:stroke'],
  ['outlet', 'suction'],
  ['outlet', 'outlet'],
  ['outlet', 'drain'],
  ['outlet', 'shaft'],
  ['outlet', 'state:stroke'],
  ['drain', 'outlet'],
  ['drain', 'drain'],
  ['shaft', 'suction'],
  ['shaft', 'outlet'],
  ['shaft', 'shaft'],
  ['shaft', 'state:stroke'],
  ['state:stroke', 'outlet'],
  ['state:stroke', 'drain'],
  ['state:stroke', 'state:stroke'],
] as const;

function add(jac: Float64Array, slot: Int32Array, entry: number, value: number): void {
  const at = slot[entry]!;
  jac[at] = jac[at]! + value;
}

export function pumpJacobian(block: Block, w: Workspace): void {
  const { jac } = w;
  const slot = block.slot;
  for (let i = 0; i < block.count; i += 1) {
    const q = evaluatePump(block, i, w);
    const e = i * block.entryCount;
    const bySuction = q.backwards ? 0 : q.deliveredByInlet;
    const byOutlet = q.backwards ? q.deliveredByInlet : 0;
    add(jac, slot, e, -bySuction);
    add(jac, slot, e + 1, -byOutlet);
    add(jac, slot, e + 2, -q.deliveredBySpeed);
    add(jac, slot, e + 3, -q.deliveredByStroke);
    add(jac, slot, e + 4, bySuction);
    add(jac, slot, e + 5, byOutlet - q.leakage);
    add(jac, slot, e + 6, q.leakage);
    add(jac, slot, e + 7, q.deliveredBySpeed);
    add(jac, slot, e + 8, q.deliveredByStroke);
    add(jac, slot, e + 9, q.leakage);
    add(jac, slot, e + 10, -q.leakage);
    const torqueBySuction = -q.torqueByDifference + (q.backwards ? 0 : q.torqueByInlet);
    const torqueByOutlet = q.torqueByDifference + (q.backwards ? q.torqueByInlet : 0);
    add(jac, slot, e + 11, -torqueBySuction);
    add(jac, slot, e + 12, -torqueByOutlet);
    add(jac, slot, e + 13, -q.torqueBySpeed);
    add(jac, slot, e + 14, -q.torqueByStroke);
    add(jac, slot, e + 15, q.rateByPressure);
    add(jac, slot, e + 16, -q.rateByPressure);
    add(jac, slot, e + 17, q.rateByStroke);
  }
}
