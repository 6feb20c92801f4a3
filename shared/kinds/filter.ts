import { orifice, orificeSlope, smoothStep, smoothStepSlope } from '../numerics/smooth.ts';
import { coefficient, inputValue } from './access.ts';
import { BAR, indices, LITRE_PER_MINUTE, number, settingInput } from './build.ts';
import { type Block, defineKind, type Workspace } from './kind.ts';
import * as S from './sources.ts';
import { dropAcross, dropReading, flowReading, passFlow, passSlope, throughEntries } from './two-port.ts';

const names = ['element', 'bypass', 'opens'] as const;
const C = indices(names);
const LAMINAR = 1e4;
/** Pressure from the start of the bypass opening to fully open [Pa]. */
const SPAN = 1e5;
/** Share of the clean element that a wholly clogged one still passes. */
const CLOGGED = 1e-4;

const LAW = 'Q = (1 − clogging)·K·√Δp + Kbypass·S((Δp − bypass)/1 bar)·√Δp';

function element(block: Block, i: number, w: Workspace): number {
  const clogging = inputValue(block, i, 0, w);
  return coefficient(block, i, C.element) * (CLOGGED + (1 - CLOGGED) * (1 - clogging));
}

function bypass(block: Block, i: number, d: number): number {
  return coefficient(block, i, C.bypass) * smoothStep((d - coefficient(block, i, C.opens)) / SPAN);
}

function bypassFlow(block: Block, i: number, w: Workspace): number {
  const d = dropAcross(block, i, w);
  return orifice(bypass(block, i, d), d, LAMINAR);
}

function through(block: Block, i: number, w: Workspace): number {
  const d = dropAcross(block, i, w);
  return orifice(element(block, i, w), d, LAMINAR) + bypassFlow(block, i, w);
}

export const filter = defineKind({
  id: 'filter',
  version: 1,
  title: 'Filter',
  word: 'filter',
  letter: 'Z',
  stage: 'return',
  about:
    'A filter element with a bypass valve beside it. Clogging takes its share off the element’s flow coefficient; the bypass opens at its pressure and is full 1 bar above. The element’s drop is taken as that of an orifice at the run’s viscosity.',
  parameters: [
    number(
      'plate',
      'ratedFlow',
      'Rated flow',
      'flow',
      60 * LITRE_PER_MINUTE,
      [0.1 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
      'Flow at the rated drop with a clean element.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number(
      'plate',
      'ratedDrop',
      'Rated drop, clean',
      'pressure',
      0.5 * BAR,
      [0.02 * BAR, 20 * BAR],
      'Pressure drop of the clean element at the rated flow.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number('setting', 'clogging', 'Clogging', 'fraction', 0, [0, 1], '0 clean, 1 wholly blocked.', S.PRACTICE, { equation: LAW }),
    number(
      'plate',
      'bypassPressure',
      'Bypass opens at',
      'pressure',
      2 * BAR,
      [0.2 * BAR, 50 * BAR],
      'Pressure difference at which the bypass starts to open.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number(
      'plate',
      'ratedPressure',
      'Rated pressure',
      'pressure',
      null,
      [0.5 * BAR, 1000 * BAR],
      'Highest pressure at the inlet.',
      S.PRACTICE,
      { ratingOf: 'A.pressure' },
    ),
  ],
  faults: [],
  ports: [
    { id: 'A', letter: 'A', label: 'Inlet', medium: 'oil', role: 'inlet', whenOpen: 'plugged' },
    { id: 'B', letter: 'B', label: 'Outlet', medium: 'oil', role: 'outlet', whenOpen: 'tank' },
  ],
  states: [],
  inputs: [settingInput('clogging', 'Clogging', 'fraction', [0, 1], 1)],
  screws: [],
  coefficients: names,
  prepare: (plate) => {
    const flow = plate.number('ratedFlow');
    const opens = plate.number('bypassPressure');
    return {
      element: flow / orifice(1, plate.number('ratedDrop'), LAMINAR),
      // The open bypass passes the rated flow 1 bar above its opening pressure.
      bypass: flow / orifice(1, opens + SPAN, LAMINAR),
      opens,
    };
  },
  entries: throughEntries,
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) passFlow(block, i, w, through(block, i, w));
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const d = dropAcross(block, i, w);
      const opens = coefficient(block, i, C.opens);
      const slope = (coefficient(block, i, C.bypass) * smoothStepSlope((d - opens) / SPAN)) / SPAN;
      const k = element(block, i, w) + bypass(block, i, d);
      passSlope(block, i, w, k * orificeSlope(d, LAMINAR) + slope * orifice(1, d, LAMINAR));
    }
  },
  powers: (block, i, w, out) => {
    out.heat += through(block, i, w) * dropAcross(block, i, w);
  },
  signals: [
    {
      id: 'bypass',
      rises: 'filter bypass opens',
      falls: '',
      value: (block, i, w) => dropAcross(block, i, w) - coefficient(block, i, C.opens),
    },
  ],
  trips: [],
  readings: [
    flowReading(
      LAW,
      'K coefficient of the clean element, Kbypass of the open bypass, S smooth step from 0 to 1',
      ['clogging', 'ratedFlow', 'ratedDrop', 'bypassPressure', 'A.pressure', 'B.pressure'],
      'Real elements are partly laminar and drop more in cold oil.',
      S.ORIFICE,
    ),
    dropReading,
    {
      id: 'bypassFlow',
      label: 'Flow past the element',
      quantity: 'flow',
      value: bypassFlow,
      explain: {
        equation: 'Q = Kbypass·S((Δp − bypass)/1 bar)·√Δp',
        where: 'S smooth step from 0 to 1',
        inputs: ['bypassPressure', 'drop'],
        assumptions: ['The open bypass passes the rated flow 1 bar above its opening pressure.'],
        limits: 'Static: no poppet mass.',
        source: S.ORIFICE,
      },
    },
  ],
  passes: [
    ['A', 'B'],
    ['B', 'A'],
  ],
});
