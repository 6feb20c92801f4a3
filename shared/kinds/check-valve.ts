import { orifice, orificeSlope, smoothStep, smoothStepSlope } from '../numerics/smooth.ts';
import { coefficient } from './access.ts';
import { BAR, indices, LITRE_PER_MINUTE, number, raw } from './build.ts';
import { type Block, defineKind, type Workspace } from './kind.ts';
import * as S from './sources.ts';
import { dropAcross, dropReading, flowReading, passFlow, passSlope, throughEntries } from './two-port.ts';

const names = ['k', 'cracking', 'span', 'leak'] as const;
const C = indices(names);
/** Half width of the laminar zone [Pa], and the span over which the poppet opens [Pa]. */
const LAMINAR = 1e4;
const SPAN = 1e5;

const LAW = 'Q = (K·S((Δp − cracking)/span) + Kleak)·√Δp';

/** Flow coefficient of the open valve from its rated flow at its rated drop. */
export function checkCoefficient(ratedFlow: number, ratedDrop: number): number {
  return ratedFlow / orifice(1, ratedDrop, LAMINAR);
}

function opening(block: Block, i: number, d: number): number {
  const share = smoothStep((d - coefficient(block, i, C.cracking)) / coefficient(block, i, C.span));
  return coefficient(block, i, C.k) * share + coefficient(block, i, C.leak);
}

function through(block: Block, i: number, w: Workspace): number {
  const d = dropAcross(block, i, w);
  return orifice(opening(block, i, d), d, LAMINAR);
}

export const checkValve = defineKind({
  id: 'check-valve',
  version: 1,
  title: 'Check valve',
  word: 'check',
  letter: 'V',
  stage: 'protect',
  about:
    'Opens at once when the pressure before it exceeds the pressure behind it by the cracking pressure, and fully 1 bar above that. Poppet mass and hysteresis are left out. It traps line pressure when the pump stops; it does not hold a load.',
  parameters: [
    number(
      'plate',
      'crackingPressure',
      'Cracking pressure',
      'pressure',
      0.35 * BAR,
      [0, 100 * BAR],
      'Pressure difference at which it starts to open.',
      S.TYPICAL,
      {
        typical: [0.2 * BAR, 5 * BAR],
        equation: LAW,
      },
    ),
    number(
      'plate',
      'ratedFlow',
      'Rated flow',
      'flow',
      60 * LITRE_PER_MINUTE,
      [0.1 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
      'Flow at the rated drop, fully open.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number(
      'plate',
      'ratedDrop',
      'Rated drop',
      'pressure',
      2 * BAR,
      [0.1 * BAR, 200 * BAR],
      'Pressure drop at the rated flow; above the cracking pressure.',
      S.PRACTICE,
      { equation: LAW },
    ),
    raw('flowCoefficient', 'Flow coefficient, open (raw)', 'flowCoefficient', [1e-12, 1e-2], 'Kc.', LAW),
    raw('leakCoefficient', 'Flow coefficient, shut (raw)', 'flowCoefficient', [0, 1e-6], 'Kcl; 1e-11 unless given.', LAW),
    raw('span', 'Opening span (raw)', 'pressure', [100, 1e7], 'Pressure from the start of opening to fully open; 1 bar unless given.', LAW),
  ],
  faults: [],
  ports: [
    { id: 'A', letter: 'A', label: 'Inlet', medium: 'oil', role: 'inlet', whenOpen: 'problem' },
    { id: 'B', letter: 'B', label: 'Outlet', medium: 'oil', role: 'outlet', whenOpen: 'plugged' },
  ],
  states: [],
  inputs: [],
  screws: [],
  coefficients: names,
  prepare: (plate) => {
    const cracking = plate.number('crackingPressure');
    const ratedDrop = plate.number('ratedDrop');
    return {
      k: plate.given('raw.flowCoefficient') ?? checkCoefficient(plate.number('ratedFlow'), ratedDrop),
      cracking,
      // Fully open at the rated drop even where that is less than 1 bar above cracking.
      span: plate.given('raw.span') ?? Math.max(0.05 * SPAN, Math.min(SPAN, ratedDrop - cracking)),
      leak: plate.given('raw.leakCoefficient') ?? 1e-11,
    };
  },
  entries: throughEntries,
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) passFlow(block, i, w, through(block, i, w));
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const d = dropAcross(block, i, w);
      const span = coefficient(block, i, C.span);
      const slope = (coefficient(block, i, C.k) * smoothStepSlope((d - coefficient(block, i, C.cracking)) / span)) / span;
      passSlope(block, i, w, opening(block, i, d) * orificeSlope(d, LAMINAR) + slope * orifice(1, d, LAMINAR));
    }
  },
  powers: (block, i, w, out) => {
    out.heat += through(block, i, w) * dropAcross(block, i, w);
  },
  signals: [
    {
      id: 'open',
      rises: 'check valve opens',
      falls: 'check valve closes',
      value: (block, i, w) => dropAcross(block, i, w) - coefficient(block, i, C.cracking),
    },
  ],
  trips: [],
  readings: [
    flowReading(
      LAW,
      'K coefficient of the open valve, S smooth step from 0 to 1 over the span, Kleak of the closed seat',
      ['crackingPressure', 'ratedFlow', 'ratedDrop', 'A.pressure', 'B.pressure'],
      'Static: no poppet mass; linear within 0.1 bar.',
      S.ORIFICE,
    ),
    dropReading,
  ],
  checks: (plate) =>
    plate.given('raw.flowCoefficient') === null && plate.number('ratedDrop') <= plate.number('crackingPressure')
      ? ['the rated drop is not above the cracking pressure: taken as fully open 0.05 bar above cracking']
      : [],
  passes: [['A', 'B']],
});
