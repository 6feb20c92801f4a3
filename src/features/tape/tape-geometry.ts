import { scaleLinear } from 'd3-scale';
import type { TapeLane } from './tape-model.ts';

/** Where things lie on the canvas [CSS px]. The plot is `plotWidth` wide; `width` adds the margin for letters at trace ends. */
export interface TapeGeometry {
  readonly width: number;
  readonly height: number;
  readonly plotWidth: number;
  readonly from: number;
  readonly to: number;
  readonly lanes: readonly { readonly index: number; readonly top: number; readonly height: number }[];
  /** Letters in boxes at the ends of traces, where three or more cases share the focus lane. */
  readonly letters: boolean;
}

const PAD_TOP = 5;
const PAD_BOTTOM = 4;

/** What the drawing functions use of a canvas. */
export type Context = Pick<
  CanvasRenderingContext2D,
  | 'save'
  | 'restore'
  | 'beginPath'
  | 'moveTo'
  | 'lineTo'
  | 'stroke'
  | 'fillRect'
  | 'clearRect'
  | 'setLineDash'
  | 'fillText'
  | 'rect'
  | 'clip'
  | 'measureText'
  | 'strokeRect'
> & {
  lineWidth: number;
  strokeStyle: unknown;
  fillStyle: unknown;
  globalAlpha: number;
  font: string;
  textAlign: CanvasTextAlign;
  textBaseline: CanvasTextBaseline;
  lineJoin: CanvasLineJoin;
  lineCap: CanvasLineCap;
};

export function timeScale(geometry: TapeGeometry) {
  return scaleLinear([geometry.from, geometry.to], [0, geometry.plotWidth]);
}

/** Value [SI] → y on the canvas. */
export function laneScale(lane: TapeLane, top: number, height: number) {
  return scaleLinear([lane.low, lane.high], [top + height - PAD_BOTTOM, top + PAD_TOP]);
}

/** A dotted line through the lanes at a pinned moment. */
export interface Vertical {
  readonly time: number;
  readonly ink: number;
}
