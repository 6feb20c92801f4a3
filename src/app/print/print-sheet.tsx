import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { STANDING_CAUTION } from '#shared/findings/cautions.ts';
import { schematicPicture } from '#shared/pictures/schematic.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { PhraseText } from '#src/components/quantity.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { VerdictChip } from '#src/components/verdict.tsx';
import { MotorLoad } from '#src/features/findings/motor-load.tsx';
import { RemedyWords } from '#src/features/findings/remedy.tsx';
import { loadPictureSvg } from '#src/features/load-picture/load-export.ts';
import { useLoadCases } from '#src/features/load-picture/use-load-cases.ts';
import { tapeSvg } from '#src/features/tape/tape-export.ts';
import { useTape } from '#src/features/tape/use-tape.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useNumberedFindings } from '#src/stores/findings-numbering.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { PrintedSettings, screwNumerals } from './printed-settings.tsx';
import { SvgText } from './svg-text.tsx';

const LANES = 5;

/** The bench on A4: drawing at rest with numerals instead of tags, settings, findings, load picture, tape, caution. */
export function PrintSheet() {
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const byCase = useRuns((state) => state.byCase);
  const findings = useNumberedFindings();
  const { preferences } = useFormat();
  const loadCases = useLoadCases();
  const tape = useTape(LANES);
  const numerals = screwNumerals(document);
  const drawing = pictureToSvg(schematicPicture(document, activeCase, null, { numerals, notes: true }), 'light', {
    scale: 10,
    ground: 'white',
  });
  const places = findings.flatMap(({ number, finding }) => (finding.at ? [{ number, caseId: finding.caseId, ...finding.at }] : []));
  const starts = document.duty.commands.map((command) => command.time);
  const shown = document.cases.filter((entry) => entry.id === activeCase || overlays.includes(entry.id));
  return (
    <article className="print-sheet">
      <header>
        <h1>{document.title}</h1>
        <p>Swashbench, calculated {new Date().toLocaleString(undefined, { dateStyle: 'long', timeStyle: 'short' })}</p>
        <ul className="print-cases">
          {shown.map((entry) => (
            <li key={entry.id}>
              <strong>{caseLetter(entry)}</strong> {entry.name} <VerdictChip verdict={byCase[entry.id]?.assessment?.verdict ?? null} />
            </li>
          ))}
        </ul>
      </header>
      <SvgText label="Drawing, at rest" svg={drawing} />
      <PrintedSettings document={document} shown={shown} numerals={numerals} />
      <section>
        <h2>Findings</h2>
        <ol>
          {findings.map(({ number, finding, ink }) => (
            <li key={`${finding.caseId}:${finding.id}`} value={number}>
              <strong>
                {caseLetter({ ink })}: <PhraseText phrase={finding.headline} />
              </strong>{' '}
              <PhraseText phrase={finding.cause} />
              <RemedyWords finding={finding} />
              {finding.caution && ` ${finding.caution}`}
            </li>
          ))}
        </ol>
        <MotorLoad />
      </section>
      {loadCases.length > 0 && (
        <SvgText
          label="Load picture"
          svg={loadPictureSvg(document.title, loadCases, places, preferences, useCursor.getState().time, starts)}
        />
      )}
      <SvgText label="Tape" svg={tapeSvg(document, tape, preferences)} />
      <p className="print-caution">{STANDING_CAUTION}</p>
    </article>
  );
}
