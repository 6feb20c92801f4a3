import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { accessibilityFindings, gone, type JourneyOptions, journey, seen, sidewaysOverflow } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

const sizes = [
  { name: 'a desk', width: 1440, height: 900 },
  { name: 'a tablet', width: 1024, height: 768 },
  { name: 'a phone', width: 390, height: 844, touch: true },
] as const;

/** No finding of axe, nothing reaching beyond the side. */
async function clean(page: Page, what: string): Promise<void> {
  expect(await accessibilityFindings(page), what).toEqual([]);
  expect(await sidewaysOverflow(page), `${what} reaches beyond its window`).toBeLessThanOrEqual(0);
}

async function themed(page: Page, what: string): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme });
    await page.waitForTimeout(150);
    await clean(page, `${what}, ${colorScheme}`);
  }
}

async function openDialog(page: Page, item: string | RegExp, what: string): Promise<void> {
  await page.getByRole('button', { name: 'Menu', exact: true }).click();
  await page.getByRole('menuitem', { name: item }).click();
  const dialog = page.getByRole('dialog');
  await seen(dialog);
  await themed(page, what);
  await page.keyboard.press('Escape');
  await gone(dialog);
}

async function benchScreens(page: Page, bench: BenchPage, phone: boolean): Promise<void> {
  await themed(page, 'the bench');
  await page.getByRole('button', { name: 'Menu', exact: true }).click();
  await seen(page.getByRole('menuitem').first());
  await themed(page, 'the menu');
  await page.keyboard.press('Escape');
  await openDialog(page, 'Units…', 'units');
  await openDialog(page, /^Key list/, 'the key list');
  await openDialog(page, 'Supply and site', 'the nameplate of the supply');
  if (phone) {
    for (const region of ['Tape', 'Load', 'Findings']) {
      await page
        .getByRole('navigation', { name: 'Regions' })
        .getByRole('button', { name: new RegExp(`^${region}`) })
        .click();
      await themed(page, `${region} on a phone`);
    }
    await page.getByRole('navigation', { name: 'Regions' }).getByRole('button', { name: 'Drawing' }).click();
  }
  if (!phone) {
    await bench.openPlate('Compensator');
    await themed(page, 'a nameplate');
    await bench.closePlate();
    await bench.type('Compensator', '9000 bar');
    await themed(page, 'a refused value');
    await page.keyboard.press('Escape');
    await bench.tape.getByRole('button', { name: 'Table' }).click();
    await themed(page, 'the table of events');
    await bench.tape.getByRole('button', { name: 'Table' }).click();
  }
}

async function explanation(page: Page, bench: BenchPage): Promise<void> {
  await bench.drawing.getByRole('button', { name: /rpm$/ }).first().click();
  await seen(page.getByRole('dialog', { name: 'How is this computed?' }));
  await themed(page, 'an explanation');
  await page.keyboard.press('Escape');
}

describe.each(sizes)('on $name, light and dark, no finding of axe at levels A and AA', ({ width, height, ...more }) => {
  const options: JourneyOptions = { width, height, still: true, ...more };
  const phone = width < 600;

  it('on the bench, its menus, dialogs and nameplates', () =>
    journey(options, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await benchScreens(page, bench, phone);
      if (!phone) await explanation(page, bench);
    }));

  it('on the Draw stage, with parts selected and the strip open', () =>
    journey(options, async ({ page, address }) => {
      await page.goto(address('draw'));
      const part = page.locator('[data-part]').first();
      await seen(part);
      await themed(page, 'the Draw stage');
      await part.focus();
      await page.keyboard.press('Space');
      await seen(page.getByRole('toolbar', { name: 'Selected' }));
      await themed(page, 'a part selected');
      await page.goto(address('start'));
      await seen(page.getByRole('button', { name: /^Empty sheet/ }));
      await themed(page, 'the start');
      await page.getByRole('button', { name: /^Empty sheet/ }).click();
      await seen(page.getByRole('button', { name: /^Begin with a motor/ }));
      await themed(page, 'an empty sheet');
      await page.getByRole('button', { name: /^Begin with a motor/ }).click();
      await seen(page.getByRole('menu'));
      await themed(page, 'the strip');
      await page.getByRole('menuitem').first().press('Enter');
      await gone(page.getByRole('menu'));
      await themed(page, 'a circuit with something missing');
      await page.goto(address('nowhere'));
      await seen(page.getByRole('heading', { level: 1 }));
      await themed(page, 'a page that is not there');
    }));
});
