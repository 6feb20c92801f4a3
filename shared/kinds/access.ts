import type { Block, Workspace } from './kind.ts';

/** Reading one component's numbers out of the flat arrays of its block. `i` is the instance, the last index the position in
 *  the kind's own list (coefficients, ports, states, inputs). */

export function coefficient(block: Block, i: number, k: number): number {
  return block.c[i * block.coefficientCount + k]!;
}

/** Pressure [Pa gauge] or speed [rad/s] at a port. */
export function portValue(block: Block, i: number, port: number, w: Workspace): number {
  return w.y[block.port[i * block.portCount + port]!]!;
}

/** Flow [m³/s] or torque [N·m] that the component pushed INTO the node at a port, after a flow pass made for reading. */
export function pushedOut(block: Block, i: number, port: number, w: Workspace): number {
  return w.balance[block.balance[i * block.portCount + port]!]!;
}

export function stateValue(block: Block, i: number, state: number, w: Workspace): number {
  return w.y[block.state[i * block.stateCount + state]!]!;
}

export function inputValue(block: Block, i: number, input: number, w: Workspace): number {
  return w.u[block.input[i * block.inputCount + input]!]!;
}
