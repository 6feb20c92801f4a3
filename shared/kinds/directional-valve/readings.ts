import { inputValue, portValue, pushedOut } from '../access.ts';
import type { ReadingSpec } from '../kind.ts';
import * as S from '../sources.ts';
import { A, B, P, T, valveHeat } from './kernel.ts';

const EDGES = 'Q = K·opening·√Δp through each edge, linear within 0.2 bar';
const SOURCE = S.ORIFICE;

function portFlow(id: string, letter: string, port: number): ReadingSpec {
  return {
    id,
    label: `Flow into ${letter}`,
    quantity: 'flow',
    value: (block, i, w) => -pushedOut(block, i, port, w),
    explain: {
      equation: `${EDGES}; sum of the edges at ${letter}, positive into the valve`,
      where: 'K = rated flow/√(rated drop); opening from 0 at a tenth of the spool’s travel to 1 at its end',
      inputs: ['ratedFlow', 'ratedDrop', 'leakage', 'spool'],
      assumptions: ['All four main edges alike.'],
      limits: 'Spool position follows the duty; flow forces are left out.',
      source: SOURCE,
    },
  };
}

export const valveReadings: readonly ReadingSpec[] = [
  {
    id: 'spool',
    label: 'Spool',
    quantity: 'number',
    value: (block, i, w) => inputValue(block, i, 0, w),
    explain: {
      equation: 'straight ramp to the position asked for on the tape',
      where: '1 solenoid a, −1 solenoid b of a 4/3 valve; 0 at rest',
      inputs: ['spool'],
      assumptions: ['Shifting takes the flag’s ramp, usually 40 to 60 ms.'],
      limits: S.AS_INPUTS,
      source: S.TYPICAL,
    },
  },
  portFlow('flowP', 'P', P),
  portFlow('flowA', 'A', A),
  portFlow('flowB', 'B', B),
  portFlow('flowT', 'T', T),
  {
    id: 'heat',
    label: 'Heat made in the valve',
    quantity: 'power',
    value: valveHeat,
    explain: {
      equation: 'sum of Q·Δp over the five edges',
      where: EDGES,
      inputs: ['flowP', 'flowA', 'flowB', 'flowT'],
      assumptions: [],
      limits: S.AS_INPUTS,
      source: S.THROTTLING_HEAT,
    },
  },
  {
    id: 'highestPressure',
    label: 'Highest pressure at P, A or B',
    quantity: 'pressure',
    value: (block, i, w) => Math.max(portValue(block, i, P, w), portValue(block, i, A, w), portValue(block, i, B, w)),
    explain: {
      equation: 'the largest of pP, pA, pB',
      where: 'port pressures',
      inputs: ['P.pressure', 'A.pressure', 'B.pressure'],
      assumptions: [],
      limits: S.AS_INPUTS,
      source: S.DEFINITION,
    },
  },
];
