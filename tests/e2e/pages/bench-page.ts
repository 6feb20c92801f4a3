import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { gone, PATIENCE, plain, says, seen, textOf } from '#tests/support/browser.ts';

/** The bench as a person sees it: cases, tags, tape, findings, menu. */
export class BenchPage {
  readonly page: Page;
  readonly drawing: Locator;
  readonly findings: Locator;
  readonly tape: Locator;
  readonly load: Locator;
  readonly cases: Locator;

  constructor(page: Page) {
    this.page = page;
    this.drawing = page.getByRole('region', { name: 'The drawing' });
    this.findings = page.getByRole('region', { name: 'Findings', exact: true });
    this.tape = page.getByRole('region', { name: 'Tape', exact: true });
    this.load = page.getByRole('region', { name: 'Load picture', exact: true });
    this.cases = page.getByRole('navigation', { name: 'Cases' });
  }

  /** Opens the bench and waits until the case on the drawing has been run. */
  async open(address: string): Promise<this> {
    await this.page.goto(address);
    await this.settled();
    return this;
  }

  /** Nothing on the screen is older than the circuit in hand. */
  async settled(): Promise<void> {
    await expect
      .poll(
        () =>
          this.page.evaluate(() => {
            const chips = [...document.querySelectorAll('[data-case] .chip')];
            const waiting = chips.some((chip) => chip.hasAttribute('data-stale') || chip.getAttribute('data-verdict') === 'waiting');
            return chips.length > 0 && !waiting && document.querySelector('.tape[data-stale]') === null;
          }),
        { timeout: PATIENCE, interval: 50 },
      )
      .toBe(true);
  }

  card(letter: string): Locator {
    return this.cases.locator(`[data-case="${letter}"]`);
  }
  /** The verdict of a case with its figure: "Trips, 349 s". */
  chip(letter: string): Locator {
    return this.card(letter).locator('.chip');
  }
  async verdict(letter: string, pattern: RegExp | string): Promise<void> {
    await says(this.chip(letter), pattern);
  }
  async putOnDrawing(letter: string): Promise<void> {
    await this.cases.getByRole('button', { name: new RegExp(`^Case ${letter},.*put on the drawing`) }).click();
    await seen(this.cases.getByRole('button', { name: new RegExp(`^Case ${letter},.*on the drawing`), pressed: true }));
  }
  async letters(): Promise<string[]> {
    return this.cases.locator('[data-case]').evaluateAll((cards) => cards.map((card) => card.getAttribute('data-case') ?? ''));
  }

  /** A tag by the name it carries: "Max. vol. stop", "Relief". */
  tag(name: string): Locator {
    return this.drawing.getByRole('group', { name, exact: true });
  }
  screw(name: string): Locator {
    return this.tag(name).getByRole('slider');
  }
  async tagValue(name: string): Promise<string> {
    return plain((await this.screw(name).getAttribute('aria-valuetext')) ?? '');
  }
  async tagSays(name: string, pattern: RegExp): Promise<void> {
    await expect.poll(() => this.tagValue(name), { timeout: PATIENCE }).toMatch(pattern);
  }
  async type(name: string, text: string): Promise<void> {
    await this.screw(name).focus();
    await this.tag(name)
      .getByRole('button', { name: /Type a value/ })
      .click();
    const field = this.tag(name).getByRole('textbox');
    await field.fill(text);
    await field.press('Enter');
  }

  get moment(): Locator {
    return this.tape.getByLabel('Moment on the tape');
  }
  /** The moment that every reading on the drawing belongs to: "At 3.34 s". */
  get when(): Locator {
    return this.drawing.getByText(/^At\s[\d.,]+\ss$/);
  }
  async time(): Promise<number> {
    return Number(await this.moment.getAttribute('aria-valuenow'));
  }
  /** Lane name, value, unit of the case on the drawing, as the tape reads them at the cursor. */
  async readings(): Promise<string> {
    return plain((await this.moment.getAttribute('aria-valuetext')) ?? '');
  }

  async menu(item: string | RegExp): Promise<void> {
    await this.page.getByRole('button', { name: 'Menu', exact: true }).click();
    await this.page.getByRole('menuitem', { name: item }).click();
  }
  async openFile(file: string | { name: string; mimeType: string; buffer: Buffer }): Promise<void> {
    const [chooser] = await Promise.all([this.page.waitForEvent('filechooser'), this.menu('Open a file…')]);
    await chooser.setFiles(file);
  }
  async undo(): Promise<void> {
    await this.menu(/^Undo/);
  }

  get plate(): Locator {
    return this.page.locator('[data-plate]');
  }
  async openPlate(tagName: string): Promise<void> {
    await this.screw(tagName).focus();
    await this.page.keyboard.press('Enter');
    await seen(this.plate);
  }
  async closePlate(): Promise<void> {
    await this.plate.getByRole('button', { name: 'Close', exact: true }).click();
    await gone(this.plate);
  }
  plateField(label: string): Locator {
    return this.plate.getByRole('textbox', { name: label, exact: true });
  }

  finding(pattern: RegExp): Locator {
    return this.findings.getByRole('article').filter({ has: this.page.getByRole('heading', { name: pattern }) });
  }
  async kept(): Promise<void> {
    await says(this.page.locator('.kept'), 'kept on this device');
    await expect.poll(() => this.page.locator('.kept').getAttribute('data-keeping'), { timeout: PATIENCE }).toBe('kept');
  }
  async title(): Promise<string> {
    return textOf(this.page.getByRole('heading', { level: 1 }));
  }
}
