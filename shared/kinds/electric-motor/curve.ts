import { smoothSign, smoothSignSlope, smoothStep, smoothStepSlope } from '../../numerics/smooth.ts';
import { indices } from '../build.ts';
import type { Block, Plate, RunConstants, Workspace } from '../kind.ts';
import { Memo } from '../memo.ts';
import { classTimeConstant, designMinima, klossRatio, pullOutSlip, relayFactor, singlePhaseRatio, synchronousSpeed } from './laws.ts';

/** Torque and current of the motor at one shaft speed, with their derivatives.
 *  σ = (ws − w)/ws0 is slip speed over the synchronous speed at rated frequency; flux = (V/Vn)·(fn/f). Then torque =
 *  flux²·T(σ) and current = flux·I(σ): the usual V/f correction, exact for the Kloss curve. */

export const motorCoefficients = [
  'ws0',
  'ratedVoltage',
  'ratedFrequency',
  'ratedTorque',
  'pullOutTorque',
  'pullOutSlip',
  'pullUpTorque',
  'pullUpSlip',
  'lockedTorque',
  'klossAlone',
  'ratedSlip',
  'magnetising',
  'rotorSquare',
  'rotorGrowth',
  'drag',
  'reverseBrake',
  'reverseSpeed',
  'impedance',
  'relayFitted',
  'relayFactor',
  'relayTime',
  'serviceFactor',
  'ratedCurrent',
] as const;
const C = indices(motorCoefficients);
export const motorInputIds = [
  'contactor',
  'supplyVoltage',
  'supplyFrequency',
  'relayDial',
  'single-phasing',
  'stuck-in-star',
  'wrong-rotation',
  'worn',
] as const;
const U = indices(motorInputIds);

/** Pull-up lies three quarters of the way from pull-out slip to standstill. */
const PULL_UP_PLACE = 0.75;
const SQRT3 = Math.sqrt(3);
/** Speed over which bearing friction of a worn motor changes sign [rad/s]. */
const BEARING_SPEED = 2;

export function prepareMotor(plate: Plate, run: RunConstants): Record<(typeof motorCoefficients)[number], number> {
  const poles = plate.choice('poles');
  const ws0 = synchronousSpeed(plate.number('ratedFrequency'), Number(poles));
  const power = plate.number('ratedPower');
  const ratedSpeed = Math.min(plate.number('ratedSpeed'), 0.999 * ws0);
  const ratedSlip = (ws0 - ratedSpeed) / ws0;
  const ratedTorque = power / (ws0 * (1 - ratedSlip));
  const ratios =
    plate.choice('designLetter') === 'entered'
      ? { pullOut: plate.number('pullOut'), pullUp: plate.number('pullUp'), lockedRotor: plate.number('lockedRotor') }
      : designMinima(power, poles);
  const pullOutTorque = plate.given('raw.pullOutTorque') ?? ratios.pullOut * ratedTorque;
  const sk = plate.given('raw.pullOutSlip') ?? Math.min(0.9, pullOutSlip(ratedSlip, ratios.pullOut));
  const ratedCurrent = plate.number('ratedCurrent');
  const magnetising = Math.min(plate.number('noLoadCurrent'), 0.95 * ratedCurrent);
  const rotorSquare = (ratedCurrent * ratedCurrent - magnetising * magnetising) / (ratedTorque * ratedSlip);
  const locked = plate.number('lockedRotorCurrent') * ratedCurrent;
  const lockedTorque = ratios.lockedRotor * ratedTorque;
  return {
    ws0,
    ratedVoltage: plate.number('ratedVoltage'),
    ratedFrequency: plate.number('ratedFrequency'),
    ratedTorque,
    pullOutTorque,
    pullOutSlip: sk,
    pullUpTorque: ratios.pullUp * ratedTorque,
    pullUpSlip: sk + PULL_UP_PLACE * (1 - sk),
    lockedTorque,
    klossAlone: plate.given('raw.klossAlone') ?? 0,
    ratedSlip,
    magnetising,
    rotorSquare,
    rotorGrowth: (locked * locked - magnetising * magnetising) / (rotorSquare * lockedTorque) - 1,
    drag: plate.number('drag'),
    reverseBrake: plate.given('raw.reverseBrake') ?? 0,
    reverseSpeed: plate.given('raw.reverseSpeed') ?? 0.5,
    impedance: run.supplyImpedance,
    relayFitted: plate.choice('relayFitted') === 'yes' ? 1 : 0,
    relayFactor: relayFactor(plate.choice('relayStandard')),
    relayTime: classTimeConstant(plate.choice('relayStandard'), plate.choice('relayClass')),
    serviceFactor: plate.number('serviceFactor'),
    ratedCurrent,
  };
}

