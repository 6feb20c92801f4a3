import { describe, expect, it } from 'vitest';
import { gone, journey, PATIENCE, says, seen } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';
import { DrawPage } from './pages/draw-page.ts';

describe('drawing a circuit from an empty sheet', () => {
  it('by its ports with the pointer, until it runs', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).openEmpty(address('start'));
      await page.getByRole('button', { name: /^Begin with a motor and a pump/ }).click();
      await seen(draw.strip);
      await draw.choice(/^relief/).click();
      await draw.counts('3 parts');
      await draw.grow('V1 tank port, open', /^tank/);
      await draw.grow('P1 suction, open', /^tank/);
      await draw.grow('P1 case drain, open', /^tank/);
      await draw.grow(/^tee arm \w, open/, /^4\/3 valve/);
      await draw.said('two flags on the tape shift it');
      await draw.grow('V2 tank port, open', /^tank/);
      await draw.grow('V2 port A, open', /^cylinder/);
      // The last line is drawn from ring to ring.
      await draw.ring('A1 rod side, open').dragTo(draw.ring('V2 port B, open'));
      await draw.counts('9 parts, 9 lines');
      await draw.counts('Ready to run');

      await page.getByRole('link', { name: 'Bench', exact: true }).click();
      const bench = new BenchPage(page);
      await bench.settled();
      expect(await bench.letters()).toEqual(['A']);
      await seen(bench.tag('Max. vol. stop'));
      await expect.poll(() => bench.readings(), { timeout: PATIENCE }).toMatch(/bar.*rpm/);
    }));

  it('by the keyboard alone, until it runs', () =>
    journey({}, async ({ page, address }) => {
      await page.goto(address('start'));
      const press = (name: RegExp) => page.getByRole('button', { name }).press('Enter');
      await press(/^Empty sheet/);
      await press(/^Begin with a motor and a pump/);
      const draw = new DrawPage(page);
      await seen(draw.strip);
      // The strip leads on: Enter takes the likeliest part, the focus goes to the next open ring, Enter asks what follows there.
      for (const kind of ['relief', 'tank', 'tank', 'tank', '4/3 valve', 'tank', 'cylinder', 'join to V2 port B']) {
        if ((await draw.strip.count()) === 0) await page.keyboard.press('Enter');
        const item = draw.choice(`${kind}, likeliest`);
        await seen(item);
        await expect.poll(() => item.evaluate((element) => element === document.activeElement), { timeout: PATIENCE }).toBe(true);
        await page.keyboard.press('Enter');
        await gone(draw.strip);
        await expect.poll(() => page.evaluate(() => document.activeElement?.closest('[data-ring], [data-part]') !== null)).toBe(true);
      }
      await draw.counts('9 parts, 9 lines');
      await draw.counts('Ready to run');
    }));

  it('from the drawer: pressed and placed, dragged out, joined by choosing a port', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).openEmpty(address('start'));
      await draw.drawer.getByRole('button', { name: 'Place Compensated pump' }).click();
      await draw.said('Press on the sheet');
      const sheet = await draw.sheet.boundingBox();
      if (!sheet) throw new Error('there is no sheet');
      await page.mouse.click(sheet.x + 500, sheet.y + 300);
      await seen(draw.part(/^pump P1/));
      await draw.counts('1 part');
      await draw.drawer.getByRole('button', { name: 'Place Electric motor' }).hover();
      await page.mouse.down();
      await page.mouse.move(sheet.x + 200, sheet.y + 250, { steps: 6 });
      await page.mouse.up();
      await seen(draw.part(/^motor M1/));
      await draw.ring(/^M1 shaft/).click();
      await draw.choice(/^join to P1/).click();
      await draw.said(/joined to/);
      await draw.undo();
      await draw.undo();
      await draw.counts('1 part');
      await draw.redo();
      await draw.counts('2 parts');
    }));

  it('from each of the three starters, which run', () =>
    journey({}, async ({ page, address }) => {
      const bench = new BenchPage(page);
      for (const title of [/press/i, /test stand/i, /lift/i]) {
        await page.goto(address('start'));
        await page.getByRole('button').and(page.locator('.start-card')).filter({ hasText: title, hasNotText: 'Demo' }).first().click();
        await bench.settled();
        const verdicts = await bench.cases.locator('.chip').allTextContents();
        expect(verdicts.length).toBeGreaterThan(0);
        for (const verdict of verdicts) expect(verdict).not.toMatch(/Not run|Failed|Waiting/);
      }
    }));
});

describe('a port', () => {
  it('is found by a press 11 px beside its middle, at any zoom', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).openEmpty(address('start'));
      await page.getByRole('button', { name: /^Begin with a motor and a pump/ }).click();
      await page.keyboard.press('Escape');
      for (const out of [0, 2, 2]) {
        for (let step = 0; step < out; step++) await draw.bar.getByRole('button', { name: 'Zoom out' }).click();
        await page.waitForTimeout(300);
        const ring = draw.ring('P1 outlet, open');
        const box = await ring.boundingBox();
        if (!box) throw new Error('the ring is not on the screen');
        await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2 - 11);
        await seen(draw.strip);
        await page.keyboard.press('Escape');
        await gone(draw.strip);
      }
    }));
});

