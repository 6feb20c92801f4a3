import { type MouseEvent as ReactMouseEvent, useCallback, useMemo, useRef } from 'react';
import ReactFlow, {
  Background,
  BackgroundVariant,
  type Connection,
  ConnectionMode,
  type EdgeChange,
  type NodeChange,
  type OnConnectEnd,
  type OnConnectStart,
  useReactFlow,
} from 'reactflow';
import { joinProblem } from '#shared/circuit/edit/joins.ts';
import { symbolSize } from '#shared/circuit/kind-lookup.ts';
import type { PortRef } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { joinPorts, joinToLine, placePart } from './actions.ts';
import { closeStrip, openStrip, say, useDrawing } from './drawing-store.ts';
import { edgesOf, MODULE, nodeMaker } from './flow-model.ts';
import { GhostLayer } from './ghost-layer.tsx';
import { JoiningLine } from './joining-line.tsx';
import { LineEdge, ShaftEdge } from './line-edges.tsx';
import { nearestOnLine } from './line-point.ts';
import { LabelNode, NoteNode } from './paper-nodes.tsx';
import { PartNode } from './part-node.tsx';
import { applyMoves, applySelection } from './sheet-changes.ts';
import { useSheetRoutes } from './sheet-routes.ts';

const nodeTypes = { part: PartNode, note: NoteNode, label: LabelNode };
const edgeTypes = { line: LineEdge, shaft: ShaftEdge };
const snapGrid: [number, number] = [MODULE, MODULE];
const proOptions = { hideAttribution: true };
/** A press that moves less than this [px] is a press, not a drag. */
const PRESS = 6;

/** The sheet: parts, lines, notes and labels, moved and joined by hand. */
export function Sheet() {
  const document = useDocument((state) => state.document);
  const selection = useDocument((state) => state.selection);
  const placing = useDrawing((state) => state.placing);
  const dragging = useDocument((state) => state.gesture !== null);
  const routes = useSheetRoutes(document, dragging);
  const maker = useRef(nodeMaker());
  const nodes = useMemo(() => maker.current(document, selection), [document, selection]);
  const edges = useMemo(() => edgesOf(document, routes, selection), [document, routes, selection]);
  const flow = useReactFlow();
  const joining = useRef<{ ref: PortRef; x: number; y: number; done: boolean } | null>(null);

  const onNodesChange = useCallback((changes: NodeChange[]) => {
    applySelection(changes);
    applyMoves(changes);
  }, []);
  const onEdgesChange = useCallback((changes: EdgeChange[]) => applySelection(changes), []);

  const onConnectStart = useCallback<OnConnectStart>((event, params) => {
    if (!params.nodeId || !params.handleId) return;
    const ref = { component: params.nodeId, port: params.handleId };
    joining.current = { ref, ...pointOf(event as unknown as MouseEvent | TouchEvent), done: false };
    useDrawing.getState().set({ joinFrom: ref });
  }, []);
  const onConnect = useCallback((connection: Connection) => {
    const ends = endsOf(connection);
    if (!ends) return;
    if (joining.current) joining.current.done = true;
    joinPorts(...ends);
  }, []);
  const onConnectEnd = useCallback<OnConnectEnd>(
    (event) => {
      const from = joining.current;
      joining.current = null;
      useDrawing.getState().set({ joinFrom: null });
      const to = pointOf(event);
      if (!from || from.done || Math.hypot(to.x - from.x, to.y - from.y) < PRESS) return;
      dropLine(from.ref, to, (point) => flow.screenToFlowPosition(point));
    },
    [flow],
  );

  function handlePane(event: ReactMouseEvent) {
    if (!placing) {
      closeStrip(false);
      useDrawing.getState().set({ deletion: null });
      return;
    }
    const { width, height } = symbolSize(placing);
    const at = flow.screenToFlowPosition({ x: event.clientX, y: event.clientY });
    placePart(placing, { x: Math.round(at.x / MODULE - width / 2), y: Math.round(at.y / MODULE - height / 2) }, true);
  }

  return (
    <ReactFlow
      className={placing ? 'sheet-flow sheet-placing' : 'sheet-flow'}
      nodes={nodes}
      edges={edges}
      nodeTypes={nodeTypes}
      edgeTypes={edgeTypes}
      onNodesChange={onNodesChange}
      onEdgesChange={onEdgesChange}
      onNodeDragStart={() => useDocument.getState().beginGesture()}
      onNodeDragStop={() => useDocument.getState().endGesture()}
      onSelectionDragStart={() => useDocument.getState().beginGesture()}
      onSelectionDragStop={() => useDocument.getState().endGesture()}
      onEdgeDoubleClick={(_, edge) => edge.type === 'line' && openNameplate(edge.id)}
      onConnectStart={onConnectStart}
      onConnect={onConnect}
      onConnectEnd={onConnectEnd}
      isValidConnection={isAlike}
      connectionMode={ConnectionMode.Loose}
      connectionLineComponent={JoiningLine}
      connectionRadius={18}
      connectOnClick={false}
      onPaneClick={handlePane}
      snapToGrid
      snapGrid={snapGrid}
      minZoom={0.25}
      maxZoom={2.5}
      nodesFocusable={false}
      edgesFocusable={false}
      disableKeyboardA11y
      deleteKeyCode={null}
      selectionKeyCode="Shift"
      multiSelectionKeyCode={['Control', 'Meta', 'Shift']}
      selectNodesOnDrag={false}
      zoomOnDoubleClick={false}
      nodeDragThreshold={2}
      proOptions={proOptions}
    >
      <Background variant={BackgroundVariant.Dots} gap={5 * MODULE} size={3} color="var(--rule)" />
      <GhostLayer />
    </ReactFlow>
  );
}

