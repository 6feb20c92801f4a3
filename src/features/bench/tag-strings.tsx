import { memo } from 'react';
import type { TagPlace } from '#shared/pictures/tag-slots.ts';

export interface TagStringsProps {
  readonly places: readonly TagPlace[];
  /** Modules per pixel × 10. */
  readonly grow: number;
  readonly inHand: string | null;
}

/** A string hangs a little: the control point lies below its middle, more the longer it is. */
function hanging(place: TagPlace): string {
  const { from, to } = place.string;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const sag = Math.min(1.6, length * 0.16);
  const side = to.x >= from.x ? 1 : -1;
  const nx = ((to.y - from.y) / (length || 1)) * side;
  const ny = (-(to.x - from.x) / (length || 1)) * side;
  const down = ny < 0 ? -1 : 1;
  const cx = (from.x + to.x) / 2 + nx * sag * down;
  const cy = (from.y + to.y) / 2 + ny * sag * down;
  return `M${from.x} ${from.y}Q${cx} ${cy} ${to.x} ${to.y}`;
}

/** Strings from tags to their screws, with the ring where each ties on. In modules. */
export const TagStrings = memo(function TagStrings({ places, grow, inHand }: TagStringsProps) {
  return (
    <svg className="bench-strings" width="1" height="1" overflow="visible" aria-hidden="true">
      <g transform="scale(10)">
        {places.map((place) => (
          <g
            key={place.address}
            data-string={place.address}
            className={place.address === inHand ? 'tag-string tag-string-in-hand' : 'tag-string'}
          >
            <path d={hanging(place)} strokeWidth={0.13 * grow} />
            <circle cx={place.string.to.x} cy={place.string.to.y} r={0.36 * Math.min(1.3, grow)} strokeWidth={0.15 * grow} />
          </g>
        ))}
      </g>
    </svg>
  );
});
