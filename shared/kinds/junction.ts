import { choice } from './build.ts';
import { defineKind, type PortSpec } from './kind.ts';

function arm(id: string): PortSpec {
  return { id, letter: '', label: `Arm ${id}`, medium: 'oil', role: 'either', whenOpen: 'plugged', node: 'joint' };
}

export const junction = defineKind({
  id: 'junction',
  version: 1,
  title: 'Junction',
  word: 'tee',
  letter: '',
  stage: 'direct',
  about: 'Joins three or four lines into one net. It has no drop of its own.',
  parameters: [
    choice(
      'plate',
      'shape',
      'Shape',
      [
        ['tee', 'tee'],
        ['cross', 'cross'],
      ],
      'tee',
      'A tee has three arms, a cross four.',
      'drawing',
    ),
  ],
  faults: [],
  ports: [arm('a'), arm('b'), arm('c'), arm('d')],
  states: [],
  inputs: [],
  screws: [],
  coefficients: [],
  prepare: () => ({}),
  entries: [],
  flow: () => {},
  jacobian: () => {},
  powers: () => {},
  signals: [],
  trips: [],
  readings: [],
  passes: [
    ['a', 'b'],
    ['b', 'a'],
    ['a', 'c'],
    ['c', 'a'],
    ['a', 'd'],
    ['d', 'a'],
  ],
});
