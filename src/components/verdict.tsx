import type { ReactNode } from 'react';
import type { Verdict, VerdictId } from '#shared/findings/finding.ts';
import { joined } from '#shared/units/format.ts';
import { useFormat } from './use-format.ts';

export type VerdictShape = VerdictId | 'waiting';

/** Each verdict has a shape of its own, so that it is told apart without colour. Box 20 × 20. */
const shapes: Record<VerdictShape, (ink: string, ground: string) => ReactNode> = {
  failed: (ink, ground) => (
    <path
      d="M4.5 2.5h8l3.5 3.5v7l-2.5 2-2.3-1.6-2.2 2.6-2-2.2-2.5 2.4z"
      fill={ground}
      stroke={ink}
      strokeWidth="1.7"
      strokeLinejoin="round"
    />
  ),
  'above-rating': (ink, ground) => (
    <>
      <path d="M2 2.6h16" stroke={ink} strokeWidth="2.2" />
      <path d="M10 5.2 17.4 11.4V18H2.6v-6.6z" fill={ink} />
      <path d="M10 16.6V9.8M7.2 12.4 10 9.6l2.8 2.8" fill="none" stroke={ground} strokeWidth="1.8" />
    </>
  ),
  'motor-stalls': (ink, ground) => (
    <>
      <path d="M6.4 1.4h7.2l5 5v7.2l-5 5H6.4l-5-5V6.4z" fill={ink} />
      <path d="M5 10h10" stroke={ground} strokeWidth="2.8" />
    </>
  ),
  trips: (ink, ground) => (
    <>
      <path d="M10 1 19 10l-9 9-9-9z" fill={ink} />
      <path d="M4.6 11h3.2l4-4.4M12.4 11h3" fill="none" stroke={ground} strokeWidth="1.8" strokeLinecap="round" />
    </>
  ),
  'rod-stops-short': (ink) => (
    <>
      <path d="M1.5 6h10.5v8H1.5z" fill={ink} />
      <path d="M16.6 2.5v15" stroke={ink} strokeWidth="3" />
    </>
  ),
  'relief-passing': (ink, ground) => (
    <>
      <path d="M2 2h16v16H2z" fill={ink} />
      <path d="M4.5 7.6q1.8-2 3.6 0t3.7 0 3.7 0M4.5 12.8q1.8-2 3.6 0t3.7 0 3.7 0" fill="none" stroke={ground} strokeWidth="1.7" />
    </>
  ),
  over: (ink, ground) => (
    <>
      <path d="M10 1.8 19 18H1z" fill={ink} />
      <path d="M10 7.4v5" stroke={ground} strokeWidth="2" />
      <circle cx="10" cy="15.2" r="1.2" fill={ground} />
    </>
  ),
  'within-limits': (ink, ground) => (
    <>
      <circle cx="10" cy="10" r="9" fill={ink} />
      <path d="M5.6 10.4 8.8 13.6 14.6 7" fill="none" stroke={ground} strokeWidth="2.2" />
    </>
  ),
  waiting: (ink) => <circle cx="10" cy="10" r="7.6" fill="none" stroke={ink} strokeWidth="2" strokeDasharray="3.4 2.6" />,
};

export interface VerdictMarkProps {
  readonly verdict: VerdictShape;
  readonly size?: number;
  /** Spoken name; without it the mark is decoration beside its word. */
  readonly label?: string;
}

export function VerdictMark({ verdict, size = 16, label }: VerdictMarkProps) {
  return (
    <svg
      className="verdict-mark"
      width={size}
      height={size}
      viewBox="0 0 20 20"
      role={label ? 'img' : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
    >
      {shapes[verdict](`var(--verdict-${verdict})`, 'var(--sheet)')}
    </svg>
  );
}

export interface VerdictChipProps {
  readonly verdict: Verdict | null;
  /** What to say while there is no verdict, or beside a stale one. */
  readonly state?: 'waiting' | 'running' | 'stale' | 'refused' | 'broken' | 'done';
  readonly size?: 'dense' | 'touch';
  /** The word without its figure. */
  readonly short?: boolean;
  /** Only the shape, the words are for a reader: the narrow cards of the phone. */
  readonly bare?: boolean;
}

const stateWords = {
  waiting: 'Waiting',
  running: 'Running',
  refused: 'Not run: see the drawing',
  broken: 'Not run',
  done: 'Waiting',
  stale: 'Waiting',
} as const;

/** Shape, word, comma, figure or time. */
export function VerdictChip({ verdict, state = 'done', size = 'dense', short = false, bare = false }: VerdictChipProps) {
  const format = useFormat();
  const refused = state === 'refused' || state === 'broken';
  const id: VerdictShape = verdict && !refused ? verdict.id : refused ? 'failed' : 'waiting';
  const figure = verdict?.figure && !refused ? format.figure(verdict.figure) : null;
  const text =
    verdict && !refused
      ? `${format.words(verdict.word)}${figure && !short ? `, ${joined(figure.value, figure.unit)}` : ''}`
      : stateWords[state];
  return (
    <span
      className={`chip chip-${size}${bare ? ' chip-bare' : ''}`}
      data-verdict={id}
      data-stale={state === 'stale' || undefined}
      style={bare ? undefined : { backgroundColor: `var(--tint-${id})`, color: `var(--chip-${id})` }}
    >
      <VerdictMark verdict={id} size={size === 'dense' ? 16 : 20} />
      <span className={bare ? 'visually-hidden' : 'chip-word'}>{text}</span>
    </span>
  );
}
