import { describe, expect, it } from 'vitest';
import { gone, journey, says, seen, textOf } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

const STOP = 'Max. vol. stop';

/** Takes the stop with the mouse at one side of the screw and goes round its middle by an angle [degrees], clockwise positive. */
async function dragRound(bench: BenchPage, name: string, degrees: number): Promise<void> {
  const box = await bench.screw(name).boundingBox();
  if (!box) throw new Error(`${name} is not on the screen`);
  const middle = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  const at = (angle: number) => [middle.x + 15 * Math.cos(angle), middle.y + 15 * Math.sin(angle)] as const;
  await bench.page.mouse.move(...at(0));
  await bench.page.mouse.down();
  for (let part = 1; part <= 6; part++) await bench.page.mouse.move(...at((degrees / 180) * Math.PI * (part / 6)));
  await bench.page.mouse.up();
}

describe('turning a screw', () => {
  it('by the keyboard: value, turns, tape, load picture and findings follow; a quarter turn is one step to undo', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const before = { tape: await bench.readings(), load: await textOf(bench.load), chip: await textOf(bench.chip('B')) };
      const words = await textOf(bench.findings);
      expect(await bench.tagValue(STOP)).toBe('16.0 cm³/rev, 3 turns in');
      await bench.screw(STOP).focus();
      await page.keyboard.press('ArrowUp');
      await bench.tagSays(STOP, /^15\.0 cm³\/rev, 3¼ turns in$/);
      await says(bench.tag(STOP), '3¼ turns in');
      await bench.settled();
      expect(await bench.readings()).not.toBe(before.tape);
      expect(await textOf(bench.load)).not.toBe(before.load);
      expect(await textOf(bench.chip('B'))).not.toBe(before.chip);
      expect(await textOf(bench.findings)).not.toBe(words);
      await page.keyboard.press('Shift+ArrowUp');
      await bench.tagSays(STOP, /^14\.9 cm³\/rev/);
      await page.keyboard.press('Control+z');
      await page.keyboard.press('Control+z');
      await bench.tagSays(STOP, /^16\.0 cm³\/rev/);
      await bench.settled();
      expect(await bench.readings()).toBe(before.tape);
    }));

  it('by the wheel and by dragging round it and along its ruler', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.screw(STOP).hover();
      await Promise.all([page.mouse.wheel(0, 100), page.mouse.wheel(0, 100)]);
      await bench.tagSays(STOP, /^18\.0 cm³\/rev, 2½ turns in$/);
      await bench.settled();
      // Both notches are one step.
      await bench.undo();
      await bench.tagSays(STOP, /^16\.0 cm³\/rev/);

      await dragRound(bench, STOP, 90);
      await bench.tagSays(STOP, /^15\.0 cm³\/rev, 3¼ turns in$/);
      await bench.undo();
      await bench.tagSays(STOP, /^16\.0 cm³\/rev/);

      const ruler = await bench.tag(STOP).locator('.tag-ruler').boundingBox();
      if (!ruler) throw new Error('the ruler is not on the screen');
      await page.mouse.move(ruler.x + ruler.width / 2, ruler.y + 10);
      await page.mouse.down();
      await page.mouse.move(ruler.x + ruler.width / 2 + 20, ruler.y + 10, { steps: 4 });
      await page.mouse.up();
      // Right on the ruler is more oil: turns come out.
      await bench.tagSays(STOP, /^1[89]\.\d cm³\/rev, 2[¼½]? turns in$/);
    }));

  it('by typing a value in any unit; out of range is refused with the nearest value', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.type(STOP, '1.1 in3/rev');
      await bench.tagSays(STOP, /^18\.0 cm³\/rev, 2½ turns in$/);
      await bench.type(STOP, '1.71 in3/rev');
      await says(bench.tag(STOP).getByRole('alert'), 'lies between 0.4272 in³/rev and 1.709 in³/rev');
      await bench.tagSays(STOP, /^18\.0 cm³\/rev/);
      await bench.tag(STOP).getByRole('button', { name: 'Use 1.709 in³/rev' }).click();
      await bench.tagSays(STOP, /^28\.0 cm³\/rev/);
      await bench.type('Compensator', '2000 psi');
      await bench.tagSays('Compensator', /^138 bar/);
      await bench.settled();
      await bench.type('Compensator', '1,500');
      await says(bench.tag('Compensator').getByRole('alert'), /1[,.]?500|1\.5/);
      await page.keyboard.press('Escape');
      await bench.type('Compensator', 'much');
      await seen(bench.tag('Compensator').getByRole('alert'));
      await page.keyboard.press('Escape');
      await bench.tagSays('Compensator', /^138 bar/);
    }));

  it('fully out in case B: Within limits becomes Motor stalls, and Home brings nothing new; the as-found mark stays', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const mark = bench.tag(STOP).locator('.ruler-ring');
      await seen(mark);
      await bench.verdict('B', /^Within limits/);
      await bench.screw(STOP).focus();
      for (let quarter = 0; quarter < 12; quarter++) await page.keyboard.press('ArrowDown');
      await bench.tagSays(STOP, /^28\.0 cm³\/rev, as found/);
      await bench.settled();
      await bench.verdict('B', /^Motor stalls/);
      await page.keyboard.press('ArrowDown');
      await says(bench.tag(STOP), 'upper end of its range');
      await seen(mark);
      for (let quarter = 0; quarter < 12; quarter++) await page.keyboard.press('ArrowUp');
      await bench.settled();
      await bench.verdict('B', /^Within limits/);
      await seen(mark);
    }));

  it('while case A is on the drawing it makes a new case, as one step', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.putOnDrawing('A');
      await bench.screw(STOP).focus();
      await page.keyboard.press('ArrowUp');
      await expect.poll(() => bench.letters()).toEqual(['A', 'B', 'C', 'D']);
      await seen(bench.cases.getByRole('button', { name: /^Case D,.*on the drawing/, pressed: true }));
      await bench.tagSays(STOP, /^27\.0 cm³\/rev, ¼ turn in$/);
      await bench.settled();
      await bench.putOnDrawing('A');
      expect(await bench.tagValue(STOP)).toBe('28.0 cm³/rev, as found');
      await bench.undo();
      await expect.poll(() => bench.letters()).toEqual(['A', 'B', 'C']);
    }));

  it('asks before it turns one whose lock nut is tight', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      expect(await bench.tagValue('Relief')).toBe('215 bar, as found, lock nut tight');
      await bench.screw('Relief').focus();
      await page.keyboard.press('ArrowDown');
      const loosen = bench.tag('Relief').getByRole('button', { name: 'Loosen the nut' });
      await seen(loosen);
      expect(await bench.tagValue('Relief')).toContain('215 bar');
      await loosen.click();
      await gone(loosen);
      await bench.screw('Relief').focus();
      await page.keyboard.press('ArrowDown');
      await bench.tagSays('Relief', /^205 bar, ¼ turn out$/);
    }));
});
