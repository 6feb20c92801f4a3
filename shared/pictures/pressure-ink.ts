/** Pressure ink: tint and strands of a working line by its pressure's share of one scale (UI.md section 3). The tint is mixed
 *  in OKLab between six stops; lightness moves steadily and the hue never passes through red. */

export type ThemeName = 'light' | 'dark';

/** Working line: 7 px at the 10 px module, cased by 1 px of ink on both sides; in modules. */
export const LINE_WIDTH = 0.7;
export const CASING = 0.1;
/** Pilot and drain lines. */
export const DASHED_WIDTH = 0.18;
export const FILLET = 0.9;
/** Flow barbs, in pixels at desk scale: spacing clamp(15, 420/Q, 60), Q in L/min; none below this flow, none on shorter segments. */
export const BARB_LEAST = 15;
export const BARB_MOST = 60;
export const BARB_FLOW = 420;
export const LEAST_FLOW = 0.3 / 60_000;
export const LEAST_SEGMENT = 20;

export const oilStops: Readonly<Record<ThemeName, readonly string[]>> = {
  light: ['#dcdbd8', '#d9c27c', '#bf9a34', '#93721a', '#614a12', '#2c220c'],
  dark: ['#55585a', '#7a6a3c', '#a1843a', '#c9a94c', '#e6cf86', '#fbf1d2'],
};

const scales = [100e5, 160e5, 250e5, 350e5, 420e5] as const;

/** Scale of the ink [Pa]: the smallest of 100, 160, 250, 350 and 420 bar not below the peak nor the lowest rating.
 *  @param peak highest pressure of any run [Pa]
 *  @param lowestRating lowest pressure rating entered [Pa]; 0 = none, which gives 420 bar */
export function inkScale(peak: number, lowestRating: number): number {
  const need = Math.max(peak, lowestRating > 0 ? lowestRating : 420e5);
  return scales.find((scale) => scale >= need - 1) ?? scales[scales.length - 1]!;
}

/** Share of the scale, not clamped above: more than 1 = above the scale. */
export function inkShare(pressure: number, scale: number): number {
  return scale > 0 ? Math.max(0, pressure) / scale : 0;
}

/** Strands in a line: one more at each fifth of the scale, the fifth only at or above its top. */
export function strandCount(share: number): number {
  return Math.max(0, Math.min(5, Math.floor(share * 5 + 1e-9)));
}

/** Strands are ink on light tints and sheet-coloured from 2.6 fifths. */
export function strandInk(share: number): 'ink' | 'sheet' {
  return share * 5 >= 2.6 ? 'sheet' : 'ink';
}

/** Offsets of the strands across a line or chamber of the given width, in the same unit. */
export function strandOffsets(count: number, width: number): readonly number[] {
  return Array.from({ length: count }, (_, k) => ((k + 1) / (count + 1) - 0.5) * width);
}

/** Colour of a share of the scale as #rrggbb. */
export function oilTint(share: number, theme: ThemeName): string {
  const stops = oilStops[theme];
  const place = Math.max(0, Math.min(1, share)) * 5;
  const k = Math.min(4, Math.floor(place));
  return mixOklab(stops[k]!, stops[k + 1]!, place - k);
}

/** The same as a CSS colour that follows the theme by itself: stops are the variables --oil-0 … --oil-1000. */
export function oilTintCss(share: number): string {
  const place = Math.max(0, Math.min(1, share)) * 5;
  const k = Math.min(4, Math.floor(place));
  const part = Math.round((place - k) * 100);
  if (part === 0) return `var(--oil-${k * 200})`;
  return `color-mix(in oklab, var(--oil-${k * 200}), var(--oil-${(k + 1) * 200}) ${part}%)`;
}

type Triple = readonly [number, number, number];

function toLinear(hex: string): Triple {
  const channel = (at: number) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

/** OKLab of a colour #rrggbb: lightness 0..1, a, b. Matrices as published with the colour space (CSS Color 4, section 20). */
export function oklab(hex: string): Triple {
  const [r, g, b] = toLinear(hex);
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function fromOklab([lightness, a, b]: Triple): string {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return `#${[
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ]
    .map((value) => {
      const clipped = Math.max(0, Math.min(1, value));
      const encoded = clipped <= 0.0031308 ? clipped * 12.92 : 1.055 * clipped ** (1 / 2.4) - 0.055;
      return Math.round(encoded * 255)
        .toString(16)
        .padStart(2, '0');
    })
    .join('')}`;
}

function mixOklab(from: string, to: string, part: number): string {
  const a = oklab(from);
  const b = oklab(to);
  return fromOklab([a[0] + (b[0] - a[0]) * part, a[1] + (b[1] - a[1]) * part, a[2] + (b[2] - a[2]) * part]);
}
