import { describe, expect, it } from 'vitest';
import { emptyCircuit } from './edit/empty-circuit.ts';
import { growFrom, putDown } from './edit/grow.ts';
import { removeItems } from './edit/removal.ts';
import { builtPress } from './edit/test-circuits.ts';
import { unprotectedSources } from './unprotected.ts';

describe('unprotectedSources', () => {
  it('finds a pump line without a relief, also behind a check valve', () => {
    expect(unprotectedSources(builtPress())).toEqual([]);
    expect(unprotectedSources(removeItems(builtPress(), ['v2']))).toEqual([{ component: 'p1', port: 'outlet' }]);
    const pump = putDown(emptyCircuit(), 'compensated-pump', { x: 0, y: 0 }).document;
    const check = growFrom(pump, { component: 'p1', port: 'outlet' }, 'check-valve').document;
    expect(unprotectedSources(check)).toEqual([{ component: 'p1', port: 'outlet' }]);
    const relief = growFrom(check, { component: 'v1', port: 'B' }, 'relief-valve').document;
    expect(unprotectedSources(relief)).toEqual([]);
  });

  it('leaves an open outlet to be said as open', () => {
    const pump = putDown(emptyCircuit(), 'compensated-pump', { x: 0, y: 0 }).document;
    expect(unprotectedSources(pump)).toEqual([]);
  });
});
