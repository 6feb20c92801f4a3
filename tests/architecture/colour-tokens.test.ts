import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { verdictIds } from '#shared/findings/finding.ts';

const css = readFileSync(new URL('../../src/app/tokens.css', import.meta.url), 'utf8');

function tokens(selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`);
  const block = css.slice(start, css.indexOf('}', start));
  return Object.fromEntries(
    [...block.matchAll(/--([a-z0-9-]+):\s*(#[0-9a-f]{6})/g)].map((match) => [match[1] as string, match[2] as string]),
  );
}
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
/** WCAG 2 contrast ratio. */
function contrast(a: string, b: string): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

const light = tokens(':root');
const themes = { light, dark: { ...light, ...tokens(':root[data-theme="dark"]') } };

describe.each(Object.entries(themes))('colour tokens, %s', (_name, theme) => {
  const of = (name: string) => theme[name] ?? '';
  const grounds = ['desk', 'paper', 'sheet', 'well'];

  it('keep text at 4.5 and control edges at 3 on every ground', () => {
    for (const ground of grounds) {
      for (const ink of ['ink', 'ink2', 'ink3']) expect(contrast(of(ink), of(ground)), `${ink} on ${ground}`).toBeGreaterThanOrEqual(4.5);
    }
    for (const ground of ['desk', 'paper', 'sheet']) {
      expect(contrast(of('edge'), of(ground)), `edge on ${ground}`).toBeGreaterThanOrEqual(3);
      expect(contrast(of('focus'), of(ground)), `focus on ${ground}`).toBeGreaterThanOrEqual(4.5);
    }
    expect(contrast(of('ink'), of('pick'))).toBeGreaterThanOrEqual(7);
    expect(contrast(of('on-oxide'), of('oxide-plate'))).toBeGreaterThanOrEqual(7);
  });
  it('keep case letters and the words on chips readable', () => {
    for (let ink = 0; ink < 5; ink += 1) expect(contrast(of(`case-${ink}`), of('sheet')), `case ${ink}`).toBeGreaterThanOrEqual(4.5);
    for (const id of verdictIds) {
      expect(contrast(of(`chip-${id}`), of(`tint-${id}`)), `chip ${id}`).toBeGreaterThanOrEqual(4.5);
      expect(contrast(of(`verdict-${id}`), of('sheet')), `mark ${id}`).toBeGreaterThanOrEqual(4.5);
    }
  });
  it('let lightness carry the pressure ink, step by step in one direction', () => {
    const steps = [0, 200, 400, 600, 800, 1000].map((share) => luminance(of(`oil-${share}`)));
    const falling = steps.slice(1).every((value, index) => value < (steps[index] as number));
    const rising = steps.slice(1).every((value, index) => value > (steps[index] as number));
    expect(falling || rising).toBe(true);
  });
});
