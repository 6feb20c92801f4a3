import { describe, expect, it } from 'vitest';
import { gone, journey, PATIENCE, says, seen, textOf } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

describe('scrubbing the tape', () => {
  it('sets every reading: dragged in the lanes, moved by keys, from event to event', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const rod = bench.drawing.getByRole('button', { name: /mm extended$/ });
      expect(Number.parseInt(await textOf(rod), 10)).toBeGreaterThan(250);
      const area = await bench.tape.locator('.tape-sheet-area').boundingBox();
      if (!area) throw new Error('the tape has no lanes');
      await page.mouse.move(area.x + area.width / 2, area.y + 40);
      await page.mouse.down();
      await page.mouse.move(area.x + area.width / 16, area.y + 60, { steps: 5 });
      await page.mouse.up();
      expect(await bench.time()).toBeCloseTo(0.5, 1);
      await says(rod, /^0 mm/);
      await says(bench.when, /^At 0\.[45]/);
      expect(await bench.readings()).toMatch(/Rod extended 0 mm/);

      await bench.moment.focus();
      const start = await bench.time();
      await page.keyboard.press('ArrowRight');
      expect(await bench.time()).toBeCloseTo(start + 0.01, 3);
      await page.keyboard.press('Shift+ArrowRight');
      expect(await bench.time()).toBeCloseTo(start + 0.11, 3);
      await page.keyboard.press(']');
      const first = await bench.time();
      expect(first).toBeGreaterThan(start + 0.1);
      await page.keyboard.press(']');
      const second = await bench.time();
      expect(second).toBeGreaterThan(first);
      await page.keyboard.press('[');
      expect(await bench.time()).toBeCloseTo(first, 6);
      await page.keyboard.press('1');
      await expect.poll(() => bench.time()).toBeGreaterThan(2);
      await says(bench.when, 'At 2.1');
    }));

  it('plays and pauses with Space, faster when asked', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.moment.focus();
      await page.keyboard.press('Home');
      expect(await bench.time()).toBe(0);
      await page.keyboard.press('Space');
      await seen(bench.tape.getByRole('button', { name: 'Pause' }));
      await expect.poll(() => textOf(bench.when), { timeout: PATIENCE }).not.toBe('At 0.00 s');
      await page.keyboard.press('Space');
      await seen(bench.tape.getByRole('button', { name: 'Run the tape' }));
      const stopped = await bench.time();
      expect(stopped).toBeGreaterThan(0);
      await page.waitForTimeout(150);
      expect(await bench.time()).toBe(stopped);
      await bench.tape.getByRole('button', { name: /^Speed full/ }).click();
      await seen(bench.tape.getByRole('button', { name: /^Speed four times/ }));
    }));

  it('jumps from event to event instead of moving, where movement is kept still', () =>
    journey({ still: true }, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.moment.focus();
      await page.keyboard.press('Home');
      await page.keyboard.press(']');
      const first = await bench.time();
      await page.keyboard.press('Home');
      const seenTimes = new Set<string>();
      await page.keyboard.press('Space');
      const until = Date.now() + 3500;
      while (Date.now() < until) {
        seenTimes.add(await textOf(bench.when));
        await page.waitForTimeout(40);
      }
      await page.keyboard.press('Space');
      expect(seenTimes).toContain(`At ${first.toFixed(2)} s`);
      expect(seenTimes.size).toBeLessThan(6);
      const moving = await page.evaluate(() => document.getAnimations().filter((animation) => animation.playState === 'running').length);
      expect(moving).toBe(0);
    }));

  it('has a table of events and readings for those who cannot see it', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.tape.getByRole('button', { name: 'Table' }).click();
      const table = page.getByRole('table', { name: 'Events and findings' });
      const row = table.getByRole('row', { name: /M1: falls below pull-out speed/ });
      await row.getByRole('button').click();
      await expect.poll(async () => Math.abs((await bench.time()) - 2.1)).toBeLessThan(0.1);
      await seen(page.getByRole('table', { name: /^Readings at 2\.1/ }));
      await seen(page.getByRole('table', { name: /^By phase, case B/ }));
    }));

  it('opens a flag, takes another moment and gives the focus back', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.tape.getByRole('button', { name: /^Command Solenoid a on/ }).press('Enter');
      const sheet = bench.tape.getByRole('dialog', { name: /^Command/ });
      const field = sheet.getByRole('textbox', { name: 'Time' });
      await field.fill('0.9 s');
      await field.press('Enter');
      const flag = bench.tape.getByRole('button', { name: 'Command Solenoid a on at 0.90 s' });
      await seen(flag);
      await page.keyboard.press('Escape');
      await gone(sheet);
      await expect.poll(() => flag.evaluate((element) => element === document.activeElement)).toBe(true);
    }));

  it('moves a flag by the keyboard and the runs follow', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const before = await textOf(bench.chip('A'));
      const flag = bench.tape.getByRole('button', { name: /^Command Solenoid a on/ });
      await flag.focus();
      for (let step = 0; step < 3; step++) await page.keyboard.press('Shift+ArrowRight');
      await seen(bench.tape.getByRole('button', { name: 'Command Solenoid a on at 0.90 s' }));
      await bench.settled();
      expect(await textOf(bench.chip('A'))).not.toBe(before);
    }));
});
