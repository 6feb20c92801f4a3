import { describe, expect, it } from 'vitest';
import { syntheticRun } from './run-for-tests.ts';
import { tracesToCsv } from './traces-csv.ts';

const pressure = { address: 'P1.outlet.pressure', quantity: 'pressure' as const, value: (t: number) => 1e5 * t };
const run = syntheticRun({ duration: 1, step: 0.5, channels: [pressure] });

describe('traces as CSV', () => {
  it('has a header with units, CRLF ends and the reader’s units', () => {
    expect(tracesToCsv([{ letter: 'A', name: 'As found', run }], { system: 'si' })).toBe(
      'Case,Time [s],P1.outlet.pressure [bar]\r\nA As found,0,0\r\nA As found,0.5,0.5\r\nA As found,1,1\r\n',
    );
    const us = tracesToCsv([{ letter: 'A', name: '', run }], { system: 'us', decimal: ',' }).split('\r\n');
    expect(us[0]).toBe('Case,Time [s],P1.outlet.pressure [psi]');
    expect(us[3]).toBe('A,1,14.503774');
  });
  it('stacks cases and leaves missing channels empty', () => {
    const flow = { address: 'P1.flow', quantity: 'flow' as const, value: () => 1 / 60000 };
    const other = syntheticRun({ duration: 1, step: 1, channels: [flow] });
    const rows = tracesToCsv(
      [
        { letter: 'A', name: '', run },
        { letter: 'B', name: '', run: other },
      ],
      { system: 'si' },
    ).split('\r\n');
    expect(rows).toHaveLength(1 + 3 + 2 + 1);
    expect(rows[1]).toBe('A,0,0,');
    expect(rows[4]).toBe('B,0,,1');
  });
  it('quotes what must be quoted and defuses formulas', () => {
    const rows = tracesToCsv([{ letter: 'A', name: 'stop, "in"', run }], { system: 'si' }).split('\r\n');
    expect(rows[1]).toBe('"A stop, ""in""",0,0');
    const named = { ...run, channels: run.channels.map((channel) => ({ ...channel, label: '=1+1' })) };
    expect(tracesToCsv([{ letter: 'A', name: '', run: named }], { system: 'si' }).split('\r\n')[0]).toBe("Case,Time [s],'=1+1 [bar]");
  });
  it('leaves a value that is no number empty', () => {
    const odd = syntheticRun({ duration: 1, step: 1, channels: [{ ...pressure, value: () => Number.NaN }] });
    expect(tracesToCsv([{ letter: 'A', name: '', run: odd }], { system: 'si' }).split('\r\n')[1]).toBe('A,0,');
  });
});
