import { useMemo } from 'react';
import { EdgeLabelRenderer, useViewport } from 'reactflow';
import { growFrom } from '#shared/circuit/edit/grow.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { endOf } from '#shared/pictures/line-ends.ts';
import { joinedPorts } from '#shared/pictures/schematic-shapes.ts';
import { shaftPath, shaftShapes } from '#shared/pictures/shaft-shapes.ts';
import { symbolValues } from '#shared/pictures/symbol-values.ts';
import { placedSize } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import { LineView } from '#src/components/schematic/line-view.tsx';
import { ShapeView } from '#src/components/schematic/shape-view.tsx';
import { SymbolView } from '#src/components/schematic/symbol-view.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { wordOf } from './actions.ts';
import { branchPoint } from './branch-point.ts';
import { useDrawing } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';
import { cureGhosts, useDrawingProblems } from './problems.ts';
import { routesAfter } from './sheet-routes.ts';

const none: ReadonlySet<string> = new Set();

/** What is not there yet, drawn pale at its place: the part that the strip highlights, and what would cure a problem. */
export function GhostLayer() {
  const document = useDocument((state) => state.document);
  const strip = useDrawing((state) => state.strip);
  const preview = useDrawing((state) => state.preview);
  const problems = useDrawingProblems();
  const grown = useMemo(
    () => (strip && preview ? growFrom(document, strip.ref, preview, branchPoint(document, strip.ref)) : null),
    [document, strip, preview],
  );
  const cures = useMemo(() => (strip ? [] : cureGhosts(document, problems)), [document, strip, problems]);
  return (
    <EdgeLabelRenderer>
      {grown?.componentId && (
        <Ghost before={document} after={grown.document} words={`${wordOf(preview ?? '')}, if you let go here`} focus={grown.componentId} />
      )}
      {cures.map((after, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: pale pictures have no identity of their own
        <Ghost key={index} before={document} after={after} dotted />
      ))}
    </EdgeLabelRenderer>
  );
}

interface GhostProps {
  readonly before: CircuitDocument;
  readonly after: CircuitDocument;
  readonly words?: string;
  readonly focus?: string;
  readonly dotted?: boolean;
}

function Ghost({ before, after, words, focus, dotted }: GhostProps) {
  const { parts, lines, shafts } = useMemo(() => added(before, after), [before, after]);
  const joined = useMemo(() => joinedPorts(after), [after]);
  const chosen = parts.find((part) => part.id === focus);
  const { zoom } = useViewport();
  const size = chosen && symbolOf(chosen.kind);
  const box = chosen && size && placedSize(size, chosen.turn);
  return (
    <>
      <svg className={dotted ? 'ghost ghost-cure' : 'ghost'} width={1} height={1} overflow="visible" aria-hidden="true">
        <g transform={`scale(${MODULE})`}>
          <ShapeView shapes={shafts} />
          {lines.map(({ line, route }) => (
            <LineView key={line.id} line={line} route={route} live={false} />
          ))}
          {parts.map((part) => (
            <g key={part.id} transform={`translate(${part.at.x} ${part.at.y})`}>
              <SymbolView component={part} values={symbolValues(after, 'a', part)} joined={joined.get(part.id) ?? none} live={false} />
            </g>
          ))}
        </g>
      </svg>
      {words && chosen && box && (
        <span
          className="ghost-words"
          style={{ left: chosen.at.x * MODULE, top: (chosen.at.y + box.height) * MODULE + 4, transform: `scale(${1 / zoom})` }}
        >
          {words}
        </span>
      )}
    </>
  );
}

/** What an edit would add: parts, routed lines and shafts. */
function added(before: CircuitDocument, after: CircuitDocument) {
  const had = new Set([...before.components, ...before.lines].map((entry) => entry.id));
  const parts = after.components.filter((part) => !had.has(part.id));
  const routes = routesAfter(after);
  const lines = after.lines.flatMap((line) => {
    const route = routes.get(line.id);
    return had.has(line.id) || !route ? [] : [{ line, route }];
  });
  const byId = new Map(after.components.map((component) => [component.id, component]));
  const shafts = after.shafts
    .filter((shaft) => !before.shafts.includes(shaft))
    .flatMap((shaft) =>
      shaft.members.slice(1).flatMap((member, index) => {
        const first = shaft.members[index];
        const from = first && endOf(byId.get(first.component), first.port);
        const to = endOf(byId.get(member.component), member.port);
        return from && to ? shaftShapes(shaftPath(from, to)) : [];
      }),
    );
  return { parts, lines, shafts };
}
