import { describe, expect, it } from 'vitest';
import { gone, journey, says, seen, textOf } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

describe('the page as it is served', () => {
  it('forbids what is not its own: no inline script, no eval, no foreign origin', () =>
    journey(
      {},
      async ({ page, address }) => {
        const foreign: string[] = [];
        page.on('request', (request) => {
          if (!request.url().startsWith(address()) && !/^(blob|data):/.test(request.url())) foreign.push(request.url());
        });
        const response = await page.goto(address());
        const policy = response?.headers()['content-security-policy'] ?? '';
        expect(policy).toContain("script-src 'self'");
        expect(policy).not.toContain('unsafe-inline');
        expect(policy).not.toContain('unsafe-eval');
        const bench = new BenchPage(page);
        await bench.settled();
        const ran = await page.evaluate(() => {
          const script = document.createElement('script');
          script.textContent = 'window.__ran = true';
          document.head.append(script);
          return '__ran' in window;
        });
        expect(ran).toBe(false);
        expect(foreign).toEqual([]);
      },
      // The refused script is what was tried.
      [/Content Security Policy/],
    ));

  it('says where there is no page, and leads back', () =>
    journey({}, async ({ page, address }) => {
      await page.goto(address('nowhere/at/all'));
      await seen(page.getByRole('heading', { name: 'There is no page at this address' }));
      await page.getByRole('link', { name: 'Open the bench' }).click();
      await new BenchPage(page).settled();
    }));
});

describe('preferences', () => {
  it('US units everywhere, and per quantity; the words of the trade beside each other', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.menu('Units…');
      const dialog = page.getByRole('dialog');
      await dialog.getByRole('combobox', { name: 'System' }).selectOption('us');
      await says(dialog, /Words of the trade/);
      await page.keyboard.press('Escape');
      await gone(dialog);
      expect(await bench.tagValue('Compensator')).toMatch(/^2756 psi/);
      await expect.poll(() => bench.readings()).toMatch(/Pump port [\d,. ]+psi.*gpm/);
      await says(bench.findings, /psi/);
      await says(bench.load, /psi.*gpm/);
      expect(await textOf(bench.drawing)).not.toMatch(/\d (bar|L\/min)\b/);
      await bench.menu('Units…');
      await dialog.getByRole('combobox', { name: 'Pressure', exact: true }).selectOption({ label: 'bar' });
      await page.keyboard.press('Escape');
      await gone(dialog);
      expect(await bench.tagValue('Compensator')).toMatch(/^190 bar/);
      await expect.poll(() => bench.readings()).toMatch(/bar.*gpm/);
      await page.reload();
      await bench.settled();
      await expect.poll(() => bench.readings()).toMatch(/bar.*gpm/);
    }));

  it('a decimal comma where the browser speaks so', () =>
    journey({ locale: 'de-DE' }, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.type('Max. vol. stop', '15,5');
      await bench.tagSays('Max. vol. stop', /^15,5 cm³\/rev/);
    }));

  it('light and dark by the system or by choice', () =>
    journey({ dark: true }, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const ground = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
      const dark = await ground();
      await bench.menu('Theme: as the system');
      await expect.poll(ground).not.toBe(dark);
      await bench.menu('Theme: light');
      await expect.poll(ground).toBe(dark);
    }));

  it('lists its keys', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.moment.focus();
      await page.keyboard.press('?');
      const dialog = page.getByRole('dialog');
      await says(dialog, /Space/);
      await page.keyboard.press('Escape');
      await gone(dialog);
      // Letters act only while the drawing or the tape has the focus.
      await page.getByRole('button', { name: 'Menu', exact: true }).focus();
      await page.keyboard.press('n');
      expect(await bench.letters()).toEqual(['A', 'B', 'C']);
      await bench.moment.focus();
      await page.keyboard.press('.');
      await seen(bench.cases.getByRole('button', { name: /^Case C,.*on the drawing/, pressed: true }));
      await page.keyboard.press('n');
      await expect.poll(() => bench.letters()).toEqual(['A', 'B', 'C', 'D']);
    }));
});

describe('on paper', () => {
  it('shows drawing, settings, findings, tape and the caution on white, whatever the theme', () =>
    journey({ dark: true }, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await page.emulateMedia({ media: 'print' });
      await page.evaluate(() => window.dispatchEvent(new Event('beforeprint')));
      const paper = page.locator('.print-sheet');
      await seen(paper);
      await says(paper, 'A calculation, not a permission. Stop and lock out. Lower or block the load');
      await says(paper, /Motor stalls/);
      await says(paper, /16\.0 cm³\/rev/);
      expect(await page.evaluate(() => getComputedStyle(document.body).backgroundColor)).toBe('rgb(255, 255, 255)');
      expect(await bench.cases.isVisible()).toBe(false);
      const pdf = await page.pdf({ format: 'A4' });
      expect(pdf.subarray(0, 4).toString('latin1')).toBe('%PDF');
    }));
});