function isAlike(connection: Connection): boolean {
  const ends = endsOf(connection);
  return ends !== null && joinProblem(useDocument.getState().document, ...ends) === null;
}

function endsOf(connection: Connection): [PortRef, PortRef] | null {
  const { source, sourceHandle, target, targetHandle } = connection;
  if (!source || !sourceHandle || !target || !targetHandle) return null;
  return [
    { component: source, port: sourceHandle },
    { component: target, port: targetHandle },
  ];
}

function pointOf(event: MouseEvent | TouchEvent): { x: number; y: number } {
  const point = 'changedTouches' in event ? event.changedTouches[0] : event;
  return { x: point?.clientX ?? 0, y: point?.clientY ?? 0 };
}

/** A line's end let go somewhere: on a line it branches, on an unlike port it says why not, on the bare sheet the strip opens. */
function dropLine(from: PortRef, at: { x: number; y: number }, toFlow: (point: { x: number; y: number }) => { x: number; y: number }) {
  const page = globalThis.document;
  const under = page.elementsFromPoint(at.x, at.y);
  const ring = under.map((element) => element.closest<HTMLElement>('[data-ring]')).find(Boolean);
  if (ring) {
    const [component = '', port = ''] = (ring.dataset.ring ?? '').split('.');
    const problem = joinProblem(useDocument.getState().document, from, { component, port });
    if (problem) say(problem);
    return;
  }
  const held = under.map((element) => element.closest<SVGElement>('[data-flow-line]')).find(Boolean);
  const lineId = held?.dataset.flowLine;
  const line = useDocument.getState().document.lines.find((entry) => entry.id === lineId);
  const path = held?.dataset.points;
  if (line && path) {
    const place = toFlow(at);
    const points = path.split(' ').map((pair) => {
      const [x = 0, y = 0] = pair.split(',').map(Number);
      return { x, y };
    });
    const point = nearestOnLine(line, points, { x: place.x / MODULE, y: place.y / MODULE });
    if (point) return joinToLine(from, line.id, point);
  }
  openStrip(from);
}
