import { useMemo } from 'react';
import { envelope, extent } from '#shared/pictures/envelope.ts';
import { linearScale } from '#shared/pictures/scale.ts';
import { valueAt } from '#shared/simulation/result.ts';

export interface SparklineProps {
  readonly times: Float64Array;
  readonly values: Float64Array;
  /** Stretches over which the line is drawn [s]; without them the whole run. */
  readonly stretches?: readonly (readonly [from: number, to: number])[];
  /** Length of the time axis [s]. */
  readonly duration: number;
  /** Index of the case ink. */
  readonly ink: number;
  readonly dash?: readonly number[];
  readonly stroke?: number;
  readonly width?: number;
  readonly height?: number;
  /** Fill the width of its place; `width` is then only the drawing's resolution. */
  readonly stretch?: boolean;
  /** Dotted line at this value, e.g. 1 for rated torque. */
  readonly reference?: number;
  /** Mark where the first stretch ends at a stall. */
  readonly stalled?: boolean;
  readonly stale?: boolean;
}

/** A trace in the size of a word: no axes, no words; what it shows is said beside it. */
export function Sparkline(props: SparklineProps) {
  const { times, values, duration, reference, stalled = false } = props;
  const width = props.width ?? (props.stretch ? 220 : 72);
  const height = props.height ?? 26;
  const stretches = props.stretches;
  const drawn = useMemo(() => {
    const drawnOver = stretches ?? [[0, times[times.length - 1] ?? 0] as const];
    let low = 0;
    let high = Math.max(reference ?? 0, 1e-12);
    for (const [from, to] of drawnOver) {
      const span = extent(times, values, from, to);
      if (!span) continue;
      low = Math.min(low, span[0]);
      high = Math.max(high, span[1]);
    }
    const room = stalled ? 7 : 2;
    const x = linearScale(0, duration || 1, 1, width - 1);
    const y = linearScale(low, high, height - 2, room);
    let d = '';
    for (const [from, to] of drawnOver) {
      const points = envelope(times, values, from, to, Math.max(8, Math.round(width / 1.5)));
      for (let i = 0; i < points.length; i += 2) {
        d += `${i === 0 ? 'M' : 'L'}${x(points[i] as number).toFixed(1)} ${y(points[i + 1] as number).toFixed(1)}`;
      }
    }
    const end = drawnOver[0]?.[1] ?? 0;
    if (d === '') return null;
    return { d, x: x(end), y: y(valueAt(times, values, end)), reference: reference === undefined ? null : y(reference) };
  }, [times, values, stretches, duration, reference, stalled, width, height]);
  if (!drawn) return null;
  return (
    <svg
      className="sparkline"
      viewBox={`0 0 ${width} ${height}`}
      width={props.stretch ? '100%' : width}
      height={height}
      preserveAspectRatio={props.stretch ? 'none' : undefined}
      aria-hidden="true"
      opacity={props.stale ? 0.4 : 1}
    >
      {drawn.reference !== null && (
        <path d={`M0 ${drawn.reference.toFixed(1)}H${width}`} stroke="var(--ink3)" strokeWidth="1" strokeDasharray="1.5 2.5" />
      )}
      <path
        d={drawn.d}
        fill="none"
        stroke={`var(--case-${props.ink})`}
        strokeWidth={props.stroke ?? 2.2}
        strokeDasharray={props.dash?.join(' ') || undefined}
        strokeLinejoin="round"
        vectorEffect="non-scaling-stroke"
      />
      {stalled && (
        <g transform={`translate(${drawn.x.toFixed(1)} ${drawn.y.toFixed(1)})`}>
          <path d="M-2.5 -6h5l3.5 3.5v5l-3.5 3.5h-5l-3.5 -3.5v-5z" fill="var(--verdict-motor-stalls)" />
          <path d="M-3.4 0h6.8" stroke="var(--sheet)" strokeWidth="2" />
        </g>
      )}
    </svg>
  );
}
