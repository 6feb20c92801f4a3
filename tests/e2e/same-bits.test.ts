import { expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import { tolerances } from '#shared/simulation/result.ts';
import { journey, PATIENCE } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

/** The server's and the command line's bits are compared in tests/api; this is the third host. */
it('the browser’s worker reaches the same bits as the engine in Node, for every case of the demo', () =>
  journey({}, async ({ page, address }) => {
    const bench = await new BenchPage(page).open(address());
    for (const [index, letter] of ['A', 'B', 'C'].entries()) {
      const outcome = evaluateToEnd(demoCircuit, demoCircuit.cases[index]!.id, tolerances.normal);
      if (!outcome.ok) throw new Error('the demo was refused');
      if (letter !== 'B') await bench.putOnDrawing(letter);
      else if (!(await page.getByRole('button', { name: /^Case B,.*on the drawing/, pressed: true }).isVisible()))
        await bench.putOnDrawing('B');
      await bench.settled();
      await expect
        .poll(() => page.locator('.tape').getAttribute('data-run-hash'), { timeout: PATIENCE, message: `case ${letter}` })
        .toBe(outcome.evaluation.run.hash);
    }
  }));
