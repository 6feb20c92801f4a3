import { useViewport } from 'reactflow';
import { portPlace } from '#shared/circuit/edit/place-parts.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Problem } from '#shared/simulation/result.ts';
import { CautionIcon } from '#src/components/icons.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { useDrawing } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';
import { applyCure, isMissing, useDrawingProblems } from './problems.ts';
import { boundsOf } from './selection-tools.tsx';

const MOST_SLIPS = 3;
const MOST_NOTES = 6;

/** What is missing or assumed, said at its place: slips with their cure, and small words at ports. */
export function ProblemSlips({ width, height }: { readonly width: number; readonly height: number }) {
  const document = useDocument((state) => state.document);
  const busy = useDrawing((state) => state.strip !== null || state.joinFrom !== null || state.deletion !== null);
  const problems = useDrawingProblems();
  const { x, y, zoom } = useViewport();
  if (busy) return null;
  const placed = problems.flatMap((problem) => {
    const at = placeOf(document, problem);
    return at ? [{ problem, left: x + at.x * MODULE * zoom, top: y + at.y * MODULE * zoom }] : [];
  });
  const slips = placed
    .filter((entry) => isMissing(entry.problem))
    .slice(0, MOST_SLIPS)
    .map((entry) => ({ ...entry, left: besideOf(document, entry.problem, entry.left, (module) => x + module * MODULE * zoom) }))
    .map((entry) => ({
      ...entry,
      left: Math.max(8, Math.min(width - 340, entry.left)),
      top: Math.max(8, Math.min(height - 80, entry.top)),
    }));
  const notes = placed.filter((entry) => entry.problem.severity === 'assumption' && entry.problem.port).slice(0, MOST_NOTES);
  return (
    <>
      {notes.map(({ problem, left, top }, index) => (
        <span key={keyOf(problem)} className="assumed" style={{ left: left + 6, top: top + 8 + 17 * clash(notes, index, 150, 17) }}>
          {shortWords(problem)}
        </span>
      ))}
      {slips.map(({ problem, left, top }, index) => (
        <div key={keyOf(problem)} className="problem-slip" style={{ left, top: top + 12 + clash(slips, index, 300, 60) * 60 }}>
          <CautionIcon />
          <div>
            <strong>{problem.message}</strong>
            {problem.cure && (
              <button type="button" className="link" onClick={() => applyCure(problem)}>
                {problem.cure.label}
              </button>
            )}
          </div>
        </div>
      ))}
    </>
  );
}

export function keyOf(problem: Problem): string {
  return [problem.code, problem.component, problem.port, problem.line, problem.path, problem.message].join(' ');
}

/** A slip stands beside its part, not over it. */
function besideOf(document: CircuitDocument, problem: Problem, left: number, toScreen: (module: number) => number): number {
  const box = problem.component ? boundsOf(document, [problem.component]) : null;
  return box ? Math.max(left, toScreen(box.x + box.w)) + 14 : left + 24;
}

/** How many slips before this one stand at nearly the same place. */
function clash(slips: readonly { left: number; top: number }[], index: number, width: number, height: number): number {
  const own = slips[index];
  if (!own) return 0;
  return slips.slice(0, index).filter((other) => Math.abs(other.left - own.left) < width && Math.abs(other.top - own.top) < height).length;
}

/** On the drawing an assumption is only a word or two: the whole stands in the line above. */
function shortWords(problem: Problem): string {
  return problem.code === 'open-to-tank' ? 'open: assumed to tank' : problem.message;
}

/** The port, the part or the middle of the line that a problem is about; null when it is about the whole circuit. */
function placeOf(document: CircuitDocument, problem: Problem): { x: number; y: number } | null {
  if (problem.component && problem.port) {
    const place = portPlace(document, { component: problem.component, port: problem.port });
    if (place) return place;
  }
  if (problem.component) {
    const box = boundsOf(document, [problem.component]);
    if (box) return { x: box.x + box.w / 2, y: box.y + box.h };
  }
  const line = document.lines.find((entry) => entry.id === problem.line);
  return line ? (portPlace(document, line.from) ?? portPlace(document, line.to) ?? null) : null;
}
