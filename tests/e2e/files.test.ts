import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { download, gone, journey, says, seen } from '#tests/support/browser.ts';
import { BenchPage } from './pages/bench-page.ts';

type Loose = Record<string, unknown> & { components: { name: string }[]; cases: { name: string }[] };

function file(name: string, content: string | Buffer) {
  return { name, mimeType: 'application/json', buffer: Buffer.from(content) };
}

function changed(change: (document: Loose) => void): string {
  const document = structuredClone(demoCircuit) as unknown as Loose;
  change(document);
  return JSON.stringify(document);
}

const pictureText = readFileSync(fileURLToPath(new URL('../../shared/circuit/samples/demo.ts', import.meta.url)));

describe('opening a file', () => {
  const refused: readonly [string, string | Buffer, RegExp][] = [
    ['that breaks off', '{"format": ', /file.*not JSON: line 1, column 12/],
    ['that is no JSON at all', pictureText, /file.*not JSON: line 1/],
    ['that is empty', '', /file.*empty/],
    ['of another version', changed((document) => Object.assign(document, { version: 99 })), /version.*99.*newer than this program/],
    ['with an unknown field', changed((document) => Object.assign(document, { colour: 'blue' })), /colour.*blue.*not a field/],
    ['with an endless number', JSON.stringify(demoCircuit).replace(/"duration":8/, '"duration":1e999'), /duty\.duration/],
    [
      'with a value out of range',
      JSON.stringify(demoCircuit).replace('"value":5500', '"value":-5'),
      /components\[0\]\.parameters\.ratedPower\.value.*-5.*0\.05 kW to 1000 kW/,
    ],
  ];

  it('that is wrong is refused with field, value and what is allowed; the circuit in hand is untouched', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.screw('Max. vol. stop').focus();
      await page.keyboard.press('ArrowUp');
      await bench.settled();
      const before = await bench.readings();
      const dialog = page.getByRole('dialog', { name: 'This file was not opened' });
      for (const [what, content, words] of refused) {
        await bench.openFile(file('wrong.json', content));
        await says(dialog, words);
        await says(dialog, 'untouched');
        await dialog.getByRole('button', { name: 'Back to the circuit in hand' }).click();
        await gone(dialog);
        expect(await bench.title(), what).toBe('Cardboard press, packing shed 2');
      }
      expect(await bench.tagValue('Max. vol. stop')).toMatch(/^15\.0/);
      expect(await bench.readings()).toBe(before);
    }));

  it('of 20 MB is refused before it is read', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const folder = mkdtempSync(join(tmpdir(), 'swashbench-file-'));
      try {
        const path = join(folder, 'large.json');
        writeFileSync(path, Buffer.alloc(20_000_000, 'x'));
        await bench.openFile(path);
        await says(page.getByRole('dialog', { name: 'This file was not opened' }), /file.*20 MB.*at most 4 MB/);
      } finally {
        rmSync(folder, { recursive: true, force: true });
      }
    }));

  it('with HTML in its names shows them as the text they are', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      const text = changed((document) => {
        document.title = '<img src=x onerror=alert(1)>';
        for (const [index, component] of document.components.entries()) if (index < 2) component.name = `<i>${index}</i>`;
        for (const entry of document.cases) entry.name = '<b>bold</b>';
      });
      page.on('dialog', (dialog) => expect.unreachable(`a dialog opened: ${dialog.message()}`));
      await bench.openFile(file('names.json', text));
      await expect.poll(() => bench.title()).toContain('<img');
      await bench.settled();
      await seen(bench.cases.getByText('<b>bold</b>').first());
      await seen(bench.drawing.getByText('<i>0</i>').first());
      expect(await page.locator('main b, main i, header img, nav b').count()).toBe(0);
      await page.goto(address('draw'));
      await seen(page.getByText('<i>0</i>').first());
    }));

  it('replaces the circuit as one step that can be undone; saved and opened again it is the same', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.openFile(file('crowded.json', JSON.stringify(crowdedCircuit)));
      await expect.poll(() => bench.title()).toBe(crowdedCircuit.title);
      await bench.settled();
      const saved = await download(page, () => bench.menu('Save as a file'));
      expect(saved.name).toMatch(/^[a-z0-9-]+\.json$/);
      expect(JSON.parse(saved.bytes.toString('utf8'))).toEqual(JSON.parse(JSON.stringify(crowdedCircuit)));
      await bench.undo();
      await expect.poll(() => bench.title()).toBe('Cardboard press, packing shed 2');
      await bench.openFile(file('again.json', saved.bytes));
      await expect.poll(() => bench.title()).toBe(crowdedCircuit.title);
      const again = await download(page, () => bench.menu('Save as a file'));
      expect(again.bytes.equals(saved.bytes)).toBe(true);
    }));
});

describe('saving', () => {
  it('traces as CSV, drawing and load picture as SVG and PNG, the tape as SVG', () =>
    journey({}, async ({ page, address }) => {
      const bench = await new BenchPage(page).open(address());
      await bench.tape.getByRole('button', { name: 'Save' }).click();
      const csv = await download(page, () => page.getByRole('button', { name: 'Traces as CSV' }).click());
      const lines = csv.bytes.toString('utf8').trim().split(/\r?\n/);
      expect(csv.name).toMatch(/\.csv$/);
      expect(lines.length).toBeGreaterThan(200);
      expect(
        lines.some((line) => line.includes('bar')),
        'units stand in the head',
      ).toBe(true);
      const width = lines[lines.length - 1]?.split(/[,;]/).length ?? 0;
      expect(width).toBeGreaterThan(5);

      await bench.tape.getByRole('button', { name: 'Save' }).click();
      const tape = await download(page, () => page.getByRole('button', { name: 'Tape as SVG' }).click());
      const drawing = await download(page, () => bench.menu(/^Export drawing.*SVG/));
      await bench.load.getByRole('button', { name: 'Save' }).click();
      const load = await download(page, () => page.getByRole('button', { name: 'As SVG' }).click());
      for (const { name, bytes } of [tape, drawing, load]) {
        const svg = bytes.toString('utf8');
        expect(name).toMatch(/\.svg$/);
        expect(svg).toMatch(/^(<\?xml[^>]*>\s*)?<svg /);
        expect(svg).not.toMatch(/NaN|undefined|Infinity|<script|var\(--/);
        const faults = await page.evaluate(
          (text) => new DOMParser().parseFromString(text, 'image/svg+xml').querySelectorAll('parsererror').length,
          svg,
        );
        expect(faults, name).toBe(0);
      }
      expect(drawing.bytes.toString('utf8')).toContain('M1');

      const drawn = await download(page, () => bench.menu(/^Export drawing.*PNG/));
      await bench.load.getByRole('button', { name: 'Save' }).click();
      const loaded = await download(page, () => page.getByRole('button', { name: 'As PNG' }).click());
      for (const { name, bytes } of [drawn, loaded]) {
        expect(name).toMatch(/\.png$/);
        expect(bytes.subarray(1, 4).toString('latin1')).toBe('PNG');
        expect(bytes.readUInt32BE(16), 'wide enough to print').toBeGreaterThan(800);
        expect(bytes.length).toBeGreaterThan(10_000);
      }
    }));
});
