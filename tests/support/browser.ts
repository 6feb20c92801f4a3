import { existsSync, mkdirSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { delimiter, join } from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import { type Browser, type BrowserContext, type BrowserContextOptions, chromium, type Locator, type Page } from 'playwright-core';
import { afterAll, expect, inject } from 'vitest';

export interface JourneyOptions {
  readonly width?: number;
  readonly height?: number;
  readonly dark?: boolean;
  readonly touch?: boolean;
  /** Movement kept still, as the system asks for it. */
  readonly still?: boolean;
  readonly locale?: string;
  /** Preferences of this device before the page opens. */
  readonly preferences?: Readonly<Record<string, unknown>>;
}

/** What a journey is given: one page of a device of its own, the product's address, and more tabs of the same device. */
export interface Journey {
  readonly page: Page;
  readonly context: BrowserContext;
  readonly address: (path?: string) => string;
  readonly newTab: () => Promise<Page>;
}

/** How long a screen may take to follow on a busy machine [ms]. */
export const PATIENCE = Number(process.env.BROWSER_PATIENCE ?? 20_000);

/** On a closed network and as any user; nothing that talks to the outside. */
export const chromiumArguments = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export function chromiumPath(): string {
  for (const folder of (process.env.PATH ?? '').split(delimiter).filter(Boolean)) {
    for (const name of ['chromium', 'chromium-browser']) if (existsSync(join(folder, name))) return join(folder, name);
  }
  throw new Error('No Chromium on the path: npm test installs it.');
}

let opened: Promise<Browser> | undefined;

function browser(): Promise<Browser> {
  opened ??= chromium.launch({ executablePath: chromiumPath(), args: chromiumArguments });
  return opened;
}

afterAll(async () => {
  await (await opened)?.close();
  opened = undefined;
});

function contextOptions(options: JourneyOptions): BrowserContextOptions {
  return {
    viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
    colorScheme: options.dark ? 'dark' : 'light',
    reducedMotion: options.still ? 'reduce' : 'no-preference',
    hasTouch: options.touch ?? false,
    locale: options.locale ?? 'en-GB',
    acceptDownloads: true,
  };
}

/** Everything the browser complains of: errors and warnings of the console, exceptions nobody caught, refused requests. */
function listen(page: Page, complaints: string[]): void {
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(`${message.type()}: ${message.text()}`);
  });
  page.on('pageerror', (error) => complaints.push(`exception: ${error.message}`));
}

/** Runs one journey on a device of its own. It fails when the console is not empty at the end, unless `expected` says what may stand
 *  there. With BROWSER_PICTURES a failed journey leaves a picture of the page in that folder. */
export async function journey(
  options: JourneyOptions,
  walk: (journey: Journey) => Promise<void>,
  expected: readonly RegExp[] = [],
): Promise<void> {
  const base = inject('baseUrl');
  const context = await (await browser()).newContext(contextOptions(options));
  context.setDefaultTimeout(PATIENCE);
  const complaints: string[] = [];
  if (options.preferences) {
    const state = JSON.stringify({ state: options.preferences, version: 1 });
    await context.addInitScript((value) => {
      if (!localStorage.getItem('swashbench-preferences')) localStorage.setItem('swashbench-preferences', value);
    }, state);
  }
  const newTab = async () => {
    const page = await context.newPage();
    listen(page, complaints);
    return page;
  };
  const page = await newTab();
  try {
    await walk({ page, context, address: (path = '') => `${base}${path}`, newTab });
    expect(
      complaints.filter((complaint) => !expected.some((pattern) => pattern.test(complaint))),
      'the console is empty',
    ).toEqual([]);
  } catch (error) {
    await leavePicture(page);
    throw error;
  } finally {
    await context.close();
  }
}

async function leavePicture(page: Page): Promise<void> {
  const folder = process.env.BROWSER_PICTURES;
  if (!folder) return;
  mkdirSync(folder, { recursive: true });
  const name = (expect.getState().currentTestName ?? 'journey').replace(/[^A-Za-z0-9]+/g, '-').slice(0, 90);
  await page.screenshot({ path: join(folder, `${name}.png`) }).catch(() => undefined);
}

/** The text of one element, its spaces made plain. */
export async function textOf(locator: Locator): Promise<string> {
  return plain((await locator.textContent()) ?? '');
}

export function plain(text: string): string {
  return text.replace(/[\s\u2009\u200A\u202F\u00A0]+/g, ' ').trim();
}

/** Waits until an element says something. */
export async function says(locator: Locator, pattern: RegExp | string): Promise<void> {
  const wanted = expect.poll(() => textOf(locator).catch((error: Error) => error.message), { timeout: PATIENCE, interval: 60 });
  await (typeof pattern === 'string' ? wanted.toContain(pattern) : wanted.toMatch(pattern));
}

export async function seen(locator: Locator): Promise<void> {
  await locator.first().waitFor({ state: 'visible', timeout: PATIENCE });
}

export async function gone(locator: Locator): Promise<void> {
  await locator.first().waitFor({ state: 'hidden', timeout: PATIENCE });
}

/** What a press saves: its name and its bytes. */
export async function download(page: Page, press: () => Promise<void>): Promise<{ name: string; bytes: Buffer }> {
  const [file] = await Promise.all([page.waitForEvent('download'), press()]);
  const path = await file.path();
  return { name: file.suggestedFilename(), bytes: await readFile(path) };
}

/** Rules of WCAG 2.0 to 2.2, levels A and AA. */
const rules = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Findings of axe on the page as it is now, in one line each. `onlyColour`: the rules that a change of theme can break. */
export async function accessibilityFindings(page: Page, onlyColour = false): Promise<string[]> {
  // There are no frames: the quick way, in the page itself.
  const axe = new AxeBuilder({ page }).setLegacyMode(true);
  const { violations } = await (onlyColour ? axe.withRules(['color-contrast', 'link-in-text-block']) : axe.withTags(rules)).analyze();
  return violations.flatMap(({ id, nodes, help }) =>
    nodes
      .filter((node) => id !== 'target-size' || !isOnTheSheet(node.html))
      .map((node) => `${id}: ${node.target.join(' ')}: ${plain(node.failureSummary ?? help)}`),
  );
}

/** Parts and ports of a drawing stand where the circuit puts them, at the scale of the view: the exception "essential" of WCAG 2.2,
 *  2.5.8. How far round them a press still counts is a test of its own. */
function isOnTheSheet(html: string): boolean {
  return /^<div [^>]*(class="part-body"|react-flow__handle)/.test(html);
}

/** How far the page reaches beyond its window to the side [px]. */
export function sidewaysOverflow(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}
