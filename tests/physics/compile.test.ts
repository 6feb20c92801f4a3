import { describe, expect, it } from 'vitest';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { compileCircuit } from '#shared/simulation/compile.ts';
import type { Problem } from '#shared/simulation/result.ts';
import { command, smallCircuit, standCircuit } from '../support/small-circuits.ts';

function problemsOf(document: CircuitDocument, caseId = 'A'): readonly Problem[] {
  const result = compileCircuit(document, caseId);
  return result.ok ? result.notes : result.problems;
}

function withLine(document: CircuitDocument, from: string, to: string): CircuitDocument {
  const [a = '', pa = ''] = from.split('.');
  const [b = '', pb = ''] = to.split('.');
  const line = {
    id: 'extra',
    from: { component: a, port: pa },
    to: { component: b, port: pb },
    route: [],
    length: 1,
    bore: 0.01,
    loss: false,
  };
  return { ...document, lines: [...document.lines, line] };
}

describe('compiling', () => {
  it('accepts a pump on a relief without a word', () => {
    const result = compileCircuit(standCircuit(), 'A');
    expect(result.ok && result.notes).toEqual([]);
  });

  it('names everything that is missing, at once', () => {
    const document = smallCircuit(['P1 compensated-pump', 'V1 relief-valve'], ['P1.outlet V1.P']);
    const found = problemsOf(document);
    const messages = found.map((problem) => problem.message);
    expect(messages).toContain('The pump P1 has no drive: nothing turns its shaft.');
    expect(messages).toContain('The relief V1 has no way to tank.');
    expect(messages).toContain('P1 suction is not joined; it is taken to lead straight to tank.');
    expect(found.find((problem) => problem.code === 'no-drive')?.cure).toMatchObject({
      action: 'add-drive',
      component: 'P1',
      port: 'shaft',
    });
  });

  it('says of a motor on its own that it drives nothing', () => {
    expect(problemsOf(smallCircuit(['M1 electric-motor'], []))[0]?.message).toBe('The motor M1 drives nothing: its shaft is not coupled.');
  });

  it('says that a relief has no way to tank', () => {
    const document = smallCircuit(
      ['M1 electric-motor', 'P1 compensated-pump', 'V1 relief-valve', 'V2 throttle', 'T1 tank', 'T3 tank'],
      ['T1.T P1.suction', 'P1.outlet V1.P', 'V1.T V2.A', 'P1.drain T3.T'],
      { shaft: ['M1', 'P1'] },
    );
    const found = problemsOf(document).find((problem) => problem.message === 'The relief V1 has no way to tank.');
    expect(found).toMatchObject({ severity: 'problem', component: 'V1', port: 'T', cure: { action: 'add-tank' } });
  });

  it('takes an open case drain for a way to tank and says so', () => {
    const document = standCircuit();
    const open = { ...document, lines: document.lines.filter((line) => line.from.port !== 'drain') };
    const result = compileCircuit(open, 'A');
    expect(result.ok).toBe(true);
    expect(result.ok && result.notes).toMatchObject([{ severity: 'assumption', code: 'open-to-tank', component: 'P1', port: 'drain' }]);
  });

  it('refuses doubled ports, unlike media, a line to itself and ports that do not exist', () => {
    const codes = (document: CircuitDocument) => problemsOf(document).map((problem) => problem.code);
    expect(codes(withLine(standCircuit(), 'P1.outlet', 'T1.T'))).toContain('port-joined-twice');
    expect(codes(withLine(standCircuit(), 'M1.shaft', 'T1.T'))).toContain('unlike-media');
    expect(codes(withLine(standCircuit(), 'V1.P', 'V1.P'))).toContain('line-to-itself');
    expect(codes(withLine(standCircuit(), 'V1.X', 'Q9.P'))).toEqual(expect.arrayContaining(['unknown-port', 'unknown-port']));
  });

  it('refuses a shaft joined to itself and a shaft on oil', () => {
    expect(problemsOf(standCircuit({ shaft: ['M1', 'M1', 'P1'] })).map((problem) => problem.code)).toContain('shaft-joined-twice');
    const oily = standCircuit();
    oily.shafts[0]?.members.push({ component: 'P1', port: 'outlet' });
    expect(problemsOf(oily).map((problem) => problem.code)).toContain('unlike-media');
  });

  it('refuses an empty sheet, an unknown kind and an unknown case in words', () => {
    expect(problemsOf(smallCircuit([], []))[0]).toMatchObject({ code: 'empty-circuit', severity: 'problem' });
    expect(problemsOf(smallCircuit(['X1 flux-capacitor'], []))[0]?.message).toContain('"flux-capacitor"');
    expect(problemsOf(standCircuit(), 'Z')[0]?.code).toBe('unknown-case');
  });

  it('refuses commands for nobody, for no input and out of range', () => {
    const duty = (entry: ReturnType<typeof command>) =>
      problemsOf(standCircuit({ duty: { duration: 1, repeat: false, commands: [entry] } }));
    expect(duty(command('c', 0, 0, 'Q1', 'spool', 1))[0]?.message).toContain('not on the sheet');
    expect(duty(command('c', 0, 0, 'V1', 'spool', 1))[0]?.message).toContain('no such input');
    expect(duty(command('c', 0, 0, 'V1', 'setPressure', 1e12))[0]?.message).toContain('allowed is');
    expect(duty(command('c', 0, 0, 'supply', 'colour', 1))[0]?.message).toContain('voltage and frequency');
  });

  it('notes a net that is held at the least volume', () => {
    const document = standCircuit({ values: { 'P1.deadVolume': 0 } });
    const short = { ...document, lines: document.lines.map((line) => ({ ...line, length: 0 })) };
    expect(problemsOf(short)).toMatchObject([{ code: 'least-volume', severity: 'assumption' }]);
  });
});
