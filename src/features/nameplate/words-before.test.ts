import { expect, it } from 'vitest';
import { wordsBefore } from './words-before.ts';

it('names a figure by the words that lead to it', () => {
  expect(wordsBefore(' the pump asks for the motor’s pull-out torque, ')).toBe('… for the motor’s pull-out torque');
  expect(wordsBefore('. After that it creeps at some ')).toBe('… that it creeps at some');
  expect(wordsBefore(' against ')).toBe('against');
});

it('has a plain name where nothing leads to it', () => {
  expect(wordsBefore('. ')).toBe('Figure of this run');
  expect(wordsBefore(undefined)).toBe('Figure of this run');
});
