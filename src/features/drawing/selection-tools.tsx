import { useViewport } from 'reactflow';
import { addLabel } from '#shared/circuit/edit/sheet.ts';
import { findComponent, findKind } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { placedBox } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import { useLayout } from '#src/lib/layout.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { deleteChosen, deleteNow, duplicateChosen, mirrorChosen, turnChosen } from './actions.ts';
import { say, useDrawing } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';
import { ToolIcon, type ToolIconName } from './tool-icon.tsx';

const FRAME = 6;

/** The dashed frame round what is selected, with its four buttons, and the question before a deletion that takes more along. */
export function SelectionTools({ width, height }: { readonly width: number; readonly height: number }) {
  const document = useDocument((state) => state.document);
  const selection = useDocument((state) => state.selection);
  const dragging = useDocument((state) => state.gesture !== null);
  const strip = useDrawing((state) => state.strip);
  const deletion = useDrawing((state) => state.deletion);
  const { x, y, zoom } = useViewport();
  const phone = useLayout() === 'phone';
  const box = boundsOf(document, selection);
  const lineOnly = selection.length > 0 && !box;
  if (selection.length === 0 || strip)
    return deletion ? <Deletion width={width} height={height} left={width / 2 - 160} top={height - 190} /> : null;
  const frame = box && {
    left: x + box.x * MODULE * zoom - FRAME,
    top: y + box.y * MODULE * zoom - FRAME,
    width: box.w * MODULE * zoom + 2 * FRAME,
    height: box.h * MODULE * zoom + 2 * FRAME,
  };
  const right = frame ? frame.left + frame.width + 8 : width - 240;
  const left = frame && right + 120 > width ? Math.max(8, frame.left - 124) : right;
  const top = frame ? Math.max(8, Math.min(height - 130, frame.top)) : 12;
  const tools: readonly [ToolIconName, (ids: readonly string[]) => void][] = [
    ['turn', turnChosen],
    ['mirror', mirrorChosen],
    ['duplicate', duplicateChosen],
    ['delete', deleteChosen],
  ];
  const shown = lineOnly ? tools.slice(3) : tools;
  return (
    <>
      {frame && <div className="selection-frame" style={frame} aria-hidden="true" />}
      {!dragging && !deletion && (
        <div className="tools" role="toolbar" aria-label="Selected" style={phone ? undefined : { left, top }}>
          {shown.map(([name, act]) => (
            <button key={name} type="button" className="tool" onClick={() => act(selection)}>
              <ToolIcon name={name} />
              <span>{name}</span>
            </button>
          ))}
        </div>
      )}
      {deletion && <Deletion width={width} height={height} left={left} top={top} />}
    </>
  );
}

function Deletion({ width, height, left, top }: { width: number; height: number; left: number; top: number }) {
  const deletion = useDrawing((state) => state.deletion);
  const set = useDrawing((state) => state.set);
  if (!deletion) return null;
  const keep = () => {
    set({ deletion: null });
    say('Nothing was deleted');
  };
  return (
    <div
      role="alertdialog"
      aria-label={`Delete ${deletion.what}`}
      className="deletion"
      style={{ left: Math.max(8, Math.min(width - 336, left)), top: Math.max(8, Math.min(height - 200, top)) }}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape') keep();
      }}
    >
      <strong>Delete {deletion.what}?</strong>
      <p>With it go:</p>
      <ul>
        {deletion.along.map((words) => (
          <li key={words}>{words}</li>
        ))}
      </ul>
      <div className="deletion-foot">
        {/* biome-ignore lint/a11y/noAutofocus: the question is asked where the hand is */}
        <button type="button" className="button-primary" autoFocus onClick={() => deleteNow(deletion.ids)}>
          Delete
        </button>
        <button type="button" className="button" onClick={keep}>
          Keep
        </button>
      </div>
    </div>
  );
}

/** Box round the selected parts; null when only lines or slips are selected. */
export function boundsOf(document: CircuitDocument, ids: readonly string[]) {
  const boxes = ids.flatMap((id) => {
    const component = findComponent(document, id);
    const symbol = component && symbolOf(component.kind);
    return component && symbol ? [placedBox(symbol, component)] : [];
  });
  if (boxes.length === 0) return null;
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  return { x, y, w: Math.max(...boxes.map((box) => box.x + box.w)) - x, h: Math.max(...boxes.map((box) => box.y + box.h)) - y };
}

/** Ties a plate with a shelf name under a part and opens it for writing. */
export function labelPart(id: string) {
  const { document, edit } = useDocument.getState();
  const box = boundsOf(document, [id]);
  const component = findComponent(document, id);
  if (!box || !component) return;
  const added = addLabel(document, id, { x: box.x, y: box.y + box.h + 1 }, findKind(component.kind)?.title ?? '');
  if (!added.labelId) return say('A sheet holds at most 100 part labels.');
  edit(() => added.document);
  useDrawing.getState().set({ writing: added.labelId });
}
