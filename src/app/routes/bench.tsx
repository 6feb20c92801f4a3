import { type ReactNode, Suspense, useMemo, useState } from 'react';
import { CautionLine } from '#src/components/caution-line.tsx';
import { ErrorRegion } from '#src/components/error-region.tsx';
import { later } from '#src/components/later.ts';
import { useFormat } from '#src/components/use-format.ts';
import { BenchDrawing } from '#src/features/bench/bench-drawing.tsx';
import { CaseRow } from '#src/features/cases/case-row.tsx';
import { FindingsPanel } from '#src/features/findings/findings-panel.tsx';
import { showMoment } from '#src/features/findings/show-moment.ts';
import { LoadPicturePanel } from '#src/features/load-picture/load-picture-panel.tsx';
import { TapePanel } from '#src/features/tape/tape-panel.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { type NumberedFinding, useNumberedFindings } from '#src/stores/findings-numbering.ts';
import { useNameplate } from '#src/stores/nameplate-store.ts';
import { useBenchKeys } from '../bench-keys.ts';
import { BottomBar, type PhoneView } from '../bottom-bar.tsx';
import { NoticeStrip } from '../notice-strip.tsx';
import { PrintHost } from '../print/print-host.tsx';
import { Staged, Stages } from '../staged.tsx';
import { TopLine } from '../top-line.tsx';

const NameplateLayer = later(async () => (await import('#src/features/nameplate/nameplate-layer.tsx')).NameplateLayer);

/** The bench: one sheet of paper, its regions divided by ink rules, in the arrangement the width allows. */
export function BenchRoute() {
  const layout = useLayout();
  const phone = layout === 'phone';
  useBenchKeys();
  return (
    <>
      <div className={`screen screen-${layout}`}>
        <TopLine screen="bench" />
        <div className="under-top">
          <CaseRow form={phone ? 'phone' : 'cards'} />
          <NoticeStrip />
        </div>
        <Stages count={4}>
          {layout === 'desk' && <WideBench form="list" layout="desk" />}
          {layout === 'rail' && <WideBench form="rail" layout="rail" />}
          {layout === 'narrow' && <NarrowBench />}
          {phone && <PhoneBench />}
        </Stages>
      </div>
      <PrintHost />
    </>
  );
}

function Drawing() {
  const plate = useNameplate((state) => state.target);
  return (
    <>
      <BenchDrawing />
      {plate && (
        <ErrorRegion name="The nameplate" resetOn={[plate]}>
          <Suspense fallback={null}>
            <NameplateLayer />
          </Suspense>
        </ErrorRegion>
      )}
    </>
  );
}

function Load() {
  const numbered = useNumberedFindings();
  const findings = useMemo(() => numbered.map(({ number, finding }) => ({ number, caseId: finding.caseId, at: finding.at })), [numbered]);
  return <LoadPicturePanel findings={findings} />;
}

/** The tape with the numerals of the findings. */
function Tape({ lanes }: { readonly lanes: 5 | 3 | 1 }) {
  const numbered = useNumberedFindings();
  const format = useFormat();
  const findings = useMemo(
    () =>
      numbered.map(({ number, finding }) => ({
        number,
        caseId: finding.caseId,
        time: finding.time,
        words: format.phrase(finding.headline),
      })),
    [numbered, format],
  );
  return <TapePanel lanes={lanes} findings={findings} onFinding={(number) => showFinding(numbered, number)} />;
}

function showFinding(numbered: readonly NumberedFinding[], number: number) {
  const entry = numbered.find((candidate) => candidate.number === number);
  if (entry) showMoment(entry.finding);
}

/** In which order the regions come when the bench opens. */
const order = { drawing: 1, tape: 2, load: 3, findings: 4 } as const;

function Region({ name, title, children }: { readonly name: keyof typeof order; readonly title: string; readonly children: ReactNode }) {
  const document = useDocument((state) => state.document);
  const inside = (
    <ErrorRegion name={title} resetOn={[document]}>
      <Staged at={order[name]}>{children}</Staged>
    </ErrorRegion>
  );
  const className = `region region-${name}`;
  // Tape and load picture bring their own landmark.
  if (name === 'tape' || name === 'load') return <div className={className}>{inside}</div>;
  return (
    <section className={className} aria-label={title}>
      {inside}
    </section>
  );
}

function WideBench({ form, layout }: { readonly form: 'list' | 'rail'; readonly layout: 'desk' | 'rail' }) {
  return (
    <main className={`bench bench-${layout}`}>
      <Region name="drawing" title="The drawing">
        <Drawing />
      </Region>
      <Region name="findings" title="Findings">
        <FindingsPanel form={form} />
      </Region>
      <Region name="tape" title="The tape">
        <Tape lanes={layout === 'desk' ? 5 : 3} />
      </Region>
      <Region name="load" title="The load picture">
        <Load />
      </Region>
      <div className="region-caution">
        <CautionLine form={form === 'rail' ? 'half' : 'whole'} />
      </div>
    </main>
  );
}

function NarrowBench() {
  const [side, setSide] = useState<'findings' | 'load'>('findings');
  const count = useNumberedFindings().length;
  return (
    <main className="bench bench-narrow">
      <Region name="drawing" title="The drawing">
        <Drawing />
      </Region>
      <div className="region-rail">
        <div className="rail-tabs" role="tablist" aria-label="Beside the drawing">
          <button type="button" role="tab" id="tab-findings" aria-selected={side === 'findings'} onClick={() => setSide('findings')}>
            Findings {count}
          </button>
          <button type="button" role="tab" id="tab-load" aria-selected={side === 'load'} onClick={() => setSide('load')}>
            Load
          </button>
        </div>
        {side === 'findings' ? (
          <Region name="findings" title="Findings">
            <FindingsPanel form="list" />
          </Region>
        ) : (
          <Region name="load" title="The load picture">
            <Load />
          </Region>
        )}
      </div>
      <Region name="tape" title="The tape">
        <Tape lanes={3} />
      </Region>
      <div className="region-caution">
        <CautionLine form="half" />
      </div>
    </main>
  );
}

function PhoneBench() {
  const [view, setView] = useState<PhoneView>('drawing');
  const count = useNumberedFindings().length;
  return (
    <main className="bench bench-phone">
      <div className={`phone-view phone-view-${view}`}>
        {view === 'drawing' && (
          <Region name="drawing" title="The drawing">
            <Drawing />
          </Region>
        )}
        {(view === 'tape' || view === 'drawing') && (
          <Region name="tape" title="The tape">
            <Tape lanes={view === 'tape' ? 5 : 1} />
          </Region>
        )}
        {view === 'load' && (
          <Region name="load" title="The load picture">
            <Load />
          </Region>
        )}
        {view === 'findings' && (
          <Region name="findings" title="Findings">
            <FindingsPanel form="list" />
          </Region>
        )}
      </div>
      <div className="region-caution">
        <CautionLine form="half" />
      </div>
      <BottomBar view={view} findings={count} onChange={setView} />
    </main>
  );
}
