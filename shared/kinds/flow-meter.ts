import { orifice, orificeSlope } from '../numerics/smooth.ts';
import { coefficient } from './access.ts';
import { BAR, LITRE_PER_MINUTE, number } from './build.ts';
import { type Block, defineKind, type Workspace } from './kind.ts';
import * as S from './sources.ts';
import { dropAcross, dropReading, flowReading, passFlow, passSlope, throughEntries } from './two-port.ts';

const names = ['k'] as const;
const LAMINAR = 1e4;
const LAW = 'Q = K·√Δp, K = rated flow/√(rated drop)';

function through(block: Block, i: number, w: Workspace): number {
  return orifice(coefficient(block, i, 0), dropAcross(block, i, w), LAMINAR);
}

export const flowMeter = defineKind({
  id: 'flow-meter',
  version: 1,
  title: 'Flow meter',
  word: 'flow meter',
  letter: 'S',
  stage: 'protect',
  about: 'Shows the flow from A to B and costs its own small pressure drop. It has no error and no lag.',
  parameters: [
    number(
      'plate',
      'ratedFlow',
      'Rated flow',
      'flow',
      60 * LITRE_PER_MINUTE,
      [0.1 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
      'Flow at the rated drop.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number(
      'plate',
      'ratedDrop',
      'Rated drop',
      'pressure',
      0.5 * BAR,
      [0.02 * BAR, 20 * BAR],
      'Pressure drop at the rated flow.',
      S.PRACTICE,
      { equation: LAW },
    ),
  ],
  faults: [],
  ports: [
    { id: 'A', letter: 'A', label: 'Inlet', medium: 'oil', role: 'either', whenOpen: 'plugged' },
    { id: 'B', letter: 'B', label: 'Outlet', medium: 'oil', role: 'either', whenOpen: 'plugged' },
  ],
  states: [],
  inputs: [],
  screws: [],
  coefficients: names,
  prepare: (plate) => ({ k: plate.number('ratedFlow') / orifice(1, plate.number('ratedDrop'), LAMINAR) }),
  entries: throughEntries,
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) passFlow(block, i, w, through(block, i, w));
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      passSlope(block, i, w, coefficient(block, i, 0) * orificeSlope(dropAcross(block, i, w), LAMINAR));
    }
  },
  powers: (block, i, w, out) => {
    out.heat += through(block, i, w) * dropAcross(block, i, w);
  },
  signals: [],
  trips: [],
  readings: [
    flowReading(
      LAW,
      'K coefficient of the meter, Δp drop from A to B',
      ['ratedFlow', 'ratedDrop', 'A.pressure', 'B.pressure'],
      'No meter error and no lag.',
      S.ORIFICE,
    ),
    dropReading,
  ],
  passes: [
    ['A', 'B'],
    ['B', 'A'],
  ],
});
