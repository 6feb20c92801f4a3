import { describe, expect, it } from 'vitest';
import type { Assessment, Finding } from '#shared/findings/finding.ts';
import { numberFindings } from './findings-numbering.ts';

function finding(caseId: string, id: string, severity: Finding['severity'], time?: number): Finding {
  return { id, rule: 'heat', severity, caseId, time, headline: [id], cause: [] };
}
function run(caseId: string, findings: readonly Finding[]) {
  const assessment: Assessment = { caseId, verdict: { id: 'over', word: 'Over' }, findings, yardsticks: [], requirements: [], heat: 0 };
  return { assessment };
}
const cases = [
  { id: 'a', name: 'As found', ink: 0, changes: [] },
  { id: 'b', name: 'Second', ink: 1, changes: [] },
  { id: 'c', name: 'Third', ink: 2, changes: [] },
];
const byCase = {
  a: run('a', [finding('a', 'late', 1, 5), finding('a', 'early', 1, 2), finding('a', 'note', 3)]),
  b: run('b', [finding('b', 'worst', 0, 3)]),
  c: run('c', [finding('c', 'hidden', 0, 1)]),
};

describe('numberFindings', () => {
  it('numbers once, worst first, then by case and time', () => {
    const numbered = numberFindings({ cases }, ['a', 'b'], byCase);
    expect(numbered.map((entry) => [entry.number, entry.finding.id])).toEqual([
      [1, 'worst'],
      [2, 'early'],
      [3, 'late'],
      [4, 'note'],
    ]);
  });
  it('leaves out cases that are not on the screen and those without a run', () => {
    expect(numberFindings({ cases }, ['a'], {}).length).toBe(0);
    expect(numberFindings({ cases }, ['a', 'b'], byCase).some((entry) => entry.finding.caseId === 'c')).toBe(false);
  });
  it('does not depend on which of the shown cases is on the drawing', () => {
    expect(numberFindings({ cases }, ['b', 'a'], byCase)).toEqual(numberFindings({ cases }, ['a', 'b'], byCase));
  });
});
