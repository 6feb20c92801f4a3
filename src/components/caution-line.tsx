import { useState } from 'react';
import { CautionIcon } from './icons.tsx';

/** Word for word from the product's cautions; nothing may be left out of the whole. */
export const cautionHead = 'A calculation, not a permission. Stop and lock out.';
export const cautionRest =
  'Lower or block the load, let pressure down and prove zero at the cylinder as well as the pump; a gauge at the pump can read zero while a cylinder is loaded. Turn a quarter, tighten the nut, stand clear, start, read. Repeat.';
export const standingCaution = `${cautionHead} ${cautionRest}`;

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
