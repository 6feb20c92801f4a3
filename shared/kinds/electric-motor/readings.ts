import { coefficient, portValue, pushedOut, stateValue } from '../access.ts';
import { indices } from '../build.ts';
import type { Explanation, ReadingSpec } from '../kind.ts';
import * as S from '../sources.ts';
import { evaluateMotor, motorCoefficients } from './curve.ts';

const C = indices(motorCoefficients);

function explain(
  equation: string,
  where: string,
  inputs: readonly string[],
  limits: string,
  source: string,
  assumptions: readonly string[] = [],
): Explanation {
  return { equation, where, inputs, assumptions, limits, source };
}

const CURVE = `${S.MOTOR_CURVE}; ${S.MINIMA}`;
const QUADRATURE = S.ROTOR_CURRENT;

export const motorReadings: readonly ReadingSpec[] = [
  {
    id: 'speed',
    label: 'Shaft speed',
    quantity: 'speed',
    value: (block, i, w) => portValue(block, i, 0, w),
    explain: explain(
      'J·dw/dt = T motor − T pump',
      'J inertia of everything on the shaft, w speed',
      ['inertia', 'torque'],
      'One stiff shaft.',
      S.NEWTON,
    ),
  },
  {
    id: 'torque',
    label: 'Shaft torque',
    quantity: 'torque',
    value: (block, i, w) => pushedOut(block, i, 0, w),
    explain: explain(
      'T = flux²·T(s) − drag·w; T(s) = 2·Tb·s·sk/(s² + sk²) up to pull-out, then smoothly through pull-up to locked rotor',
      'Tb pull-out torque, s slip, sk = sn·(b + √(b² − 1)) pull-out slip, b pull-out ÷ rated torque, flux = (V/Vn)·(fn/f)',
      ['ratedPower', 'ratedSpeed', 'pullOut', 'pullUp', 'lockedRotor', 'supplyVoltage', 'supplyFrequency', 'speed'],
      'Quasi-steady: electrical transients of the first half second are left out.',
      CURVE,
      [
        'Without an entered curve: the least values of design N; a real motor usually has more.',
        'Pull-up lies three quarters of the way from pull-out to standstill.',
      ],
    ),
  },
  {
    id: 'torqueRatio',
    label: 'Torque ÷ rated torque',
    quantity: 'ratio',
    value: (block, i, w) => pushedOut(block, i, 0, w) / coefficient(block, i, C.ratedTorque),
    explain: explain(
      'T/Tn, Tn = P/(2π·n/60)',
      'P rated power, n rated speed',
      ['torque', 'ratedPower', 'ratedSpeed'],
      'Means nothing below pull-out speed.',
      S.POWER,
    ),
  },
  {
    id: 'current',
    label: 'Motor current',
    quantity: 'current',
    value: (block, i, w) => evaluateMotor(block, i, w).current,
    explain: explain(
      'I = (V/Vn)·(fn/f)·√(I0² + k(s)·T(s)·s)',
      'I0 no-load current; k(s) scaled so that full load gives full-load current and standstill gives locked-rotor current; with a phase lost the two live legs carry √3/(1 + s) times as much',
      ['ratedCurrent', 'noLoadCurrent', 'lockedRotorCurrent', 'supplyVoltage', 'slip', 'torque'],
      'Current of the highest leg; inrush of the first cycles is left out.',
      QUADRATURE,
    ),
  },
  {
    id: 'terminalVoltage',
    label: 'Terminal voltage',
    quantity: 'voltage',
    value: (block, i, w) => evaluateMotor(block, i, w).voltage,
    explain: explain(
      'V = V0/(1 + √3·Z·I(s)/Vn)',
      'V0 no-load voltage, Z series impedance per phase, I(s) current at rated voltage',
      ['supplyVoltage', 'current'],
      'Drop taken in phase with the voltage: the largest it can be.',
      'Ohm’s law',
    ),
  },
  {
    id: 'shaftPower',
    label: 'Shaft power',
    quantity: 'power',
    value: (block, i, w) => pushedOut(block, i, 0, w) * portValue(block, i, 0, w),
    explain: explain('P = T·w', 'T shaft torque, w speed', ['torque', 'speed'], S.AS_INPUTS, S.POWER),
  },
  {
    id: 'slip',
    label: 'Slip',
    quantity: 'fraction',
    value: (block, i, w) => evaluateMotor(block, i, w).slip,
    explain: explain(
      's = (ws − w)/ws',
      'ws synchronous speed at the supply frequency',
      ['speed', 'poles', 'supplyFrequency'],
      S.AS_INPUTS,
      S.SYNCHRONOUS,
    ),
  },
  {
    id: 'overloadHeat',
    label: 'Overload relay',
    quantity: 'fraction',
    value: (block, i, w) => stateValue(block, i, 0, w),
    explain: explain(
      'dθ/dt = ((I/(k·dial))² − θ)/τ; trips at θ = 1',
      'k 1.15 for an IEC dial, 1.25 for NEMA; τ from the trip class; three times slower with the contactor open',
      ['current', 'relayDial', 'relayClass', 'relayStandard'],
      'One body of heat; real relays scatter across their class.',
      S.RELAY,
      ['Cold at the start of the run.', 'Reset by hand.'],
    ),
  },
  {
    id: 'pullOutSpeed',
    label: 'Pull-out speed',
    quantity: 'speed',
    value: (block, i, w) => evaluateMotor(block, i, w).pullOutSpeed,
    explain: explain(
      'w = ws·(1 − sk·fn/f)',
      'ws synchronous speed, sk pull-out slip',
      ['ratedSpeed', 'pullOut', 'supplyFrequency'],
      S.AS_INPUTS,
      CURVE,
    ),
  },
  {
    id: 'pullOutTorque',
    label: 'Pull-out torque at this supply',
    quantity: 'torque',
    value: (block, i, w) => evaluateMotor(block, i, w).pullOutTorque,
    explain: explain(
      'T = Tb·(V/Vn)²·(fn/f)²',
      'V terminal voltage at pull-out',
      ['pullOut', 'supplyVoltage', 'supplyFrequency'],
      'Three phases; 0 with the contactor open.',
      CURVE,
    ),
  },
];
