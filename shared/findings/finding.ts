import type { CaseChange } from '../circuit/schema.ts';
import type { QuantityId } from '../units/quantities.ts';

/** A number inside a sentence: formatted by the reader's unit choice, computed by the engine or entered by someone. */
export interface Figure {
  readonly value: number;
  readonly quantity: QuantityId;
  /** Loads round to nearest, margins down. */
  readonly rounding?: 'nearest' | 'down';
  readonly digits?: number;
  /** Channel or parameter it came from. */
  readonly address?: string;
}
export type Phrase = readonly (string | Figure)[];

export const verdictIds = [
  'failed',
  'above-rating',
  'motor-stalls',
  'trips',
  'rod-stops-short',
  'relief-passing',
  'over',
  'within-limits',
] as const;
/** In the order of precedence of the contracts. */
export type VerdictId = (typeof verdictIds)[number];
export const verdictWords: Record<VerdictId, string> = {
  failed: 'Failed',
  'above-rating': 'Above rating',
  'motor-stalls': 'Motor stalls',
  trips: 'Trips',
  'rod-stops-short': 'Rod stops short',
  'relief-passing': 'Relief passing',
  over: 'Over',
  'within-limits': 'Within limits',
};
export interface Verdict {
  readonly id: VerdictId;
  /** Words of the chip: usually verdictWords[id]; 'No relief protects a net', 'Does not come up to speed' where that is the reason. */
  readonly word: string;
  /** Figure or time after the comma, if there is one. */
  readonly figure?: Figure;
}

export type FindingRule =
  | 'motor-stalls'
  | 'dips-and-recovers'
  | 'not-up-to-speed'
  | 'will-trip'
  | 'over-nameplate'
  | 'small-stall-margin'
  | 'supply-out-of-band'
  | 'relief-before-compensator'
  | 'relief-gap-small'
  | 'relief-passing'
  | 'rod-stops-short'
  | 'slower-than-pump'
  | 'above-rating'
  | 'heat'
  | 'inlet-starving'
  | 'intensification'
  | 'hunting'
  | 'load-above-compensator'
  | 'load-runs-away'
  | 'does-not-destroke'
  | 'no-relief'
  | 'load-drives-pump'
  | 'pressure-left'
  | 'requirement'
  | 'run-failed'
  | 'within-limits';

export interface Finding {
  /** rule + component, stable between runs of one case. */
  readonly id: string;
  readonly rule: FindingRule;
  /** 0 stops the job … 3 a note. Findings are shown worst first. */
  readonly severity: 0 | 1 | 2 | 3;
  readonly verdict?: VerdictId;
  readonly caseId: string;
  readonly component?: string;
  /** Moment on the tape [s]. */
  readonly time?: number;
  readonly headline: Phrase;
  /** Cause with the figures that collide. */
  readonly cause: Phrase;
  /** What would change it, in words; the figure is sought by running (seek.ts). */
  readonly remedy?: {
    readonly words: Phrase;
    /** The one setting to be sought, with its limits; absent = advice without a figure. */
    readonly seek?: Seek;
  };
  /** Caution from PRODUCT.md that goes with it. */
  readonly caution?: string;
  /** Point on the load picture [Pa, m³/s]. */
  readonly at?: { readonly pressure: number; readonly flow: number };
}

/** Find the value of one setting that meets a limit. */
export interface Seek {
  readonly target: string;
  readonly field: string;
  readonly quantity: QuantityId;
  readonly low: number;
  readonly high: number;
  /** 'largest' value for which the goal is met, or the 'smallest'. */
  readonly want: 'largest' | 'smallest';
  readonly goal: 'not-stalled-with-margin' | 'not-tripping' | 'compensates-first' | 'within-limits';
}
export interface SeekResult {
  readonly found: boolean;
  readonly change?: CaseChange;
  /** In words: predicted figures at the found value, or why there is none. */
  readonly words: Phrase;
  readonly runs: number;
}

/** Three yardsticks of motor load; null where they do not apply. */
export interface Yardsticks {
  readonly motor: string;
  /** Pull-out torque at the lowest supply ÷ highest torque asked (after run-up). null when stalled. */
  readonly stallMargin: number | null;
  readonly stalled: boolean;
  readonly stallTime?: number;
  /** Current while stalled [A]. */
  readonly stallCurrent?: number;
  /** RMS current over the repeated duty ÷ nameplate current. */
  readonly rmsCurrent: number;
  /** RMS torque over the repeated duty ÷ rated torque. */
  readonly rmsTorque: number;
  /** Peak torque ÷ rated torque. */
  readonly peakTorque: number;
  /** Highest current after run-up [A]. */
  readonly peakCurrent: number;
  /** Time to trip on the repeated duty [s]; null = never. */
  readonly tripTime: number | null;
}

export interface Assessment {
  readonly caseId: string;
  readonly verdict: Verdict;
  readonly findings: readonly Finding[];
  readonly yardsticks: readonly Yardsticks[];
  /** Time at which each requirement was met, or how far it was missed. */
  readonly requirements: readonly { readonly id: string; readonly met: boolean; readonly value: number | null; readonly words: Phrase }[];
  /** Mean heat over the run [W]. */
  readonly heat: number;
}
