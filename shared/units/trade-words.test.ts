import { expect, it } from 'vitest';
import { formatPhrase } from './format.ts';
import { tradeWords } from './trade-words.ts';

it('says the US word of each pair to those who read US units and keeps capitals', () => {
  expect(tradeWords('The lock nut is tight; lock-nut tight.', 'us')).toBe('The jam nut is tight; jam-nut tight.');
  expect(tradeWords('Pull-out torque and pull-out speed', 'us')).toBe('Breakdown torque and breakdown speed');
  expect(tradeWords('Relief passing', 'us')).toBe('Relief blowing');
  expect(tradeWords('Stuck in star', 'us')).toBe('Stuck in wye');
});

it('leaves the text as it is for SI, and words that only look alike for both', () => {
  expect(tradeWords('Relief passing, lock nut, pull-out', 'si')).toBe('Relief passing, lock nut, pull-out');
  expect(tradeWords('pull-up torque; interlock nutmeg', 'us')).toBe('pull-up torque; interlock nutmeg');
});

it('goes through every phrase with figures', () => {
  const phrase = ['the pull-out torque, ', { value: 72.4, quantity: 'torque' as const }];
  expect(formatPhrase(phrase, { system: 'us', overrides: {}, decimal: '.' })).toContain('breakdown torque');
  expect(formatPhrase(phrase, { system: 'si', overrides: {}, decimal: '.' })).toContain('pull-out torque');
});
