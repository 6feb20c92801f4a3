import type { Edge, Node } from 'reactflow';
import { flowOrder } from '#shared/circuit/flow-order.ts';
import { countInWords } from '#shared/circuit/in-words.ts';
import { findKind, portInWords } from '#shared/circuit/kind-lookup.ts';
import { openPorts } from '#shared/circuit/open-ports.ts';
import type { CircuitDocument, Component, Line, Note, PartLabel } from '#shared/circuit/schema.ts';
import { endOf } from '#shared/pictures/line-ends.ts';
import type { RoutedLine } from '#shared/pictures/route.ts';
import { joinedPorts } from '#shared/pictures/schematic-shapes.ts';
import { shaftPath, shaftShapes } from '#shared/pictures/shaft-shapes.ts';
import type { Shape } from '#shared/pictures/shape.ts';
import { placedSize } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';

/** The document as nodes and edges of the canvas. One module is ten units; nodes stand in flow order, which is the order in
 *  which Tab meets them. */
export const MODULE = 10;

const nothing: ReadonlySet<string> = new Set();

export interface PartData {
  readonly component: Component;
  /** Open ports and the next arm of a complete tee, and ports that have a line: kept as one object while nothing changes, so
   *  that only parts that changed are drawn anew. */
  readonly open: readonly string[];
  readonly optional: readonly string[];
  readonly joined: ReadonlySet<string>;
}
export interface NoteData {
  readonly note: Note;
}
export interface LabelData {
  readonly label: PartLabel;
}
export interface LineData {
  readonly line: Line;
  readonly route: RoutedLine;
  readonly words: string;
}
export interface ShaftData {
  readonly shapes: readonly Shape[];
}

/** Makes nodes from documents, keeping the data object of every part that did not change. */
export function nodeMaker(): (document: CircuitDocument, selection: readonly string[]) => Node[] {
  let kept = new Map<string, { key: string; data: PartData }>();
  return (document, selection) => {
    const chosen = new Set(selection);
    const byId = new Map(document.components.map((component) => [component.id, component]));
    const ports = openPorts(document);
    const joined = joinedPorts(document);
    const next = new Map<string, { key: string; data: PartData }>();
    const parts = flowOrder(document).flatMap((id): Node<PartData>[] => {
      const component = byId.get(id);
      const symbol = component && symbolOf(component.kind);
      if (!component || !symbol) return [];
      const own = ports.filter((port) => port.component === id);
      const open = own.filter((port) => !port.optional).map((port) => port.port);
      const optional = own.filter((port) => port.optional).map((port) => port.port);
      const lines = joined.get(id) ?? nothing;
      const key = `${open.join()} ${optional.join()} ${[...lines].sort().join()}`;
      const before = kept.get(id);
      const data = before?.key === key && before.data.component === component ? before.data : { component, open, optional, joined: lines };
      next.set(id, { key, data });
      const { width, height } = placedSize(symbol, component.turn);
      return [{ ...nodeAt(component.at, id, 'part', chosen), width: width * MODULE, height: height * MODULE, data }];
    });
    kept = next;
    const notes = document.notes.map((note): Node<NoteData> => ({ ...nodeAt(note.at, note.id, 'note', chosen), data: { note } }));
    const labels = document.labels.map((label): Node<LabelData> => ({ ...nodeAt(label.at, label.id, 'label', chosen), data: { label } }));
    return [...parts, ...notes, ...labels];
  };
}

function nodeAt(at: { x: number; y: number }, id: string, type: string, chosen: ReadonlySet<string>) {
  return { id, type, position: { x: at.x * MODULE, y: at.y * MODULE }, selected: chosen.has(id) };
}

export function edgesOf(document: CircuitDocument, routes: ReadonlyMap<string, RoutedLine>, selection: readonly string[]): Edge[] {
  const chosen = new Set(selection);
  const lines = document.lines.flatMap((line): Edge<LineData>[] => {
    const route = routes.get(line.id);
    if (!route) return [];
    return [
      {
        id: line.id,
        type: 'line',
        source: line.from.component,
        sourceHandle: line.from.port,
        target: line.to.component,
        targetHandle: line.to.port,
        selected: chosen.has(line.id),
        data: { line, route, words: `Line from ${portInWords(document, line.from)} to ${portInWords(document, line.to)}` },
      },
    ];
  });
  return [...shaftEdges(document), ...lines];
}

function shaftEdges(document: CircuitDocument): Edge<ShaftData>[] {
  const byId = new Map(document.components.map((component) => [component.id, component]));
  return document.shafts.flatMap((shaft) =>
    shaft.members.slice(1).flatMap((member, index): Edge<ShaftData>[] => {
      const before = shaft.members[index];
      const from = before && endOf(byId.get(before.component), before.port);
      const to = endOf(byId.get(member.component), member.port);
      if (!before || !from || !to) return [];
      return [
        {
          id: `${shaft.id} ${index}`,
          type: 'shaft',
          source: before.component,
          sourceHandle: before.port,
          target: member.component,
          targetHandle: member.port,
          data: { shapes: shaftShapes(shaftPath(from, to)) },
        },
      ];
    }),
  );
}

/** Words for a part: 'relief V2', turned or mirrored where it is, and how many of its ports are open. */
export function partInWords(component: Component, open: number): string {
  const word = findKind(component.kind)?.word ?? component.kind;
  const stands = [component.turn === 0 ? '' : `turned ${component.turn * 90} degrees`, component.mirror ? 'mirrored' : ''];
  const ports = open === 0 ? '' : countInWords(open, 'open port');
  return [component.name ? `${word} ${component.name}` : word, ...stands, ports].filter(Boolean).join(', ');
}
