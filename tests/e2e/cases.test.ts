import { describe, expect, it } from 'vitest';
import { gone, journey, PATIENCE, says, seen, textOf } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

describe('cases and findings', () => {
  it('overlays a third case and says the difference between two in words', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.cases.getByRole('button', { name: 'overlay: case C' }).click();
      await seen(bench.cases.getByRole('button', { name: 'overlaid: case C', pressed: true }));
      await seen(bench.findings.getByRole('columnheader', { name: 'Case C' }));
      await says(bench.load, /Case C at/);
      await says(bench.findings.getByRole('button', { name: /^\d+ more$/ }), /more/);

      await bench.cases.getByRole('button', { name: 'on the drawing', exact: true }).click();
      await page.getByRole('menuitem', { name: 'Difference in words' }).click();
      const dialog = page.getByRole('dialog', { name: 'Difference in words' });
      await says(dialog, /max\. volume stop: 28\.0 cm³\/rev → 16\.0 cm³\/rev/);
      await says(dialog, /As found: Motor stalls.*Stop turned in: Within limits/);
      await dialog.getByRole('combobox', { name: 'From case' }).selectOption({ label: 'C, Relief lowered' });
      await says(dialog, /Relief lowered: Trips/);
      await page.keyboard.press('Escape');
      await gone(dialog);
    }));

  it('tries a remedy as a new case; the case meets what the remedy foretold', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const stall = bench.finding(/Motor stalls at/);
      // Case B already holds what the remedy asks for.
      await stall.getByRole('button', { name: 'Tried as case B' }).waitFor({ timeout: 2 * PATIENCE });
      await bench.cases.getByRole('button', { name: 'on the drawing', exact: true }).click();
      await page.getByRole('menuitem', { name: 'Delete…' }).click();
      await page.getByRole('button', { name: 'Delete case B' }).click();
      await expect.poll(() => bench.letters()).toEqual(['A', 'C']);
      const action = stall.getByRole('button', { name: 'Try it as a new case' });
      await action.waitFor({ timeout: 2 * PATIENCE });
      await action.click();
      await expect.poll(async () => (await bench.letters()).length).toBe(3);
      await bench.settled();
      const made = (await bench.letters()).find((letter) => letter !== 'A' && letter !== 'C') ?? '';
      const chip = await textOf(bench.chip(made));
      expect(chip).not.toContain('Motor stalls');
      await bench.tagSays('Max. vol. stop', /turns? in/);
    }));

  it('shows the moment of a finding: the cursor goes there, with its case on the drawing', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      expect(await bench.time()).toBeCloseTo(3.34, 2);
      const stall = bench.finding(/Motor stalls at/);
      await stall.getByRole('button', { name: 'Show the moment' }).click();
      await expect.poll(() => bench.time()).toBeLessThan(2.3);
      expect(await bench.time()).toBeGreaterThan(2);
      await seen(bench.cases.getByRole('button', { name: /^Case A,.*on the drawing/, pressed: true }));
      await says(bench.when, 'At 2.1');
      await stall.getByRole('button', { name: 'How is this computed?' }).click();
      const panel = page.getByRole('dialog', { name: 'How is this computed?' });
      await says(panel, 'Source');
      await says(panel, 'What goes in');
      await page.keyboard.press('Escape');
      await gone(panel);
    }));

  it('explains readings and figures: equation, inputs with their sources, assumptions, limits', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const panel = page.getByRole('dialog', { name: 'How is this computed?' });
      await bench.drawing
        .getByRole('button', { name: /L\/min$/ })
        .first()
        .click();
      for (const heading of ['Equation', 'What goes in', 'Source']) await seen(panel.getByRole('heading', { name: heading }));
      await page.keyboard.press('Escape');
      await gone(panel);
      await bench.findings.getByRole('cell').getByRole('button').last().click();
      await says(panel, 'Equation');
      await panel.getByRole('button', { name: 'Close' }).first().click();
      await gone(panel);
    }));
});
