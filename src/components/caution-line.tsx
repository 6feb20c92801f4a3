import { useState } from 'react';
import { STANDING_CAUTION } from '#shared/findings/cautions.ts';
import { CautionIcon } from './icons.tsx';

const half = STANDING_CAUTION.indexOf(' Lower or block');
/** The standing caution word for word, in its two halves. */
export const cautionHead = STANDING_CAUTION.slice(0, half);
export const cautionRest = STANDING_CAUTION.slice(half + 1);

export interface CautionLineProps {
  /** 'whole' where there is room; 'half' keeps the first half and opens the rest by "Steps". */
  readonly form?: 'whole' | 'half';
}

/** The standing caution: last on every working screen, not dismissable. */
export function CautionLine({ form = 'whole' }: CautionLineProps) {
  const [open, setOpen] = useState(false);
  return (
    <aside className={`caution caution-${form}`} aria-label="Caution">
      {form === 'whole' && <CautionIcon />}
      <p>
        {cautionHead} {form === 'whole' || open ? cautionRest : <span className="print-only">{cautionRest}</span>}{' '}
        {form === 'half' && (
          <button type="button" className="link" aria-expanded={open} onClick={() => setOpen(!open)}>
            {open ? 'Fewer' : 'Steps'}
          </button>
        )}
      </p>
    </aside>
  );
}
