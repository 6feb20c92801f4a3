import { memo } from 'react';

export interface ScrewFaceProps {
  /** Turns in from as found: the slot stands at the true angle. */
  readonly turns: number;
  readonly locked: boolean;
  readonly size: number;
  /** The arrow that shows the way to turn, while in hand. */
  readonly inHand?: boolean;
}

const hexagon = 'M0 -21.5L18.6 -10.7L18.6 10.7L0 21.5L-18.6 10.7L-18.6 -10.7Z';

/** Lock nut and screw. Nut tight: solid and square to the tag; loose: pale and turned 8 degrees. */
export const ScrewFace = memo(function ScrewFace({ turns, locked, size, inHand }: ScrewFaceProps) {
  return (
    <svg className="screw-face" width={size} height={size} viewBox="-25 -25 50 50" aria-hidden="true">
      {inHand && <path d="M-24 -9Q-20 -22 -6 -24.5M-11.5 -24.6L-3.5 -25L-8.5 -19.4Z" className="screw-hint" />}
      <path d={hexagon} className={locked ? 'nut nut-tight' : 'nut'} transform={locked ? undefined : 'rotate(8)'} />
      <circle r="11.6" className="screw-disc" />
      <path d="M0 -8.2V8.2" className="screw-slot" transform={`rotate(${(turns * 360) % 360})`} />
    </svg>
  );
});

export interface DialFaceProps {
  /** Place in the range, 0..1. */
  readonly share: number;
  readonly size: number;
}

const ticks = Array.from({ length: 7 }, (_, k) => -135 + k * 45);

/** A dial: supply and load are no screws. */
export const DialFace = memo(function DialFace({ share, size }: DialFaceProps) {
  return (
    <svg className="screw-face" width={size} height={size} viewBox="-25 -25 50 50" aria-hidden="true">
      {ticks.map((angle) => (
        <path key={angle} d="M0 -22.5V-18.5" className="dial-tick" transform={`rotate(${angle})`} />
      ))}
      <circle r="15.5" className="screw-disc" />
      <path d="M0 -2V-13" className="screw-slot" transform={`rotate(${-135 + 270 * Math.min(1, Math.max(0, share))})`} />
      <circle r="2.4" className="dial-hub" />
    </svg>
  );
});
