import { oilTint, type ThemeName } from './pressure-ink.ts';
import type { Ink } from './shape.ts';

/** Colours of drawing lists where no style sheet is at hand: exported SVG and PNG, and pictures made by the server. The screen's
 *  style sheet holds the same values (checked by a test). */

type Tokens = Readonly<Record<string, string>>;

export const themeTokens: Readonly<Record<ThemeName, Tokens>> = {
  light: {
    desk: '#e7ddc8',
    paper: '#f3ecdc',
    sheet: '#fcf8ee',
    well: '#ebe2cf',
    rule: '#dcd1b9',
    edge: '#8b7b5c',
    ink: '#1b2225',
    ink2: '#43484a',
    ink3: '#5a5c58',
    oxide: '#a8501f',
    focus: '#1757a6',
    pick: '#fff0b8',
    card: '#d2ad7c',
    metal: '#d3d3cb',
    'case-0': '#1b2225',
    'case-1': '#0b6a68',
    'case-2': '#7a2c5c',
    'case-3': '#4a6514',
    'case-4': '#3b4a9b',
    'verdict-failed': '#3c4144',
    'tint-failed': '#fcf8ee',
    'verdict-above-rating': '#93214f',
    'tint-above-rating': '#f1ccd8',
    'verdict-motor-stalls': '#7c1b1b',
    'tint-motor-stalls': '#e9b9a5',
    'verdict-trips': '#a03a0e',
    'tint-trips': '#f3cda9',
    'verdict-rod-stops-short': '#4a4f52',
    'tint-rod-stops-short': '#dedad0',
    'verdict-relief-passing': '#8a3f1f',
    'tint-relief-passing': '#ebd6c6',
    'verdict-over': '#855300',
    'tint-over': '#f6e3ae',
    'verdict-within-limits': '#2b6336',
    'tint-within-limits': '#dfe8cf',
  },
  dark: {
    desk: '#0f1416',
    paper: '#161c1f',
    sheet: '#1b2327',
    well: '#12181a',
    rule: '#313b3f',
    edge: '#7f8c8e',
    ink: '#f1e9d8',
    ink2: '#cfc8b8',
    ink3: '#aba797',
    oxide: '#ee9a4e',
    focus: '#7db7ff',
    pick: '#3a3314',
    card: '#7a5c36',
    metal: '#4c565a',
    'case-0': '#f1e9d8',
    'case-1': '#5cc8c0',
    'case-2': '#e79ac6',
    'case-3': '#b4cf6e',
    'case-4': '#a9b6ff',
    'verdict-failed': '#cfc8b8',
    'tint-failed': '#1b2327',
    'verdict-above-rating': '#f59abb',
    'tint-above-rating': '#43202e',
    'verdict-motor-stalls': '#ff9a8c',
    'tint-motor-stalls': '#45201f',
    'verdict-trips': '#f79a66',
    'tint-trips': '#43281a',
    'verdict-rod-stops-short': '#b9bebe',
    'tint-rod-stops-short': '#2a3033',
    'verdict-relief-passing': '#e8a27c',
    'tint-relief-passing': '#39281f',
    'verdict-over': '#f0be5a',
    'tint-over': '#3b2f13',
    'verdict-within-limits': '#93ce97',
    'tint-within-limits': '#21352a',
  },
};

/** #rrggbb (or 'none') of a colour role in a theme. A sixth case and later ones start the row of inks again. */
export function inkColour(ink: Ink, theme: ThemeName): string {
  if (ink === 'none') return 'none';
  if (ink.startsWith('oil-')) return oilTint(Number(ink.slice(4)) / 1000, theme);
  if (ink.startsWith('case-')) return themeTokens[theme][`case-${Number(ink.slice(5)) % 5}`] ?? themeTokens[theme].ink!;
  return themeTokens[theme][ink] ?? themeTokens[theme].ink!;
}
