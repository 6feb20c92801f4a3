import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { oilStops } from '#shared/pictures/pressure-ink.ts';
import { themeTokens } from '#shared/pictures/theme.ts';

/** The style sheet of the screen and the colours of exported pictures are one and the same. */
const styles = readFileSync(new URL('../../src/app/tokens.css', import.meta.url), 'utf8');

function block(selector: string): Map<string, string> {
  const start = styles.indexOf(`${selector} {`);
  const body = styles.slice(start, styles.indexOf('}', start));
  return new Map(
    [...body.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/gi)].map(([, name, hex]) => [name as string, (hex as string).toLowerCase()]),
  );
}

describe.each([
  ['light', ':root'],
  ['dark', ':root[data-theme="dark"]'],
] as const)('colours of the %s theme', (theme, selector) => {
  const tokens = block(selector);
  it('are the same in the style sheet and in exported pictures', () => {
    expect(tokens.size).toBeGreaterThan(20);
    for (const [name, hex] of Object.entries(themeTokens[theme])) expect(tokens.get(name), name).toBe(hex);
  });
  it('have the same stops of pressure ink', () => {
    oilStops[theme].forEach((hex, k) => {
      expect(tokens.get(`oil-${k * 200}`)).toBe(hex);
    });
  });
});
