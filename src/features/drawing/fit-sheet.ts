import type { ReactFlowInstance } from 'reactflow';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { schematicBounds } from '#shared/pictures/schematic-shapes.ts';
import { symbolValues } from '#shared/pictures/symbol-values.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { MODULE } from './flow-model.ts';
import { drawnRoutes } from './sheet-routes.ts';

const MARGIN = 3;
const LEAST = 0.25;
const MOST = 1.2;
/** Notes have no size of their own in the document; the room a slip takes [modules]. */
const SLIP = { w: 25, h: 8 };

/** Everything on the sheet with its loads and lines, in modules; null for an empty one. */
export function sheetBounds(document: CircuitDocument, caseId: string) {
  const drawn = schematicBounds(document, (component) => symbolValues(document, caseId, component), drawnRoutes());
  const slips = [...document.notes, ...document.labels].map((slip) => ({ x: slip.at.x, y: slip.at.y, ...SLIP }));
  const boxes = drawn ? [drawn, ...slips] : slips;
  if (boxes.length === 0) return null;
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  return { x, y, w: Math.max(...boxes.map((box) => box.x + box.w)) - x, h: Math.max(...boxes.map((box) => box.y + box.h)) - y };
}

/** Brings the whole circuit into view; an empty sheet starts with its origin at the top-left at full size. */
export function fitSheet(flow: ReactFlowInstance, room: { readonly width: number; readonly height: number }) {
  const { document, activeCase } = useDocument.getState();
  const box = sheetBounds(document, activeCase);
  if (!box || room.width === 0) return flow.setViewport({ x: room.width / 2 - 280, y: room.height / 2 - 220, zoom: 1 });
  const width = (box.w + 2 * MARGIN) * MODULE;
  const height = (box.h + 2 * MARGIN) * MODULE;
  const zoom = Math.max(LEAST, Math.min(MOST, room.width / width, room.height / height));
  const x = room.width / 2 - (box.x + box.w / 2) * MODULE * zoom;
  const y = room.height / 2 - (box.y + box.h / 2) * MODULE * zoom;
  return flow.setViewport({ x, y, zoom });
}

/** Fits only when something of the circuit has left the view. */
export function keepInView(flow: ReactFlowInstance, room: { readonly width: number; readonly height: number }) {
  const { document, activeCase } = useDocument.getState();
  const box = sheetBounds(document, activeCase);
  if (!box || room.width === 0) return;
  const { x, y, zoom } = flow.getViewport();
  const left = x + box.x * MODULE * zoom;
  const top = y + box.y * MODULE * zoom;
  const inside = left >= 0 && top >= 0 && left + box.w * MODULE * zoom <= room.width && top + box.h * MODULE * zoom <= room.height;
  if (!inside) fitSheet(flow, room);
}