/** Working of one motor at one instant. */
export interface MotorPoint {
  /** Torque of the field on the rotor and its derivative by shaft speed, bearing losses and brake not yet taken off. */
  field: number;
  fieldSlope: number;
  /** Torque on the shaft: field − drag − worn bearings + brake of the reference cases. */
  shaft: number;
  shaftSlope: number;
  /** Drag, worn-bearing and brake torque against the rotation [N·m]: their work is heat. */
  losses: number;
  /** Current of the highest leg [A] and its derivative by shaft speed. */
  current: number;
  currentSlope: number;
  /** Voltage at the terminals [V]; 0 with the contactor open. */
  voltage: number;
  slip: number;
  synchronous: number;
  /** Speed and torque of pull-out at this supply. */
  pullOutSpeed: number;
  pullOutTorque: number;
}

export const motorPoint: MotorPoint = {
  field: 0,
  fieldSlope: 0,
  shaft: 0,
  shaftSlope: 0,
  losses: 0,
  current: 0,
  currentSlope: 0,
  voltage: 0,
  slip: 0,
  synchronous: 0,
  pullOutSpeed: 0,
  pullOutTorque: 0,
};

const torqueAt = { value: 0, slope: 0 };

const memo = new Memo();

/** T(σ) and dT/dσ at rated voltage and frequency into `torqueAt`. */
function torqueCurve(c: Float64Array, b: number, s: number): void {
  const tb = c[b + C.pullOutTorque]!;
  const sk = c[b + C.pullOutSlip]!;
  if (s <= sk || c[b + C.klossAlone]! !== 0) {
    const square = s * s + sk * sk;
    torqueAt.value = tb * klossRatio(s, sk);
    torqueAt.slope = (2 * tb * sk * (sk * sk - s * s)) / (square * square);
    return;
  }
  const pullUp = c[b + C.pullUpTorque]!;
  const place = c[b + C.pullUpSlip]!;
  if (s <= place) {
    const z = (s - sk) / (place - sk);
    torqueAt.value = tb + (pullUp - tb) * smoothStep(z);
    torqueAt.slope = ((pullUp - tb) * smoothStepSlope(z)) / (place - sk);
    return;
  }
  const z = (s - place) / (1 - place);
  const locked = c[b + C.lockedTorque]!;
  torqueAt.value = pullUp + (locked - pullUp) * smoothStep(z);
  torqueAt.slope = ((locked - pullUp) * smoothStepSlope(z)) / (1 - place);
}

