import { portValue } from '../access.ts';
import { indices, severity } from '../build.ts';
import { defineKind, type Plate, type RunConstants } from '../kind.ts';
import { pumpFaults, pumpInputs, pumpScrews } from './adjusters.ts';
import { DRAIN, evaluatePump, OUTLET, pumpCoefficients, pumpEntries, pumpFlow, pumpJacobian, SHAFT, SUCTION } from './kernel.ts';
import { frictionFromEfficiency, INLET_WARNING } from './laws.ts';
import { pumpParameters } from './parameters.ts';
import { pumpReadings } from './readings.ts';

const C = indices(pumpCoefficients);
/** Reverse speed from which running backwards is logged [rad/s]. */
const BACKWARDS = 5;

function prepare(plate: Plate, run: RunConstants): Record<(typeof pumpCoefficients)[number], number> {
  const displacement = plate.number('displacement');
  const thinner = run.referenceViscosity / run.viscosity;
  const friction = frictionFromEfficiency(displacement, plate.number('torqueEfficiency'));
  const most = plate.number('maxVolumeStop') / displacement;
  const least = plate.number('minVolumeStop') / displacement;
  return {
    displacement,
    band: plate.number('band'),
    destrokeLag: plate.number('destrokeLag'),
    onstrokeLag: plate.number('onstrokeLag'),
    leakage: plate.given('raw.leakage') ?? plate.number('leakage') * thinner,
    viscous: plate.given('raw.viscousDrag') ?? friction.viscous / thinner,
    coulomb: plate.given('raw.coulombTorque') ?? friction.coulomb,
    pressureFriction: plate.given('raw.pressureFriction') ?? friction.pressure,
    fullTorque: displacement * plate.number('compensatorPressure'),
    ratedSpeed: plate.number('ratedSpeed'),
    atmosphere: run.atmosphere,
    startStroke: most + severity(plate, 'stuck-off-stroke') * (least - most),
  };
}

export const compensatedPump = defineKind({
  id: 'compensated-pump',
  version: 1,
  title: 'Compensated pump',
  word: 'pump',
  letter: 'P',
  stage: 'pump',
  about:
    'Variable axial piston pump with pressure compensator, maximum- and minimum-volume stop. The compensator acts on the pressure over the case drain and takes the pump to zero flow within its band; it is a control, not a safety device. Leakage goes to the case drain. Driven backwards it works as a motor. Flow ripple, control flow and the mass of the swash plate are left out.',
  parameters: pumpParameters,
  faults: pumpFaults,
  ports: [
    { id: 'suction', letter: 'S', label: 'Suction', medium: 'oil', role: 'inlet', whenOpen: 'tank' },
    {
      id: 'outlet',
      letter: 'P',
      label: 'Outlet',
      medium: 'oil',
      role: 'outlet',
      whenOpen: 'problem',
      source: true,
      deadVolume: (plate) => plate.number('deadVolume'),
    },
    { id: 'drain', letter: 'L', label: 'Case drain', medium: 'oil', role: 'drain', whenOpen: 'tank' },
    { id: 'shaft', letter: '', label: 'Shaft', medium: 'shaft', role: 'inlet', whenOpen: 'problem' },
  ],
  states: [{ id: 'stroke', label: 'Stroke', quantity: 'fraction', nominal: 0.1, start: (c) => c.startStroke ?? 1 }],
  inputs: pumpInputs,
  screws: pumpScrews,
  coefficients: pumpCoefficients,
  prepare,
  inertia: (plate) => plate.number('inertia'),
  entries: pumpEntries,
  flow: pumpFlow,
  jacobian: pumpJacobian,
  powers: (block, i, w, out) => {
    const point = evaluatePump(block, i, w);
    out.heat += point.friction * portValue(block, i, SHAFT, w);
    out.heat += point.leak * (portValue(block, i, OUTLET, w) - portValue(block, i, DRAIN, w));
  },
  signals: [
    {
      id: 'compensating',
      rises: 'compensator leaves its stop',
      falls: 'compensator back on its stop',
      value: (block, i, w) => {
        const { knee } = evaluatePump(block, i, w);
        return portValue(block, i, OUTLET, w) - portValue(block, i, DRAIN, w) - knee;
      },
    },
    {
      id: 'inlet-low',
      rises: 'pump inlet under 0.8 bar absolute',
      falls: 'pump inlet above 0.8 bar absolute',
      value: (block, i, w) => INLET_WARNING - portValue(block, i, SUCTION, w) - block.c[i * block.coefficientCount + C.atmosphere]!,
    },
    {
      id: 'backwards',
      rises: 'pump runs backwards',
      falls: 'pump no longer runs backwards',
      value: (block, i, w) => -portValue(block, i, SHAFT, w) - BACKWARDS,
    },
  ],
  trips: [],
  readings: pumpReadings,
  checks: (plate) => {
    const words: string[] = [];
    if (plate.number('maxVolumeStop') > plate.number('displacement')) words.push('the max. volume stop is above the displacement');
    if (plate.number('minVolumeStop') >= plate.number('maxVolumeStop'))
      words.push('the min. volume stop is not below the max. volume stop');
    return words;
  },
  passes: [],
});
