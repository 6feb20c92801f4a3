import { useState } from 'react';
import { type NumberedFinding, useNumberedFindings } from '#src/stores/findings-numbering.ts';
import { FindingItem } from './finding-item.tsx';
import { FindingsState } from './findings-state.tsx';
import { MotorLoad } from './motor-load.tsx';
import { RailItem } from './rail-item.tsx';

export interface FindingsPanelProps {
  /** 'list' beside the drawing and on the phone; 'rail' on a tablet. */
  readonly form: 'list' | 'rail';
}

const FIRST = 3;

/** What happened, when, why, and what would change it: the worst three, then the rest in place. */
export function FindingsPanel({ form }: FindingsPanelProps) {
  const findings = useNumberedFindings();
  const [open, setOpen] = useState(false);
  const rest = findings.length - FIRST;
  const shown = open ? findings : findings.slice(0, FIRST);
  return (
    <div className={`findings findings-${form}`}>
      <div className="findings-scroll">
        <FindingsState />
        <ol className="finding-list">
          {shown.map((entry, index) => (
            <li key={`${entry.finding.caseId}:${entry.finding.id}`} value={entry.number}>
              {form === 'rail' ? (
                <RailItem entry={entry} caution={firstWith(shown, index)} />
              ) : (
                <FindingItem entry={entry} caution={firstWith(shown, index)} />
              )}
            </li>
          ))}
        </ol>
        {rest > 0 && (
          <button type="button" className="findings-more" aria-expanded={open} onClick={() => setOpen(!open)}>
            {open ? 'Only the worst three' : `${rest} more`}
          </button>
        )}
      </div>
      <MotorLoad />
    </div>
  );
}

/** A caution stands with the first finding that brings it, not with each. */
function firstWith(shown: readonly NumberedFinding[], index: number): string | undefined {
  const caution = shown[index]?.finding.caution;
  return shown.findIndex((entry) => entry.finding.caution === caution) === index ? caution : undefined;
}