/** Fills `motorPoint` for instance i. */
export function evaluateMotor(block: Block, i: number, w: Workspace): MotorPoint {
  if (memo.holds(block, i, w)) return motorPoint;
  const c = block.c;
  const b = i * block.coefficientCount;
  const n = i * block.inputCount;
  const u = w.u;
  const input = block.input;
  const on = u[input[n + U.contactor]!]!;
  const volts = u[input[n + U.supplyVoltage]!]!;
  const frequency = u[input[n + U.supplyFrequency]!]!;
  const lost = u[input[n + U['single-phasing']]!]!;
  const star = u[input[n + U['stuck-in-star']]!]!;
  const worn = u[input[n + U.worn]!]!;
  const direction = u[input[n + U['wrong-rotation']]!]! > 0.5 ? -1 : 1;
  const speed = w.y[block.port[i]!]!;
  const turning = direction * speed;

  const ws0 = c[b + C.ws0]!;
  const vn = c[b + C.ratedVoltage]!;
  const faster = frequency / c[b + C.ratedFrequency]!;
  const ws = ws0 * faster;
  const s = (ws - turning) / ws0;
  torqueCurve(c, b, s);
  const torque = torqueAt.value;
  const torqueSlope = torqueAt.slope;

  // Current at rated flux: magnetising part and rotor part in quadrature; constant past standstill.
  const sn = c[b + C.ratedSlip]!;
  const sc = Math.min(s, 1);
  const growth = c[b + C.rotorGrowth]!;
  const z = (sc - sn) / (1 - sn);
  const scale = c[b + C.rotorSquare]! * (1 + growth * smoothStep(z));
  const scaleSlope = (c[b + C.rotorSquare]! * growth * smoothStepSlope(z)) / (1 - sn);
  const held = s > 1 ? 0 : 1;
  const magnetising = c[b + C.magnetising]!;
  const square = magnetising * magnetising + scale * torque * sc;
  const root = Math.sqrt(square);
  const rootSlope = (held * (scaleSlope * sc + scale) * torque + scale * torqueSlope * sc) / (2 * root);

  // Faults on the winding: legs of a motor that has lost a phase, and the star connection.
  const slip = s / faster;
  const limited = slip < 0 ? 0 : Math.min(slip, 1);
  const inside = slip > 0 && slip < 1 ? 1 : 0;
  const legs = SQRT3 / (1 + limited);
  const share = (1 + lost * (legs - 1)) * (1 - (2 / 3) * star);
  const shareSlope = ((-lost * inside * legs) / ((1 + limited) * faster)) * (1 - (2 / 3) * star);
  const plain = root * share;
  const plainSlope = rootSlope * share + root * shareSlope;

  // Series impedance of the supply, closed form.
  const drop = (SQRT3 * c[b + C.impedance]!) / (faster * vn);
  const terminal = volts / (1 + drop * plain);
  const terminalSlope = (-terminal * drop * plainSlope) / (1 + drop * plain);
  const flux = terminal / vn / faster;
  const fluxSlope = terminalSlope / vn / faster;

  // One phase lost: two fields turning against each other.
  let curve = torque;
  let curveSlope = torqueSlope;
  if (lost !== 0) {
    const sk = c[b + C.pullOutSlip]! / faster;
    const q = slip * (2 - slip);
    const dq = 2 - 2 * slip;
    const bottom = sk * sk + q * q;
    const tb = c[b + C.pullOutTorque]!;
    const single = tb * singlePhaseRatio(slip, sk);
    const singleSlope = (tb * sk * (-q + (1 - slip) * dq - ((1 - slip) * q * 2 * q * dq) / bottom)) / bottom;
    curve = torque + lost * (single - torque);
    curveSlope = torqueSlope + lost * (singleSlope / faster - torqueSlope);
  }
  const strength = on * (1 - (2 / 3) * star) * (1 - 0.25 * worn);
  const field = strength * flux * flux * curve;
  // dσ/dw of the turning direction is −1/ws0; the direction appears twice and cancels.
  const fieldSlope = (-strength * (2 * flux * fluxSlope * curve + flux * flux * curveSlope)) / ws0;

  const bearings = 0.1 * worn * c[b + C.ratedTorque]!;
  let losses = c[b + C.drag]! * speed + bearings * smoothSign(speed / BEARING_SPEED);
  let lossSlope = c[b + C.drag]! + (bearings * smoothSignSlope(speed / BEARING_SPEED)) / BEARING_SPEED;
  if (speed < 0 && c[b + C.reverseBrake]! !== 0) {
    const scaleSpeed = c[b + C.reverseSpeed]! - speed;
    losses -= (c[b + C.reverseBrake]! * speed * speed) / scaleSpeed;
    lossSlope -= (c[b + C.reverseBrake]! * speed * (2 * scaleSpeed + speed)) / (scaleSpeed * scaleSpeed);
  }

  const point = motorPoint;
  point.field = direction * field;
  point.fieldSlope = fieldSlope;
  point.losses = losses;
  point.shaft = point.field - losses;
  point.shaftSlope = fieldSlope - lossSlope;
  point.current = on * flux * plain;
  point.currentSlope = (-direction * on * (fluxSlope * plain + flux * plainSlope)) / ws0;
  point.voltage = on * terminal;
  point.slip = slip;
  point.synchronous = direction * ws;
  point.pullOutSpeed = ws - c[b + C.pullOutSlip]! * ws0;
  point.pullOutTorque = pullOutAt(c, b, volts, faster, strength);
  return point;
}

/** Highest torque at this supply: the closed-form voltage at pull-out slip, three phases. */
function pullOutAt(c: Float64Array, b: number, volts: number, faster: number, strength: number): number {
  const sk = c[b + C.pullOutSlip]!;
  const sn = c[b + C.ratedSlip]!;
  const scale = c[b + C.rotorSquare]! * (1 + c[b + C.rotorGrowth]! * smoothStep((sk - sn) / (1 - sn)));
  const magnetising = c[b + C.magnetising]!;
  const current = Math.sqrt(magnetising * magnetising + scale * c[b + C.pullOutTorque]! * sk);
  const vn = c[b + C.ratedVoltage]!;
  const terminal = volts / (1 + (SQRT3 * c[b + C.impedance]! * current) / (faster * vn));
  const flux = terminal / vn / faster;
  return strength * flux * flux * c[b + C.pullOutTorque]!;
}
