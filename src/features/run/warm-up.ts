import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';

/** A short run of a real circuit, so that the browser has compiled the kernels before the first screw is turned. */
export const warmUpCircuit: CircuitDocument = {
  ...demoCircuit,
  duty: { ...demoCircuit.duty, duration: 1 },
};