describe('a wrong circuit', () => {
  it('is explained in words on the drawing, and the cure is one press away', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).openEmpty(address('start'));
      await page.getByRole('button', { name: /^Begin with a motor and a pump/ }).click();
      await draw.choice(/^relief/).click();
      // A relief without a way to tank.
      await says(draw.sheet.locator('.problem-slip'), /relief.*no way to tank/i);
      await draw.counts('1 thing missing');
      await draw.bar.getByRole('button', { name: /thing missing/ }).click();
      await says(page.getByRole('region', { name: 'What is missing or assumed' }), /tank/);
      await page.getByRole('region', { name: 'What is missing or assumed' }).getByRole('button', { name: 'Close' }).click();
      await draw.sheet.locator('.problem-slip').getByRole('button').click();
      await gone(draw.sheet.locator('.problem-slip'));
      await seen(draw.part(/^tank T1/));
      await draw.counts('Ready to run');

      // A pump without a motor.
      await draw.part(/^motor M1/).click();
      await draw.tool('delete').click();
      const question = page.getByRole('alertdialog');
      if ((await question.count()) > 0) await question.getByRole('button', { name: 'Delete' }).click();
      await says(draw.sheet.locator('.problem-slip').first(), /P1/);
      await page.getByRole('link', { name: 'Bench', exact: true }).click();
      const bench = new BenchPage(page);
      await bench.verdict('A', 'Not run');
      await says(bench.findings, /Not run: one thing is missing/);
      await page.getByRole('link', { name: 'Draw', exact: true }).click();
      await draw.sheet.locator('.problem-slip').getByRole('button').click();
      await seen(draw.part(/^motor M1/));
      await draw.counts('Ready to run');
    }));

  it('says what no relief protects', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).open(address('draw'));
      await draw.part(/^relief V2/).click();
      await draw.tool('delete').click();
      const question = page.getByRole('alertdialog');
      await seen(question);
      // The change of case C goes with it, and it is said before.
      await says(question, /With it go/);
      await question.getByRole('button', { name: 'Delete' }).click();
      await says(draw.sheet.locator('.problem-slip'), /No relief protects the line of P1/);
      await draw.sheet.locator('.problem-slip').getByRole('button', { name: 'Add a relief' }).click();
      await seen(draw.part(/^relief V\d/));
    }));
});

describe('changing a drawing', () => {
  it('turns, mirrors, duplicates, copies, deletes; each is one step to undo', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).open(address('draw'));
      await draw.counts('12 parts, 13 lines');
      await draw.part('gauge S1').click();
      await draw.tool('turn').click();
      await draw.said('turned to 90 degrees');
      await seen(draw.part(/^gauge S1, turned 90 degrees/));
      await draw.tool('mirror').click();
      await seen(draw.part(/^gauge S1.*mirrored/));
      await draw.tool('duplicate').click();
      await draw.counts('13 parts');
      await draw.undo();
      await draw.undo();
      await draw.undo();
      await seen(draw.part(/^gauge S1$/));
      await draw.counts('12 parts, 13 lines');
      await draw.redo();
      await seen(draw.part(/^gauge S1, turned 90 degrees/));
      await draw.undo();

      await draw.part('gauge S1').click();
      await draw.part('filter Z1, turned 90 degrees').click({ modifiers: ['Control'] });
      await seen(page.getByRole('toolbar', { name: 'Selected' }));
      await page.keyboard.press('Control+c');
      await page.keyboard.press('Control+v');
      await draw.counts('14 parts');
      await page.keyboard.press('Delete');
      await draw.counts('12 parts, 13 lines');
      await page.keyboard.press('Control+a');
      await draw.said('selected');
      await page.keyboard.press('Escape');
      await gone(page.getByRole('toolbar', { name: 'Selected' }));
    }));

  it('moves a part by hand and by keys; its lines follow', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).open(address('draw'));
      const gauge = draw.part('gauge S1');
      const before = await gauge.boundingBox();
      if (!before) throw new Error('the gauge is not on the screen');
      await page.mouse.move(before.x + before.width / 2, before.y + before.height / 2);
      await page.mouse.down();
      await page.mouse.move(before.x + before.width / 2, before.y + before.height / 2 - 40, { steps: 6 });
      await page.mouse.up();
      await expect.poll(async () => (await gauge.boundingBox())?.y ?? 0).toBeLessThan(before.y - 25);
      const dragged = (await gauge.boundingBox())?.x ?? 0;
      await gauge.focus();
      await page.keyboard.press('ArrowRight');
      await page.keyboard.press('ArrowRight');
      await expect.poll(async () => (await gauge.boundingBox())?.x ?? 0).toBeGreaterThan(dragged + 10);
      await draw.counts('12 parts, 13 lines');
      await draw.counts('Ready to run');
    }));

  it('writes notes and part labels, and a new title', () =>
    journey({}, async ({ page, address }) => {
      const draw = await new DrawPage(page).open(address('draw'));
      await draw.bar.getByRole('button', { name: 'Note' }).click();
      await page.keyboard.type('Filter changed <b>on Monday</b>');
      await draw.part('check V1').click();
      await seen(draw.sheet.getByText('Filter changed <b>on Monday</b>'));
      expect(await draw.sheet.locator('b').count()).toBe(0);
      await draw.bar.getByRole('button', { name: 'Label' }).click();
      await page.keyboard.type('shelf 4');
      await page.keyboard.press('Enter');
      await seen(draw.sheet.getByText('shelf 4'));
      await page.getByRole('heading', { level: 1 }).getByRole('button').click();
      await page.getByRole('textbox', { name: 'Title of the circuit' }).fill('Press in shed 3');
      await page.keyboard.press('Enter');
      await says(page.getByRole('heading', { level: 1 }), 'Press in shed 3');
    }));
});
