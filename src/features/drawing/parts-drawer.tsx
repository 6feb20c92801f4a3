import { type PointerEvent, useRef, useState } from 'react';
import { useReactFlow, useViewport } from 'reactflow';
import { stages, stageWords } from '#shared/circuit/flow-order.ts';
import { symbolSize } from '#shared/circuit/kind-lookup.ts';
import type { ComponentKind } from '#shared/kinds/kind.ts';
import { kinds } from '#shared/kinds/registry.ts';
import { SymbolIcon } from '#src/components/schematic/symbol-icon.tsx';
import { placePart } from './actions.ts';
import { say, useDrawing } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';

const DRAG = 6;
const stageNotes: Partial<Record<(typeof stages)[number], string>> = {
  drive: 'drag out, or press and place',
  protect: 'a pump line must reach a relief',
};

/** All kinds of parts in flow order, in the place where the bench has its tape. */
export function PartsDrawer({ room }: { readonly room: { readonly width: number; readonly height: number } }) {
  const drag = useRef<{ kind: string; x: number; y: number; out: boolean } | null>(null);
  const [held, setHeld] = useState<{ kind: string; x: number; y: number } | null>(null);
  const placing = useDrawing((state) => state.placing);
  const flow = useReactFlow();
  const view = useViewport();
  const columns = stages
    .map((stage) => ({ stage, parts: kinds.filter((kind) => kind.stage === stage) }))
    .filter((column) => column.parts.length > 0);

  function take(kind: string, byKey: boolean) {
    if (drag.current?.out) return;
    if (byKey) {
      const { width, height } = symbolSize(kind);
      const at = {
        x: (room.width / 2 - view.x) / view.zoom / MODULE - width / 2,
        y: (room.height / 2 - view.y) / view.zoom / MODULE - height / 2,
      };
      return placePart(kind, { x: Math.round(at.x), y: Math.round(at.y) }, false);
    }
    const again = placing === kind;
    useDrawing.getState().set({ placing: again ? null : kind, strip: null, preview: null });
    say(again ? '' : 'Press on the sheet where it shall stand. Escape puts it back.');
  }

  function handleMove(event: PointerEvent) {
    const start = drag.current;
    if (!start) return;
    if (!start.out && Math.hypot(event.clientX - start.x, event.clientY - start.y) < DRAG) return;
    start.out = true;
    setHeld({ kind: start.kind, x: event.clientX, y: event.clientY });
  }

  function handleUp(event: PointerEvent) {
    const start = drag.current;
    setHeld(null);
    if (!start?.out) return;
    // The press that ends a drag also clicks the button: forget it only after that.
    setTimeout(() => {
      drag.current = null;
    });
    const over = document.elementFromPoint(event.clientX, event.clientY);
    if (!over?.closest('.draw-sheet')) return;
    const { width, height } = symbolSize(start.kind);
    const at = flow.screenToFlowPosition({ x: event.clientX, y: event.clientY });
    placePart(start.kind, { x: Math.round(at.x / MODULE - width / 2), y: Math.round(at.y / MODULE - height / 2) }, true);
  }

  return (
    <section className="drawer" aria-label="Parts">
      {columns.map(({ stage, parts }) => (
        <div key={stage} className="drawer-stage" style={{ flexGrow: parts.length }}>
          <h3>{stageWords[stage]}</h3>
          <div className="drawer-parts">
            {parts.map((kind) => (
              <DrawerPart
                key={kind.id}
                kind={kind}
                pressed={placing === kind.id}
                onTake={(byKey) => take(kind.id, byKey)}
                onPointerDown={(event) => {
                  if (event.button !== 0) return;
                  if ('setPointerCapture' in event.currentTarget) event.currentTarget.setPointerCapture(event.pointerId);
                  drag.current = { kind: kind.id, x: event.clientX, y: event.clientY, out: false };
                }}
                onPointerMove={handleMove}
                onPointerUp={handleUp}
                onPointerCancel={() => {
                  drag.current = null;
                  setHeld(null);
                }}
              />
            ))}
          </div>
          {stageNotes[stage] && <p className="drawer-note">{stageNotes[stage]}</p>}
        </div>
      ))}
      {held && <HeldPart kind={held.kind} x={held.x} y={held.y} zoom={view.zoom} />}
    </section>
  );
}

interface DrawerPartProps {
  readonly kind: ComponentKind;
  readonly pressed: boolean;
  readonly onTake: (byKey: boolean) => void;
  readonly onPointerDown: (event: PointerEvent<HTMLButtonElement>) => void;
  readonly onPointerMove: (event: PointerEvent) => void;
  readonly onPointerUp: (event: PointerEvent) => void;
  readonly onPointerCancel: () => void;
}

function DrawerPart({ kind, pressed, onTake, ...pointer }: DrawerPartProps) {
  return (
    <button
      type="button"
      className="drawer-part"
      aria-label={`Place ${kind.title}`}
      aria-pressed={pressed}
      title={kind.title}
      onClick={(event) => onTake(event.detail === 0)}
      {...pointer}
    >
      <span className="drawer-picture">
        <SymbolIcon kind={kind.id} width={66} height={48} />
      </span>
      <span>{kind.word}</span>
    </button>
  );
}

/** The part in hand, at the size it will have on the sheet. */
function HeldPart({ kind, x, y, zoom }: { kind: string; x: number; y: number; zoom: number }) {
  const size = symbolSize(kind);
  const width = size.width * MODULE * zoom;
  const height = size.height * MODULE * zoom;
  return (
    <span className="held-part" style={{ left: x - width / 2, top: y - height / 2 }}>
      <SymbolIcon kind={kind} width={width} height={height} />
    </span>
  );
}
