import { describe, expect, it } from 'vitest';
import { demoCircuit } from '../circuit/samples/demo.ts';
import type { Seek } from './finding.ts';
import { findReach } from './reach.ts';
import { settableValues } from './settable.ts';

const cubic = 1e-6 / (2 * Math.PI);
const seek = (part: Partial<Seek>): Seek => ({
  target: 'P1',
  field: 'maxVolumeStop',
  quantity: 'displacement',
  low: 7 * cubic,
  high: 28 * cubic,
  want: 'largest',
  goal: 'within-limits',
  ...part,
});

describe('values a screw can be set to', () => {
  it('are quarter turns from as found: 1 cm³/rev where a turn is 4', () => {
    const values = settableValues(demoCircuit, 'A', seek({})).map((value) => value / cubic);
    expect(values).toHaveLength(22);
    values.forEach((value, i) => {
      expect(value).toBeCloseTo(7 + i, 9);
    });
  });

  it('count from as found in every case, and never leave the range', () => {
    const values = settableValues(demoCircuit, 'C', seek({ field: 'compensatorPressure', low: 101e5, high: 113e5, quantity: 'pressure' }));
    expect(values.map((value) => Math.round(value / 1e5))).toEqual([105, 110]);
  });

  it('are none where the range is empty', () => {
    expect(settableValues(demoCircuit, 'A', seek({ low: 28.2 * cubic, high: 28.4 * cubic }))).toEqual([]);
  });
});

describe('where oil gets to', () => {
  const reach = findReach(demoCircuit);
  it('from the pump to the relief through the check valve, whatever the spool does, but not to the cylinder', () => {
    const nets = reach.always('P1.outlet');
    expect(nets.has(reach.netOf('V2.P'))).toBe(true);
    expect(nets.has(reach.netOf('A1.A'))).toBe(false);
    expect(nets.has(reach.netOf('T3.T'))).toBe(false);
  });

  it('pressure stands on the work’s side through the open valve, never on the return side', () => {
    const nets = reach.loaded('P1.outlet');
    expect(nets.has(reach.netOf('A1.A'))).toBe(true);
    expect(nets.has(reach.netOf('A1.B'))).toBe(true);
    expect(nets.has(reach.netOf('Z1.A'))).toBe(false);
  });

  it('not backwards through the check valve', () => {
    expect(reach.always('V2.P').has(reach.netOf('P1.outlet'))).toBe(false);
  });
});
