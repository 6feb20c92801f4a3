import type { Locator, Page } from 'playwright-core';
import { says, seen } from '#tests/support/browser.ts';

/** The Draw stage as a person sees it: the sheet, the strip at a port, the drawer, the line above. */
export class DrawPage {
  readonly page: Page;
  readonly sheet: Locator;
  readonly bar: Locator;
  readonly drawer: Locator;
  readonly strip: Locator;

  constructor(page: Page) {
    this.page = page;
    this.sheet = page.getByRole('region', { name: 'The sheet' });
    this.bar = page.getByRole('toolbar', { name: 'Drawing' });
    this.drawer = page.getByRole('region', { name: 'Parts' });
    this.strip = page.getByRole('menu');
  }

  /** An empty sheet, by the menu's "New circuit". */
  async openEmpty(address: string): Promise<this> {
    await this.page.goto(address);
    await this.page.getByRole('button', { name: /^Empty sheet/ }).click();
    await seen(this.page.getByRole('button', { name: /^Begin with a motor and a pump/ }));
    return this;
  }
  async open(address: string): Promise<this> {
    await this.page.goto(address);
    await seen(this.sheet.getByRole('button').first());
    return this;
  }

  /** A part that lies on the sheet: "relief V2". */
  part(name: string | RegExp): Locator {
    return this.sheet.locator('[data-part]').and(this.page.getByRole('button', { name }));
  }
  /** A ring: "P1 outlet, open". */
  ring(name: string | RegExp): Locator {
    return this.sheet.locator('[data-ring]').and(this.page.getByRole('button', { name }));
  }
  choice(name: string | RegExp): Locator {
    return this.strip.getByRole('menuitem', { name });
  }
  tool(name: 'turn' | 'mirror' | 'duplicate' | 'delete'): Locator {
    return this.page.getByRole('toolbar', { name: 'Selected' }).getByRole('button', { name });
  }

  async counts(pattern: RegExp | string): Promise<void> {
    await says(this.bar, pattern);
  }
  async said(pattern: RegExp | string): Promise<void> {
    await says(this.bar.locator('.draw-said'), pattern);
  }
  /** Presses a ring and takes what the strip offers. */
  async grow(ring: string | RegExp, choice: string | RegExp): Promise<void> {
    await this.ring(ring).click();
    await this.choice(choice).click();
  }
  async undo(): Promise<void> {
    await this.bar.getByRole('button', { name: 'Undo' }).click();
  }
  async redo(): Promise<void> {
    await this.bar.getByRole('button', { name: 'Redo' }).click();
  }
}
