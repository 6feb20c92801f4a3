import type { CircuitDocument } from '../schema.ts';
import { addComponent } from './components.ts';
import { addCommand } from './duty.ts';
import { emptyCircuit } from './empty-circuit.ts';
import { connect } from './joins.ts';

/** A small bench built only by edits, for tests: motor and pump on one shaft, pump line to a 4/3 valve with a relief on a
 *  branch, cylinder, tanks. Ids: m1 p1 v1 (valve) v2 (relief) a1 j1 t1 t2. */
export function builtPress(): CircuitDocument {
  let document = emptyCircuit('Built press');
  const add = (kind: string, x: number, y: number) => {
    const added = addComponent(document, kind, { x, y });
    document = added.document;
    return added.componentId as string;
  };
  const join = (a: string, b: string, at = { x: 20, y: 10 }) => {
    const [from, to] = [a, b].map((text) => {
      const [component = '', port = ''] = text.split('.');
      return { component, port };
    });
    const joined = connect(document, from as never, to as never, at);
    if (joined.problem) throw new Error(joined.problem);
    document = joined.document;
  };
  add('electric-motor', 0, 20);
  add('compensated-pump', 12, 16);
  add('directional-valve-4-3', 40, 18);
  add('relief-valve', 28, 20);
  add('cylinder', 44, 2);
  add('tank', 20, 30);
  add('tank', 44, 30);
  join('m1.shaft', 'p1.shaft');
  join('p1.outlet', 'v1.P');
  join('v2.P', 'p1.outlet');
  join('v1.A', 'a1.A');
  join('v1.B', 'a1.B');
  join('v2.T', 't1.T');
  join('v1.T', 't2.T');
  const commands = [
    { time: 0.1, target: 'm1', input: 'contactor', value: 1, label: 'Start' },
    { time: 0.8, target: 'v1', input: 'spool', value: 1, label: 'Solenoid a on' },
  ];
  for (const command of commands) document = addCommand(document, command).document;
  return document;
}

/** Small seeded generator (mulberry32) for property tests: numbers from 0 to 1. */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}
