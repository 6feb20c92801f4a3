import type { EdgeChange, NodeChange } from 'reactflow';
import { moveParts } from '#shared/circuit/edit/components.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { MODULE } from './flow-model.ts';

/** What the canvas reports, written into the stores. */

export function applySelection(changes: readonly (NodeChange | EdgeChange)[]): void {
  const { selection, select } = useDocument.getState();
  let next = selection;
  for (const change of changes) {
    if (change.type !== 'select') continue;
    if (change.selected && !next.includes(change.id)) next = [...next, change.id];
    if (!change.selected && next.includes(change.id)) next = next.filter((id) => id !== change.id);
  }
  if (next !== selection) select(next);
}

/** Things dragged together move by one step: the one the canvas reports first. */
export function applyMoves(changes: readonly NodeChange[]): void {
  const moved = changes.flatMap((change) =>
    change.type === 'position' && change.position ? [{ id: change.id, to: change.position }] : [],
  );
  const first = moved[0];
  if (!first) return;
  useDocument.getState().edit((document) => {
    const at = placeOf(document, first.id);
    if (!at) return document;
    const by = { x: Math.round(first.to.x / MODULE - at.x), y: Math.round(first.to.y / MODULE - at.y) };
    return moveParts(
      document,
      moved.map((entry) => entry.id),
      by,
    );
  });
}

function placeOf(document: CircuitDocument, id: string) {
  return [...document.components, ...document.notes, ...document.labels].find((entry) => entry.id === id)?.at;
}
