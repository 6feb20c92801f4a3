import { orifice, orificeSlope } from '../numerics/smooth.ts';
import { coefficient, inputValue } from './access.ts';
import { BAR, indices, LITRE_PER_MINUTE, number, raw, settingInput } from './build.ts';
import { type Block, defineKind, type Workspace } from './kind.ts';
import * as S from './sources.ts';
import { dropAcross, dropReading, flowReading, passFlow, passSlope, throughEntries } from './two-port.ts';

const names = ['k'] as const;
const C = indices(names);
const LAMINAR = 1e4;
/** Share of the full opening that a shut needle still passes. */
const SHUT = 1e-6;

const LAW = 'Q = opening·K·√Δp, K = rated flow/√(rated drop)';

function conductance(block: Block, i: number, w: Workspace): number {
  return coefficient(block, i, C.k) * (SHUT + (1 - SHUT) * inputValue(block, i, 0, w));
}

function through(block: Block, i: number, w: Workspace): number {
  return orifice(conductance(block, i, w), dropAcross(block, i, w), LAMINAR);
}

export const throttle = defineKind({
  id: 'throttle',
  version: 1,
  title: 'Throttle',
  word: 'throttle',
  letter: 'V',
  stage: 'direct',
  about:
    'A sharp-edged adjustable restriction, the same in both directions: flow goes with the opening and the square root of the pressure drop. It sheds power as heat. Viscosity has no influence on it here.',
  parameters: [
    number('setting', 'opening', 'Opening', 'fraction', 1, [0, 1], 'Share of the full opening.', S.PRACTICE, { equation: LAW }),
    number('detail', 'leastOpening', 'Opening, least', 'fraction', 0, [0, 1], 'Lower end of the adjustable range.', S.PRACTICE),
    number('detail', 'mostOpening', 'Opening, most', 'fraction', 1, [0, 1], 'Upper end of the adjustable range.', S.PRACTICE),
    number(
      'detail',
      'openingPerTurn',
      'Opening, per turn',
      'fraction',
      0.2,
      [0.001, 1],
      'Change of the opening for one turn in (smaller).',
      S.PRACTICE,
    ),
    number(
      'plate',
      'ratedFlow',
      'Rated flow',
      'flow',
      60 * LITRE_PER_MINUTE,
      [0.01 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
      'Flow at the rated drop, fully open.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number(
      'plate',
      'ratedDrop',
      'Rated drop',
      'pressure',
      10 * BAR,
      [0.05 * BAR, 500 * BAR],
      'Pressure drop at the rated flow, fully open.',
      S.PRACTICE,
      { equation: LAW },
    ),
    number('plate', 'ratedPressure', 'Rated pressure', 'pressure', null, [1 * BAR, 1000 * BAR], 'Highest pressure at port A.', S.PRACTICE, {
      ratingOf: 'A.pressure',
    }),
    raw('flowCoefficient', 'Flow coefficient, fully open (raw)', 'flowCoefficient', [1e-12, 1e-2], 'K.', LAW),
  ],
  faults: [],
  ports: [
    { id: 'A', letter: 'A', label: 'Port A', medium: 'oil', role: 'either', whenOpen: 'plugged' },
    { id: 'B', letter: 'B', label: 'Port B', medium: 'oil', role: 'either', whenOpen: 'plugged' },
  ],
  states: [],
  inputs: [settingInput('opening', 'Opening', 'fraction', [0, 1], 0.2)],
  screws: [
    {
      id: 'opening',
      label: 'Throttle',
      short: 'throttle',
      perTurn: 'openingPerTurn',
      least: 'leastOpening',
      most: 'mostOpening',
      inward: 'lowers',
      anchor: 'opening',
    },
  ],
  coefficients: names,
  prepare: (plate) => ({
    k: plate.given('raw.flowCoefficient') ?? plate.number('ratedFlow') / orifice(1, plate.number('ratedDrop'), LAMINAR),
  }),
  entries: throughEntries,
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) passFlow(block, i, w, through(block, i, w));
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      passSlope(block, i, w, conductance(block, i, w) * orificeSlope(dropAcross(block, i, w), LAMINAR));
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
      'K coefficient fully open, Δp drop from A to B',
      ['opening', 'ratedFlow', 'ratedDrop', 'A.pressure', 'B.pressure'],
      'Sharp edge: no influence of viscosity; linear within 0.1 bar; a shut throttle still passes a millionth.',
      S.ORIFICE,
    ),
    dropReading,
  ],
  // An adjustable throttle can be shut: it does not count as open.
  passes: [],
});
