import type { Rig } from './testing.ts';

/** Seeded random states for checks of kinds. */

/** Numbers 0 … 1 from a seed (xorshift). */
export function seeded(seed: number): () => number {
  let state = seed | 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 4294967296;
  };
}

const spans: Readonly<Record<string, readonly [number, number]>> = {
  stroke: [0, 1],
  lift: [0, 1.1],
  position: [-0.0005, 0.5005],
  velocity: [-0.4, 0.4],
  shown: [0, 250e5],
  overloadHeat: [0, 1.2],
};

/** Moves every port, state and command of a rig, and its faults when asked. */
export function scatter(rig: Rig, random: () => number, faults: boolean): void {
  for (const port of rig.kind.ports) {
    if (port.medium === 'shaft') rig.set(port.id, -20 + 200 * random());
    else rig.set(port.id, random() < 0.2 ? -0.9e5 + 1e5 * random() : 250e5 * random() * random());
  }
  for (const state of rig.kind.states) {
    const [low, high] = spans[state.id] ?? [0, 1];
    rig.set(`state:${state.id}`, low + (high - low) * random());
  }
  for (const input of rig.kind.inputs) {
    if (input.role === 'command') rig.set(input.id, input.min + (input.max - input.min) * random());
    if (input.id === 'opening' || input.id === 'clogging') rig.set(input.id, random());
    if (input.id === 'minVolumeStop') rig.set(input.id, 1e-6 * random());
    if (input.id === 'supplyVoltage') rig.set(input.id, 300 + 150 * random());
    if (input.id === 'supplyFrequency') rig.set(input.id, 45 + 20 * random());
  }
  if (faults) for (const fault of rig.kind.faults) rig.set(fault.id, random());
}
