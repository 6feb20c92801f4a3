import { expect, test } from 'vitest';
import { guest, operator } from '#server/access/actor.ts';
import { mayWithShops } from './shops.policy.ts';

test.each([
  [guest, 'list', false],
  [guest, 'create', false],
  [guest, 'rename', false],
  [operator, 'list', true],
  [operator, 'create', true],
  [operator, 'rename', true],
] as const)('%o may %s: %s', (actor, action, answer) => {
  expect(mayWithShops(actor, action)).toBe(answer);
});
