import { oilTintCss } from '#shared/pictures/pressure-ink.ts';
import type { Ink } from '#shared/pictures/shape.ts';

/** A colour role as a CSS colour that follows the theme by itself. */
export function inkCss(ink: Ink): string {
  if (ink === 'none') return 'none';
  if (ink.startsWith('oil-')) return oilTintCss(Number(ink.slice(4)) / 1000);
  return `var(--${ink})`;
}
