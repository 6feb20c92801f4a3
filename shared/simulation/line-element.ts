import { type Block, defineKind, type Powers, type Workspace } from '../kinds/kind.ts';
import { lineFlow, lineFlowSlope } from '../numerics/smooth.ts';

/** A line with loss, between two nodes: from its end 'from' to its end 'to' flows Q with Rl·Q + Rq·Q·|Q| = p_from − p_to.
 *  Not a part of the drawer: compiling makes one from every line whose loss is on. */

function drop(block: Block, i: number, w: Workspace): number {
  return w.y[block.port[2 * i]!]! - w.y[block.port[2 * i + 1]!]!;
}

function flowOf(block: Block, i: number, w: Workspace): number {
  return lineFlow(block.c[2 * i]!, block.c[2 * i + 1]!, drop(block, i, w));
}

export const lineElement = defineKind({
  id: 'line',
  version: 1,
  title: 'Line',
  word: 'line',
  letter: '',
  stage: 'direct',
  about: 'Pressure loss of a line: a laminar and a quadratic part.',
  parameters: [],
  faults: [],
  ports: [
    { id: 'from', letter: '', label: 'From', medium: 'oil', role: 'either', whenOpen: 'plugged' },
    { id: 'to', letter: '', label: 'To', medium: 'oil', role: 'either', whenOpen: 'plugged' },
  ],
  states: [],
  inputs: [],
  screws: [],
  coefficients: ['laminar', 'quadratic'],
  prepare: () => ({}),
  entries: [
    ['from', 'from'],
    ['from', 'to'],
    ['to', 'from'],
    ['to', 'to'],
  ],
  flow(block, w) {
    for (let i = 0; i < block.count; i++) {
      const q = flowOf(block, i, w);
      w.balance[block.balance[2 * i]!]! -= q;
      w.balance[block.balance[2 * i + 1]!]! += q;
    }
  },
  jacobian(block, w) {
    for (let i = 0; i < block.count; i++) {
      const g = lineFlowSlope(block.c[2 * i]!, block.c[2 * i + 1]!, drop(block, i, w));
      const at = 4 * i;
      w.jac[block.slot[at]!]! -= g;
      w.jac[block.slot[at + 1]!]! += g;
      w.jac[block.slot[at + 2]!]! += g;
      w.jac[block.slot[at + 3]!]! -= g;
    }
  },
  powers(block, i, w, out: Powers) {
    out.heat += flowOf(block, i, w) * drop(block, i, w);
  },
  signals: [],
  trips: [],
  readings: [],
  passes: [
    ['from', 'to'],
    ['to', 'from'],
  ],
});
