import { useMemo, useState } from 'react';
import { useReactFlow, useViewport } from 'reactflow';
import { countInWords } from '#shared/circuit/in-words.ts';
import { findComponent, nameInWords } from '#shared/circuit/kind-lookup.ts';
import { openPorts } from '#shared/circuit/open-ports.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Problem } from '#shared/simulation/result.ts';
import { CautionIcon } from '#src/components/icons.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { writeNote } from './actions.ts';
import { useDrawing } from './drawing-store.ts';
import { fitSheet } from './fit-sheet.ts';
import { MODULE } from './flow-model.ts';
import { keyOf } from './problem-slips.tsx';
import { applyCure, isMissing, useDrawingProblems } from './problems.ts';
import { labelPart } from './selection-tools.tsx';

/** The line above the sheet: undo and redo, what is on it, what is missing, the zoom. */
export function DrawBar({ room }: { readonly room: { readonly width: number; readonly height: number } }) {
  const undoable = useDocument((state) => state.past.length > 0);
  const redoable = useDocument((state) => state.future.length > 0);
  const flow = useReactFlow();
  const { x, y, zoom } = useViewport();
  const middle = () => ({ x: Math.round((room.width / 2 - x) / zoom / MODULE) - 12, y: Math.round((room.height / 3 - y) / zoom / MODULE) });
  return (
    <div className="draw-bar" role="toolbar" aria-label="Drawing">
      <button type="button" className="button" disabled={!undoable} onClick={() => useDocument.getState().undo()}>
        Undo
      </button>
      <button type="button" className="button" disabled={!redoable} onClick={() => useDocument.getState().redo()}>
        Redo
      </button>
      <Counts />
      <PartButtons />
      <button type="button" className="button" onClick={() => writeNote(middle())}>
        Note
      </button>
      <span className="sheet-zoom">
        <button type="button" className="button button-square" aria-label="Zoom out" onClick={() => void flow.zoomOut()}>
          −
        </button>
        <span className="sheet-zoom-figure reading">{Math.round(zoom * 100)} %</span>
        <button type="button" className="button button-square" aria-label="Zoom in" onClick={() => void flow.zoomIn()}>
          +
        </button>
        <button type="button" className="button" onClick={() => fitSheet(flow, room)}>
          Fit
        </button>
      </span>
    </div>
  );
}

/** What one selected part or line also has: its nameplate, and a label for a part. */
function PartButtons() {
  const document = useDocument((state) => state.document);
  const selection = useDocument((state) => state.selection);
  const id = selection.length === 1 ? (selection[0] as string) : null;
  if (!id) return null;
  const part = findComponent(document, id);
  const line = document.lines.find((entry) => entry.id === id);
  if (!line && (!part || part.kind === 'junction')) return null;
  return (
    <>
      <button type="button" className="button" onClick={() => openNameplate(id)}>
        {line ? 'Line data' : 'Nameplate'}
      </button>
      {part && (
        <button type="button" className="button" onClick={() => labelPart(id)}>
          Label
        </button>
      )}
    </>
  );
}

function Counts() {
  const document = useDocument((state) => state.document);
  const said = useDrawing((state) => state.said);
  const problems = useDrawingProblems();
  const [listed, setListed] = useState(false);
  const missing = problems.filter(isMissing);
  const words = useMemo(() => restInWords(document, problems), [document, problems]);
  const parts = document.components.filter((component) => component.kind !== 'junction').length;
  return (
    <div className="draw-counts">
      <strong>
        {countInWords(parts, 'part')}, {countInWords(document.lines.length, 'line')}
      </strong>
      {problems.length > 0 && (
        <button
          type="button"
          className={missing.length > 0 ? 'missing-chip' : 'link'}
          aria-expanded={listed}
          onClick={() => setListed(!listed)}
        >
          {missing.length > 0 ? (
            <>
              <CautionIcon size={16} /> {countInWords(missing.length, 'thing')} missing
            </>
          ) : (
            'Ready to run'
          )}
        </button>
      )}
      {problems.length === 0 && parts > 0 && <span>Ready to run</span>}
      <span className="draw-rest">{words}</span>
      <span className="draw-said" title={said}>
        {said}
      </span>
      {listed && problems.length > 0 && <ProblemList problems={problems} onClose={() => setListed(false)} />}
    </div>
  );
}

function ProblemList({ problems, onClose }: { readonly problems: readonly Problem[]; readonly onClose: () => void }) {
  const heading = { problem: 'Missing', assumption: 'Assumed', caution: 'Look at' } as const;
  const ordered = (['problem', 'caution', 'assumption'] as const).flatMap((severity) =>
    problems.filter((entry) => entry.severity === severity),
  );
  return (
    <section className="problem-list" aria-label="What is missing or assumed">
      <ul>
        {ordered.map((problem) => (
          <li key={keyOf(problem)}>
            <span className="problem-severity">{heading[problem.severity]}</span>
            <span>{problem.message}</span>
            {problem.cure && (
              <button
                type="button"
                className="link"
                onClick={() => {
                  applyCure(problem);
                  onClose();
                }}
              >
                {problem.cure.label}
              </button>
            )}
          </li>
        ))}
      </ul>
      <button type="button" className="button button-small" onClick={onClose}>
        Close
      </button>
    </section>
  );
}

/** '1 assumed, 2 ports still open on A1' */
export function restInWords(document: CircuitDocument, problems: readonly Problem[]): string {
  const assumed = problems.filter((problem) => problem.severity === 'assumption').length;
  const told = new Set(problems.flatMap((problem) => (problem.port ? [`${problem.component}.${problem.port}`] : [])));
  const open = openPorts(document).filter((port) => !port.optional && !told.has(`${port.component}.${port.port}`));
  const owners = [...new Set(open.map((port) => port.component))];
  const owner = owners.length === 1 ? findComponent(document, owners[0] as string) : undefined;
  const words: string[] = [];
  if (assumed > 0) words.push(`${assumed} assumed`);
  if (open.length > 0) words.push(`${countInWords(open.length, 'port')} still open${owner?.name ? ` on ${nameInWords(owner)}` : ''}`);
  return words.join(', ');
}
