/** Drawing lists: pictures as plain data. `src` renders them to React or canvas, `server` to SVG.
 *  Coordinates in modules for symbols and schematics, in pixels for charts; y points down. */

/** Colour roles; the renderer maps them to the tokens of the theme (light or dark). */
export type Ink =
  | 'ink'
  | 'ink2'
  | 'ink3'
  | 'edge'
  | 'rule'
  | 'sheet'
  | 'paper'
  | 'well'
  | 'oxide'
  | 'pick'
  | 'card'
  | 'metal'
  | 'none'
  | 'focus'
  | `case-${number}`
  | `verdict-${string}`
  | `tint-${string}`
  /** Oil tint of a share of the scale 0..1, given as 0..1000. */
  | `oil-${number}`;

export interface Stroke {
  readonly stroke?: Ink;
  readonly fill?: Ink;
  readonly width?: number;
  readonly dash?: readonly number[];
  /** Round joins and caps are the default. */
  readonly cap?: 'butt' | 'round';
  readonly opacity?: number;
  /** Name of a texture: 'cross-hatch', 'hatch', 'dots', 'waves', 'verticals', 'chevrons'. */
  readonly texture?: string;
  /** For tests and styling. */
  readonly role?: string;
}

export type Shape =
  | (Stroke & { readonly type: 'line'; readonly x1: number; readonly y1: number; readonly x2: number; readonly y2: number })
  | (Stroke & {
      readonly type: 'rect';
      readonly x: number;
      readonly y: number;
      readonly w: number;
      readonly h: number;
      readonly radius?: number;
    })
  | (Stroke & { readonly type: 'circle'; readonly x: number; readonly y: number; readonly r: number })
  | (Stroke & { readonly type: 'polyline'; readonly points: readonly number[] | Float64Array; readonly closed?: boolean })
  | (Stroke & { readonly type: 'path'; readonly d: string })
  | (Stroke & {
      readonly type: 'text';
      readonly x: number;
      readonly y: number;
      readonly text: string;
      readonly size: number;
      readonly anchor?: 'start' | 'middle' | 'end';
      readonly weight?: number;
      readonly font?: 'body' | 'reading';
      readonly turn?: number;
    })
  /** An oil space: tint and strands by pressure, inside a rectangle. */
  | {
      readonly type: 'oil';
      readonly x: number;
      readonly y: number;
      readonly w: number;
      readonly h: number;
      readonly port: string;
      readonly role?: string;
    }
  | {
      readonly type: 'group';
      readonly dx: number;
      readonly dy: number;
      readonly turn?: number;
      readonly mirror?: boolean;
      readonly shapes: readonly Shape[];
      readonly role?: string;
    };

export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly title: string;
  readonly shapes: readonly Shape[];
}
