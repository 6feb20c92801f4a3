import { useState } from 'react';
import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { CaseLetter, FindingNumeral } from '#src/components/case-letter.tsx';
import { PhraseText } from '#src/components/quantity.tsx';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { explain } from '#src/stores/explain-store.ts';
import type { NumberedFinding } from '#src/stores/findings-numbering.ts';
import type { FindingItemProps } from './finding-item.tsx';
import { RemedyAction, RemedyWords } from './remedy.tsx';
import { showMoment } from './show-moment.ts';

/** The rail's card: numeral, pen, headline; pressing it shows the moment and opens the cause. */
export function RailItem({ entry, caution }: FindingItemProps) {
  const { finding, number, ink } = entry;
  const [open, setOpen] = useState(false);
  const time = useCursor((state) => state.time);
  const activeCase = useDocument((state) => state.activeCase);
  const inHand = finding.caseId === activeCase && finding.time !== undefined && Math.abs(finding.time - time) < 0.005;
  return (
    <article className="rail-item" data-in-hand={inHand || undefined} data-rule={finding.rule} id={`finding-${number}`}>
      <button
        type="button"
        className="rail-open"
        aria-expanded={open}
        onClick={() => {
          setOpen(!open);
          if (!open) showMoment(finding);
        }}
      >
        <span className="rail-marks">
          <FindingNumeral number={number} size={24} />
          <CaseLetter letter={caseLetter({ ink })} ink={ink} size={26} label="case" />
        </span>
        <PlainPhrase entry={entry} />
      </button>
      {open && (
        <>
          <p className="finding-cause">
            <PhraseText phrase={finding.cause} caseId={finding.caseId} />
            <RemedyWords finding={finding} />{' '}
            <button type="button" className="link finding-why" onClick={() => explain(`finding.${finding.id}`, finding.caseId)}>
              How is this computed?
            </button>
          </p>
          {caution && <p className="finding-cause">{caution}</p>}
          <RemedyAction finding={finding} />
        </>
      )}
    </article>
  );
}

function PlainPhrase({ entry }: { readonly entry: NumberedFinding }) {
  const plain = entry.finding.headline.map((part) => (typeof part === 'string' ? part : { ...part, address: undefined }));
  return (
    <span className="rail-words">
      <PhraseText phrase={plain} />
    </span>
  );
}
