import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { CaseLetter, FindingNumeral } from '#src/components/case-letter.tsx';
import { CautionIcon } from '#src/components/icons.tsx';
import { PhraseText } from '#src/components/quantity.tsx';
import { explain } from '#src/stores/explain-store.ts';
import type { NumberedFinding } from '#src/stores/findings-numbering.ts';
import { RemedyAction, RemedyWords } from './remedy.tsx';
import { showMoment } from './show-moment.ts';

export interface FindingItemProps {
  readonly entry: NumberedFinding;
  /** Caution that goes with it, unless an earlier finding has said it. */
  readonly caution?: string;
}

/** Numeral, pen, headline with its time; cause with the figures that collide; remedy; one primary and one quiet action. */
export function FindingItem({ entry, caution }: FindingItemProps) {
  const { finding, number, ink } = entry;
  return (
    <article className="finding" data-rule={finding.rule} data-severity={finding.severity} id={`finding-${number}`}>
      <h3 className="finding-head">
        <FindingNumeral number={number} />
        <CaseLetter letter={caseLetter({ ink })} ink={ink} label="case" size={22} />
        <span>
          <PhraseText phrase={finding.headline} caseId={finding.caseId} />
        </span>
      </h3>
      <p className="finding-cause">
        <PhraseText phrase={finding.cause} caseId={finding.caseId} />
        <RemedyWords finding={finding} />{' '}
        <button type="button" className="link finding-why" onClick={() => explain(`finding.${finding.id}`, finding.caseId)}>
          How is this computed?
        </button>
      </p>
      <div className="finding-actions">
        <RemedyAction finding={finding} />
        {finding.time !== undefined && (
          <button type="button" className="button-quiet" onClick={() => showMoment(finding)}>
            Show the moment
          </button>
        )}
      </div>
      {caution && (
        <p className="finding-caution">
          <CautionIcon size={16} />
          <span>{caution}</span>
        </p>
      )}
    </article>
  );
}
