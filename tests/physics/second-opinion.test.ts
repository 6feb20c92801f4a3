import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { checkRun } from '#shared/simulation/check-run.ts';
import { secondOpinion } from '#shared/simulation/second-opinion.ts';
import { compiled, readFixtureCircuit } from '../support/reference-case.ts';

describe('second opinion', () => {
  it('agrees with the engine on a window with a moving spool', () => {
    const opinion = secondOpinion(compiled(readFixtureCircuit('s1')), { from: 0.98, to: 1.08, tolerance: 1e-6 });
    expect(opinion).toMatchObject({ ok: true });
    if (opinion.ok) expect(opinion.largestDifference).toBeLessThan(2e-4);
  });

  it('says when it needs too many steps, and when the window is empty', () => {
    const few = secondOpinion(compiled(readFixtureCircuit('s1')), { from: 0, to: 0.5, tolerance: 1e-6, maxSteps: 20 });
    expect(few).toMatchObject({ ok: false });
    if (!few.ok) expect(few.reason).toContain('more than 20 steps');
    expect(secondOpinion(compiled(demoCircuit), { from: 3, to: 3, tolerance: 1e-4 })).toEqual({
      ok: false,
      reason: 'The window is empty.',
    });
  });
});

describe('checking a run', () => {
  it('repeats it at a tenth of the tolerance and names the largest difference', () => {
    const check = checkRun(compiled(readFixtureCircuit('s1')), 1e-4);
    expect(check.fine.tolerance).toBeCloseTo(1e-5, 12);
    expect(check.fine.statistics.steps).toBeGreaterThan(check.coarse.statistics.steps);
    expect(check.largest.share).toBeGreaterThan(0);
    expect(check.largest.address).not.toBe('');
    expect(check.rms.share).toBeLessThan(0.02);
  });
});
