import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { accessibilityFindings, gone, type JourneyOptions, journey, seen, sidewaysOverflow } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

const sizes = [
  { name: 'a desk', width: 1440, height: 900 },
  { name: 'a tablet', width: 1024, height: 768 },
  { name: 'a phone', width: 390, height: 844, touch: true },
] as const;

/** Looks at one screen after the other and keeps everything that is wrong, so that one run tells it all. */
class Sweep {
  readonly page: Page;
  readonly found: string[] = [];

  constructor(page: Page) {
    this.page = page;
  }

  /** All rules in light, those of colour in dark, nothing reaching beyond the side. */
  async look(what: string): Promise<void> {
    await this.page.emulateMedia({ colorScheme: 'light' });
    for (const finding of await accessibilityFindings(this.page)) this.found.push(`${what}, light: ${finding}`);
    const over = await sidewaysOverflow(this.page);
    if (over > 0) this.found.push(`${what} reaches ${over} px beyond its window`);
    await this.page.emulateMedia({ colorScheme: 'dark' });
    for (const finding of await accessibilityFindings(this.page, true)) this.found.push(`${what}, dark: ${finding}`);
  }
}

async function openDialog(sweep: Sweep, item: string | RegExp, what: string): Promise<void> {
  const { page } = sweep;
  await page.getByRole('button', { name: 'Menu', exact: true }).click();
  await page.getByRole('menuitem', { name: item }).click();
  const dialog = page.getByRole('dialog');
  await seen(dialog);
  await sweep.look(what);
  await page.keyboard.press('Escape');
  await gone(dialog);
}

async function benchScreens(sweep: Sweep, bench: BenchPage, phone: boolean): Promise<void> {
  const { page } = sweep;
  await sweep.look('the bench');
  await page.getByRole('button', { name: 'Menu', exact: true }).click();
  await seen(page.getByRole('menuitem').first());
  await sweep.look('the menu');
  await page.keyboard.press('Escape');
  await openDialog(sweep, 'Units…', 'units');
  await openDialog(sweep, /^Key list/, 'the key list');
  await openDialog(sweep, 'Supply and site', 'the nameplate of the supply');
  if (phone) {
    for (const region of ['Tape', 'Load', 'Findings']) {
      await page
        .getByRole('navigation', { name: 'Regions' })
        .getByRole('button', { name: new RegExp(`^${region}`) })
        .click();
      await sweep.look(`${region} on a phone`);
    }
    await page.getByRole('navigation', { name: 'Regions' }).getByRole('button', { name: 'Drawing' }).click();
  }
  if (!phone) {
    await bench.openPlate('Compensator');
    await sweep.look('a nameplate');
    await bench.closePlate();
    await bench.type('Compensator', '9000 bar');
    await sweep.look('a refused value');
    await page.keyboard.press('Escape');
    await bench.tape.getByRole('button', { name: 'Table' }).click();
    await sweep.look('the table of events');
    await bench.tape.getByRole('button', { name: 'Table' }).click();
  }
}

async function explanation(sweep: Sweep, bench: BenchPage): Promise<void> {
  const { page } = sweep;
  await bench.drawing.getByRole('button', { name: /rpm$/ }).first().click();
  await seen(page.getByRole('dialog', { name: 'How is this computed?' }));
  await sweep.look('an explanation');
  await page.keyboard.press('Escape');
}

describe.each(sizes)('on $name, light and dark, no finding of axe at levels A and AA', ({ width, height, ...more }) => {
  const options: JourneyOptions = { width, height, still: true, ...more };
  const phone = width < 600;

  it('on the bench, its menus, dialogs and nameplates', () =>
    journey(options, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const sweep = new Sweep(page);
      await benchScreens(sweep, bench, phone);
      if (!phone) await explanation(sweep, bench);
      expect(sweep.found).toEqual([]);
    }));

  it('on the Draw stage, with parts selected and the strip open', () =>
    journey(options, async ({ page, address }) => {
      const sweep = new Sweep(page);
      await page.goto(address('draw'));
      const part = page.locator('[data-part]').first();
      await seen(part);
      await sweep.look('the Draw stage');
      await part.focus();
      await page.keyboard.press('Space');
      await seen(page.getByRole('toolbar', { name: 'Selected' }));
      await sweep.look('a part selected');
      await page.goto(address('start'));
      await seen(page.getByRole('button', { name: /^Empty sheet/ }));
      await sweep.look('the start');
      await page.getByRole('button', { name: /^Empty sheet/ }).click();
      await seen(page.getByRole('button', { name: /^Begin with a motor/ }));
      await sweep.look('an empty sheet');
      await page.getByRole('button', { name: /^Begin with a motor/ }).click();
      await seen(page.getByRole('menu'));
      await sweep.look('the strip');
      await page.getByRole('menuitem').first().press('Enter');
      await gone(page.getByRole('menu'));
      await sweep.look('a circuit with something missing');
      await page.goto(address('nowhere'));
      await seen(page.getByRole('heading', { level: 1 }));
      await sweep.look('a page that is not there');
      expect(sweep.found).toEqual([]);
    }));
});
