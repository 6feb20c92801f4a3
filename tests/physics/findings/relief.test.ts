import { describe, expect, it } from 'vitest';
import { find, rulesOf, values, words } from '#tests/support/finding-words.ts';
import { assess, bar, changed, litresPerMinute } from '#tests/support/synthetic-run.ts';

describe('relief', () => {
  it('that cracks under dead-head hides the compensator; the cure is a lower compensator, never a higher relief', () => {
    const result = assess({ document: changed({ 'V2.setPressure': 120 * bar }) });
    const finding = find(result, 'relief-before-compensator');
    expect(values(finding.cause)).toEqual([expect.closeTo((120 * bar) / 1.054, 0), 190 * bar]);
    expect(finding.remedy?.seek).toMatchObject({ target: 'P1', field: 'compensatorPressure', want: 'largest', goal: 'compensates-first' });
  });

  it('that passes oil for long is heat; a short opening is not', () => {
    const passing = (t: number) => (t > 2 && t < 5 ? 38 * litresPerMinute : 0);
    const result = assess({
      document: changed({ 'V2.setPressure': 120 * bar }),
      channels: { 'V2.flow': passing, 'V2.heat': (t) => passing(t) * 119 * bar, 'V2.P.pressure': 119 * bar },
    });
    expect(result.verdict).toMatchObject({ id: 'relief-passing' });
    const finding = find(result, 'relief-passing');
    expect(values(finding.headline)[0]).toBeCloseTo(38 * litresPerMinute, 5);
    expect(finding.caution).toContain('never over one minute');
    const short = assess({ channels: { 'V2.flow': (t) => (t > 2 && t < 2.5 ? 38 * litresPerMinute : 0) } });
    expect(rulesOf(short)).not.toContain('relief-passing');
  });

  it('whose spring is weak opens under dead-head though it is set above: the valve, not the compensator', () => {
    const finding = find(assess({ document: changed({ 'V2.fault.weak-spring': 0.3 }) }), 'relief-before-compensator');
    expect(finding.remedy?.seek).toBeUndefined();
    expect(values(finding.remedy!.words)[0]).toBeCloseTo((215 * bar) / 1.054, 0);
  });

  it('that a peak opened and dead-head keeps open is cured by a compensator under its reseat', () => {
    const open = { 'V2.flow': (t: number) => (t > 2 && t < 5 ? 4 * litresPerMinute : 0), 'V2.P.pressure': 189 * bar };
    const finding = find(
      assess({ document: changed({ 'V2.setPressure': 205 * bar, 'V2.reseat': 0.9 }), channels: open }),
      'relief-passing',
    );
    expect(words(finding.cause)).toContain('closes again only at');
    expect(finding.remedy?.seek).toMatchObject({ target: 'P1', field: 'compensatorPressure', want: 'largest' });
    expect(words(finding.remedy!.words)).toContain('A higher relief is not a cure');
  });

  it('that passes oil well under its reseat pressure is stuck open: the valve, not a setting', () => {
    const finding = find(assess({ channels: { 'V2.flow': 20 * litresPerMinute, 'V2.P.pressure': 20 * bar } }), 'relief-passing');
    expect(words(finding.cause)).toContain('It should crack at');
    expect(finding.remedy?.seek).toBeUndefined();
  });

  it('close above dead-head is told from the gap to cracking, not to the set pressure', () => {
    const gaps = (set: number) => assess({ document: changed({ 'V2.setPressure': set * bar }) });
    expect(values(find(gaps(208), 'relief-gap-small').headline)[0]).toBeCloseTo((208 * bar) / 1.054 - 190 * bar, 0);
    expect(rulesOf(gaps(215))).not.toContain('relief-gap-small');
  });

  it('that reseats under dead-head is a note', () => {
    const finding = find(assess({ document: changed({ 'V2.reseat': 0.9 }) }), 'relief-gap-small');
    expect(finding.severity).toBe(3);
    expect(values(finding.cause)[0]).toBeCloseTo((0.9 * 215 * bar) / 1.054, 0);
  });
});
