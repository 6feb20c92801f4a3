import { pushedOut } from '../access.ts';
import { defineKind } from '../kind.ts';
import * as S from '../sources.ts';
import { evaluateRelief, reliefCoefficients, reliefEntries, reliefFlow, reliefJacobian } from './kernel.ts';
import { crackingPressure } from './laws.ts';
import { reliefFaults, reliefInputs, reliefParameters, reliefScrews } from './parameters.ts';

/** Lift from which the valve counts as passing [-]. */
const PASSING = 0.02;

export const reliefValve = defineKind({
  id: 'relief-valve',
  version: 1,
  title: 'Relief valve',
  word: 'relief',
  letter: 'V',
  stage: 'protect',
  about:
    'The safety device of its net. It starts to open at cracking, passes the flow it was set at when the pressure is the set pressure, is fully open at twice the override, and closes again at reseat. First-order lift. What passes it turns into heat. Flow forces and noise are left out.',
  parameters: reliefParameters,
  faults: reliefFaults,
  ports: [
    { id: 'P', letter: 'P', label: 'Inlet', medium: 'oil', role: 'inlet', whenOpen: 'problem' },
    { id: 'T', letter: 'T', label: 'Tank port', medium: 'oil', role: 'outlet', whenOpen: 'tank' },
  ],
  states: [{ id: 'lift', label: 'Lift', quantity: 'fraction', nominal: 0.1, start: () => 0 }],
  inputs: reliefInputs,
  screws: reliefScrews,
  coefficients: reliefCoefficients,
  prepare: (plate) => {
    const crack = plate.given('raw.crackingPressure');
    const full = plate.given('raw.overridePressure');
    const share = crackingPressure(1, plate.number('override'));
    return {
      crackShare: crack === null ? share : 0,
      crackFixed: crack ?? 0,
      fullShare: full === null ? 2 * (1 - share) : 0,
      fullFixed: full ?? 0,
      reseat: plate.number('reseat'),
      lag: plate.number('lag'),
      setFlow: plate.number('setFlow'),
      k: plate.given('raw.flowCoefficient') ?? 0,
    };
  },
  entries: reliefEntries,
  flow: reliefFlow,
  jacobian: reliefJacobian,
  powers: (block, i, w, out) => {
    const { flow, difference } = evaluateRelief(block, i, w);
    out.heat += flow * difference;
  },
  signals: [
    {
      id: 'cracks',
      rises: 'relief cracks',
      falls: '',
      value: (block, i, w) => {
        const { difference, cracking } = evaluateRelief(block, i, w);
        return difference - cracking;
      },
    },
    {
      id: 'passing',
      rises: '',
      falls: 'relief closes',
      value: (block, i, w) => evaluateRelief(block, i, w).opening - PASSING,
    },
  ],
  trips: [],
  readings: [
    {
      id: 'flow',
      label: 'Flow through the relief',
      quantity: 'flow',
      value: (block, i, w) => pushedOut(block, i, 1, w),
      explain: {
        equation: 'Q = lift·K·√Δp, K so that half lift passes the set flow at the set pressure',
        where: 'Δp inlet − tank port',
        inputs: ['setPressure', 'setFlow', 'lift', 'drop'],
        assumptions: ['Half lift at the set pressure, full lift at twice the override.'],
        limits: 'No flow forces.',
        source: `${S.RELIEF}; ${S.ORIFICE}`,
      },
    },
    {
      id: 'lift',
      label: 'Lift',
      quantity: 'fraction',
      value: (block, i, w) => evaluateRelief(block, i, w).opening,
      explain: {
        equation:
          'd(lift)/dt = (wanted − lift)/lag; opening: (Δp − cracking)/(2·(set − cracking)), closing: (Δp − reseat)/(2·(set − reseat))',
        where: 'between the opening and the closing line the poppet rests; above the set pressure both are one',
        inputs: ['setPressure', 'override', 'reseat', 'lag', 'drop'],
        assumptions: ['First order.'],
        limits: 'Chatter of a worn seat is not shown.',
        source: `${S.RELIEF}; reseat: ${S.RESEAT}`,
      },
    },
    {
      id: 'drop',
      label: 'Pressure across the relief',
      quantity: 'pressure',
      value: (block, i, w) => evaluateRelief(block, i, w).difference,
      explain: {
        equation: 'Δp = pP − pT',
        where: 'pressures at its ports',
        inputs: ['P.pressure', 'T.pressure'],
        assumptions: [],
        limits: S.AS_INPUTS,
        source: S.DEFINITION,
      },
    },
    {
      id: 'heat',
      label: 'Heat made in the relief',
      quantity: 'power',
      value: (block, i, w) => {
        const { flow, difference } = evaluateRelief(block, i, w);
        return flow * difference;
      },
      explain: {
        equation: 'P = Q·Δp',
        where: 'Q flow through the relief',
        inputs: ['flow', 'drop'],
        assumptions: [],
        limits: S.AS_INPUTS,
        source: S.RELIEF_SIZE,
      },
    },
    {
      id: 'cracksAt',
      label: 'Cracks at',
      quantity: 'pressure',
      value: (block, i, w) => evaluateRelief(block, i, w).cracking,
      explain: {
        equation: 'cracking = set/(1 + override)',
        where: 'a weak spring takes up to half of it',
        inputs: ['setPressure', 'override'],
        assumptions: [],
        limits: 'Pressure over the tank port.',
        source: S.RELIEF,
      },
    },
  ],
  checks: (plate) => {
    const words: string[] = [];
    if (plate.choice('type') === 'direct' && plate.number('override') < 0.12) {
      words.push('an override of a direct-acting valve is usually 15 to 50 %');
    }
    if (plate.choice('type') === 'pilot' && plate.number('override') > 0.15) {
      words.push('an override of a pilot-operated valve is usually 3 to 12 %');
    }
    return words;
  },
  passes: [],
});
