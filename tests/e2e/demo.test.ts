import { describe, expect, it } from 'vitest';
import { journey, says, seen, textOf } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

describe('the demo, without an account', () => {
  it('opens on the bench with three cases and three verdicts', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.verdict('A', /^Motor stalls, 2\.\d s$/);
      await bench.verdict('B', /^Within limits/);
      await bench.verdict('C', /^Trips, \d+ s$/);
      expect(await bench.title()).toBe('Cardboard press, packing shed 2');
      await bench.kept();
      await seen(bench.finding(/Motor stalls at/));
      await seen(page.getByText('A calculation, not a permission. Stop and lock out.', { exact: false }));
      await says(bench.load, 'Case A stalls at');
    }));

  it('keeps its verdicts with the compensator band at 5 and at 14 bar, entered on the nameplate', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      // The band belongs to the machine, not to a trial: entered with case A on the drawing it holds for all cases.
      await bench.putOnDrawing('A');
      for (const band of ['5', '14']) {
        await bench.openPlate('Compensator');
        const before = await textOf(bench.chip('B'));
        const field = bench.plateField('Compensator band');
        await field.fill(`${band} bar`);
        await field.press('Enter');
        await bench.closePlate();
        await bench.settled();
        expect(await textOf(bench.chip('B')), 'the band is felt').not.toBe(before);
        await bench.verdict('A', /^Motor stalls/);
        await bench.verdict('B', /^Within limits/);
        await bench.verdict('C', /^Trips/);
      }
    }));
});
