import { BAR, choice, LITRE_PER_MINUTE, number, raw } from '../build.ts';
import type { ParameterSpec, PortSpec } from '../kind.ts';
import * as S from '../sources.ts';

/** What the 4/3 and the 4/2 valve have in common. */

const EDGE = 'Q = K·√Δp through each edge, linear within 0.2 bar; K = rated flow/√(rated drop)';

export const valveParameters: readonly ParameterSpec[] = [
  number(
    'plate',
    'ratedFlow',
    'Rated flow',
    'flow',
    60 * LITRE_PER_MINUTE,
    [0.1 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
    'Flow through one edge, fully shifted, at the rated drop.',
    S.PRACTICE,
    { equation: EDGE },
  ),
  number(
    'plate',
    'ratedDrop',
    'Rated drop per edge',
    'pressure',
    5 * BAR,
    [0.05 * BAR, 100 * BAR],
    'Pressure drop across one edge at the rated flow.',
    S.TYPICAL,
    {
      typical: [2 * BAR, 10 * BAR],
      equation: EDGE,
    },
  ),
  number(
    'detail',
    'leakage',
    'Spool leakage per edge',
    'leakage',
    (2.5e-4 * LITRE_PER_MINUTE) / BAR,
    [0, (0.1 * LITRE_PER_MINUTE) / BAR],
    'Leakage of a closed edge at 200 bar divided by 200 bar (50 mL/min at 200 bar), with ISO VG 46 at 40 °C.',
    S.TYPICAL,
    { equation: 'K of the closed edge = leakage·√(200 bar)·μ_ref/μ' },
  ),
  number(
    'plate',
    'ratedPressure',
    'Rated pressure',
    'pressure',
    null,
    [1 * BAR, 1000 * BAR],
    'Highest pressure at P, A or B.',
    S.PRACTICE,
    {
      ratingOf: 'highestPressure',
    },
  ),
  raw('edge', 'Edge coefficient (raw)', 'flowCoefficient', [1e-12, 1e-2], 'Kd: an edge fully open.', EDGE),
  raw('edgeLeakage', 'Closed-edge coefficient (raw)', 'flowCoefficient', [0, 1e-6], 'Kdl: an edge closed.', EDGE),
];

export const centreParameters: readonly ParameterSpec[] = [
  choice(
    'plate',
    'centre',
    'Centre',
    [
      ['closed', 'closed (all ports shut)'],
      ['open', 'open (all ports joined)'],
      ['tandem', 'tandem (P to T)'],
      ['float', 'float (A and B to T, P shut)'],
    ],
    'tandem',
    'Which ports the spool joins when neither solenoid is on. A spool does not hold a load in any of them.',
    S.SYMBOLS,
  ),
  raw('centre', 'Centre coefficient (raw)', 'flowCoefficient', [0, 1e-2], 'Kpt: an edge that the centre joins.', EDGE),
];

export const valvePorts: readonly PortSpec[] = [
  { id: 'P', letter: 'P', label: 'Pressure port', medium: 'oil', role: 'inlet', whenOpen: 'problem' },
  { id: 'T', letter: 'T', label: 'Tank port', medium: 'oil', role: 'outlet', whenOpen: 'tank' },
  { id: 'A', letter: 'A', label: 'Port A', medium: 'oil', role: 'either', whenOpen: 'plugged' },
  { id: 'B', letter: 'B', label: 'Port B', medium: 'oil', role: 'either', whenOpen: 'plugged' },
];
