import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { download, gone, journey, says, seen } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

const STOP = 'Max. vol. stop';

async function turnIn(bench: BenchPage): Promise<void> {
  await bench.screw(STOP).focus();
  await bench.page.keyboard.press('ArrowUp');
  await bench.tagSays(STOP, /^15\.0 cm³\/rev/);
}

/** Puts something in the place where this device keeps its circuit. */
function plantDraft(page: Page, document: unknown): Promise<void> {
  return page.evaluate(
    (planted) =>
      new Promise<void>((resolve, reject) => {
        const request = indexedDB.open('swashbench', 1);
        request.onupgradeneeded = () => request.result.createObjectStore('drafts');
        request.onerror = () => reject(request.error);
        request.onsuccess = () => {
          const transaction = request.result.transaction('drafts', 'readwrite');
          transaction
            .objectStore('drafts')
            .put({ document: planted, activeCase: 'A', overlays: [], savedAt: Date.now() + 60_000 }, 'draft');
          transaction.oncomplete = () => {
            request.result.close();
            resolve();
          };
        };
      }),
    document,
  );
}

describe('the circuit in hand', () => {
  it('survives a reload, even one right after the edit', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await turnIn(bench);
      await bench.kept();
      await page.reload();
      await bench.settled();
      expect(await bench.tagValue(STOP)).toMatch(/^15\.0 cm³\/rev, 3¼ turns in/);
      await bench.screw(STOP).focus();
      await page.keyboard.press('ArrowUp');
      await page.reload();
      await bench.settled();
      expect(await bench.tagValue(STOP)).toMatch(/^14\.0 cm³\/rev/);
      await seen(bench.cases.getByRole('button', { name: /^Case B,.*on the drawing/, pressed: true }));
      await seen(bench.cases.getByRole('button', { name: 'overlaid: case A', pressed: true }));
    }));

  it('is not lost to a hand that is quicker than the device: undo leads back to it', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await turnIn(bench);
      await bench.kept();
      // The device answers late: a new circuit is chosen before the kept one has been read.
      await page.addInitScript(() => {
        const open = indexedDB.open.bind(indexedDB);
        const late = (...asked: Parameters<typeof open>) => {
          const request = open(...asked);
          let told: ((event: Event) => void) | null = null;
          request.addEventListener('success', (event) => setTimeout(() => told?.(event), 1500));
          Object.defineProperty(request, 'onsuccess', { set: (handle: typeof told) => (told = handle) });
          return request;
        };
        Object.defineProperty(indexedDB, 'open', { value: late });
      });
      await page.goto(address('start'));
      await page.getByRole('button', { name: /^Empty sheet/ }).click();
      await says(page.getByRole('heading', { level: 1 }), 'Untitled circuit');
      await bench.kept();
      await says(page.getByRole('heading', { level: 1 }), 'Untitled circuit');
      await page.getByRole('toolbar', { name: 'Drawing' }).getByRole('button', { name: 'Undo' }).click();
      await says(page.getByRole('heading', { level: 1 }), 'Cardboard press');
      await page.getByRole('link', { name: 'Bench', exact: true }).click();
      await bench.putOnDrawing('B');
      await bench.tagSays(STOP, /^15\.0/);
    }));

  it('survives a dropped connection: edited, run and kept without it, there after the next reload', () =>
    journey(
      {},
      async ({ page, context, address }) => {
        const bench = await new BenchPage(page).open(address());
        await context.setOffline(true);
        const before = await bench.readings();
        await turnIn(bench);
        await bench.settled();
        expect(await bench.readings()).not.toBe(before);
        await bench.verdict('B', /^Within limits/);
        await bench.kept();
        await context.setOffline(false);
        await page.reload();
        await bench.settled();
        expect(await bench.tagValue(STOP)).toMatch(/^15\.0 cm³\/rev/);
      },
      [/ERR_INTERNET_DISCONNECTED/],
    ));

  it('survives a server that is gone: what is not loaded yet opens once it answers again', () =>
    journey(
      {},
      async ({ page, context, address }) => {
        const bench = await new BenchPage(page).open(address());
        await context.route('**/*', (route) => route.abort('connectionrefused'));
        await turnIn(bench);
        await bench.settled();
        await bench.kept();
        await page.keyboard.press('Enter');
        await seen(page.getByRole('status').filter({ hasText: 'The server does not answer.' }));
        expect(await bench.tagValue(STOP)).toMatch(/^15\.0 cm³\/rev/);
        await context.unroute('**/*');
        await seen(bench.plate);
        await bench.closePlate();
        await page.reload();
        await bench.settled();
        expect(await bench.tagValue(STOP)).toMatch(/^15\.0 cm³\/rev/);
      },
      [/ERR_CONNECTION_REFUSED/],
    ));

  it('is kept by one tab at a time; the other one says so and may take over', () =>
    journey({}, async ({ page, address, newTab }) => {
      const first = await new BenchPage(page).open(address());
      await turnIn(first);
      await first.kept();
      const tab = await newTab();
      const second = await new BenchPage(tab).open(address());
      await says(tab.getByRole('status').filter({ hasText: 'Open in another tab.' }), 'not kept');
      expect(await second.tagValue(STOP)).toMatch(/^15\.0/);
      await tab.getByRole('button', { name: 'Keep this one instead' }).click();
      await gone(tab.getByRole('button', { name: 'Keep this one instead' }));
      await seen(page.getByRole('button', { name: 'Keep this one instead' }));
      await second.screw(STOP).focus();
      await tab.keyboard.press('ArrowUp');
      await second.kept();
      await page.close();
      await tab.reload();
      await second.settled();
      expect(await second.tagValue(STOP)).toMatch(/^14\.0/);
    }));

  it('that cannot be read any more is refused and put aside; the page stays alive', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const broken = { format: 'swashbench-circuit', version: 1, components: 'none', cases: [{ id: 5 }] };
      await plantDraft(page, broken);
      await page.reload();
      await bench.settled();
      const strip = page.getByRole('status').filter({ hasText: 'could not be read' });
      await seen(strip);
      await bench.verdict('A', /^Motor stalls/);
      const saved = await download(page, () => strip.getByRole('button', { name: 'Save it as a file' }).click());
      expect(JSON.parse(saved.bytes.toString('utf8'))).toEqual(broken);
      await turnIn(bench);
      await bench.kept();
    }));
});
