import { coefficient, portValue, pushedOut, stateValue } from '../access.ts';
import { indices } from '../build.ts';
import type { Block, Explanation, ReadingSpec, Workspace } from '../kind.ts';
import * as S from '../sources.ts';
import { DRAIN, evaluatePump, OUTLET, pumpCoefficients, SHAFT, SUCTION } from './kernel.ts';

const C = indices(pumpCoefficients);

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

/** Flow out of the outlet port [m³/s]. */
function outletFlow(block: Block, i: number, w: Workspace): number {
  return pushedOut(block, i, OUTLET, w);
}

/** Torque that the pump takes from the shaft [N·m]. */
function torque(block: Block, i: number, w: Workspace): number {
  return -pushedOut(block, i, SHAFT, w);
}

export const pumpReadings: readonly ReadingSpec[] = [
  {
    id: 'stroke',
    label: 'Stroke',
    quantity: 'fraction',
    value: (block, i, w) => stateValue(block, i, 0, w),
    explain: explain(
      'dα/dt = (command − α)/lag; command = (setting − Δp)/band, held between the stops',
      'Δp outlet − case drain; lag the destroke lag when falling, the on-stroke lag when rising',
      ['compensatorPressure', 'band', 'maxVolumeStop', 'minVolumeStop', 'destrokeLag', 'onstrokeLag'],
      'First order: the swash plate’s own mass and spool are left out.',
      S.COMPENSATOR,
      ['Catalogue stroke times are for the whole stroke: lag = time/3.'],
    ),
  },
  {
    id: 'displacement',
    label: 'Displacement now',
    quantity: 'displacement',
    value: (block, i, w) => stateValue(block, i, 0, w) * coefficient(block, i, C.displacement),
    explain: explain('Vg = α·D', 'α stroke, D displacement', ['stroke', 'displacement'], S.AS_INPUTS, S.PUMP_FLOW),
  },
  {
    id: 'flow',
    label: 'Flow at the outlet',
    quantity: 'flow',
    value: outletFlow,
    explain: explain(
      'Q = α·D·w·filling − kLeak·(p outlet − p case drain)·μ_ref/μ',
      'α stroke, D displacement, w shaft speed',
      ['stroke', 'displacement', 'leakage', 'filling', 'outletPressure'],
      'No flow ripple.',
      S.PUMP_FLOW,
    ),
  },
  {
    id: 'torque',
    label: 'Torque taken',
    quantity: 'torque',
    value: torque,
    explain: explain(
      'T = α·D·Δp + cV·w + (Tc0 + kTp·D·|Δp|)·sign(w)',
      'Δp outlet − suction; cV, Tc0, kTp from the torque efficiency',
      ['stroke', 'displacement', 'torqueEfficiency', 'outletPressure'],
      'Friction does not show the minimum that real pumps have at low speed.',
      S.PUMP_LOSS,
      ['Viscous part with the run’s viscosity over that of ISO VG 46 at 40 °C.'],
    ),
  },
  {
    id: 'caseFlow',
    label: 'Case drain flow',
    quantity: 'flow',
    value: (block, i, w) => pushedOut(block, i, DRAIN, w),
    explain: explain(
      'Q = kLeak·(p outlet − p case drain)·μ_ref/μ',
      'kLeak leakage per bar',
      ['leakage', 'outletPressure'],
      'Laminar; no control flow of the compensator.',
      S.CASE_DRAIN,
    ),
  },
  {
    id: 'outletPressure',
    label: 'Outlet pressure',
    quantity: 'pressure',
    value: (block, i, w) => portValue(block, i, OUTLET, w),
    explain: explain(
      'dp/dt = K/V·(sum of flows into the net)',
      'K effective modulus, V volume of the net',
      ['outlet.pressure'],
      'One pressure in the whole net.',
      S.CONTINUITY,
    ),
  },
  {
    id: 'suctionPressure',
    label: 'Inlet pressure, absolute',
    quantity: 'pressure',
    value: (block, i, w) => portValue(block, i, SUCTION, w) + coefficient(block, i, C.atmosphere),
    explain: explain(
      'p abs = p + atmosphere',
      'atmosphere from the altitude',
      ['suction.pressure'],
      'Warning under 0.8 bar absolute.',
      S.INLET,
    ),
  },
  {
    id: 'shaftPower',
    label: 'Shaft power taken',
    quantity: 'power',
    value: (block, i, w) => torque(block, i, w) * portValue(block, i, SHAFT, w),
    explain: explain('P = T·w', 'T torque taken, w speed', ['torque'], S.AS_INPUTS, S.POWER),
  },
  {
    id: 'hydraulicPower',
    label: 'Hydraulic power',
    quantity: 'power',
    value: (block, i, w) => outletFlow(block, i, w) * (portValue(block, i, OUTLET, w) - portValue(block, i, SUCTION, w)),
    explain: explain('P = Q·Δp', 'Q flow at the outlet, Δp outlet − suction', ['flow', 'outletPressure'], S.AS_INPUTS, S.POWER),
  },
  {
    id: 'filling',
    label: 'Filling',
    quantity: 'fraction',
    value: (block, i, w) => evaluatePump(block, i, w).filling,
    explain: explain(
      'from 1 to 0 between 0.5 and 0.2 bar absolute at the self-priming speed, smoothly; both limits with the square of speed',
      'inlet pressure absolute, shaft speed',
      ['suctionPressure', 'ratedSpeed'],
      'A rule of thumb; the maker’s inlet curve prevails.',
      S.PRACTICE,
    ),
  },
];
