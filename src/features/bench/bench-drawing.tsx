import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import {
  Background,
  BackgroundVariant,
  type Node,
  type NodeChange,
  ReactFlow,
  ReactFlowProvider,
  useReactFlow,
  type Viewport,
} from 'reactflow';
import { setTagPlace } from '#shared/circuit/edit/sheet.ts';
import { narrowDemo } from '#shared/circuit/samples/demo-narrow.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { TagPlace } from '#shared/pictures/tag-slots.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useLayout, useTouch } from '#src/lib/layout.ts';
import { useSize } from '#src/lib/use-size.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { benchNodeTypes } from './bench-nodes.tsx';
import { FlowList, SpokenList } from './flow-list.tsx';
import { InkKey, KEY_HEIGHT, KEY_WIDTH, MomentLine, PLAIN_KEY_HEIGHT } from './ink-key.tsx';
import { LineReading } from './line-reading.tsx';
import { layDown, narrowContent, useFirstInHand } from './narrow-bench.ts';
import { steadyNodes } from './steady.ts';
import { TurnWheel, WHEEL_HEIGHT, WHEEL_WIDTH } from './turn-wheel.tsx';
import { type BenchLayout, chipWords, useBenchLayout } from './use-bench-layout.ts';
import { buttonRoom, LEAST_ZOOM, MOST_ZOOM, noRoom, ZoomButtons } from './zoom-buttons.tsx';
import './bench.css';

export interface BenchDrawingProps {
  /** Opens a nameplate: component or line id. Double click, long press or Enter. */
  readonly onOpen?: (id: string) => void;
}

/** The drawing of the bench: the circuit, live at the cursor, with its screw tags. Structure is changed on the Draw stage. */
export function BenchDrawing({ onOpen = openNameplate }: BenchDrawingProps) {
  return (
    <ReactFlowProvider>
      <Drawing onOpen={onOpen} />
    </ReactFlowProvider>
  );
}

function Drawing({ onOpen }: Required<BenchDrawingProps>) {
  const layout = useLayout();
  const touch = useTouch() || layout === 'phone';
  const phone = layout === 'phone';
  const whole = useDocument((state) => state.document);
  const narrow = useMemo(() => (phone ? narrowDemo(whole) : null), [phone, whole]);
  const document = narrow ?? whole;
  const activeCase = useDocument((state) => state.activeCase);
  const inHand = useDocument((state) => state.inHand);
  const [ref, size] = useSize<HTMLDivElement>();
  const [zoom, setZoom] = useState<number | null>(null);
  // The wheel's place is kept free all the time, so that nothing moves when a screw is taken in hand.
  const wheelBeside = !phone && (touch || layout !== 'desk');
  const bench = useBenchLayout(document, activeCase, {
    width: size.width,
    height: size.height,
    zoom,
    touch,
    inHand,
    key: phone ? null : { width: KEY_WIDTH + 26, height: (wheelBeside ? PLAIN_KEY_HEIGHT : KEY_HEIGHT) + 14 },
    wheel: wheelBeside ? { width: WHEEL_WIDTH + 18, height: WHEEL_HEIGHT + 6 } : null,
    buttons: phone ? noRoom : buttonRoom(touch),
    narrow: narrow && narrowContent,
  });
  useFirstInHand(narrow !== null);
  const wheelBelow = inHand !== null && (phone || (wheelBeside && bench.wheelPlace === null));

  const tag = bench.screws.find((entry) => entry.spec.address === inHand);
  const buttons = <ZoomButtons zoom={zoom} touch={touch} width={size.width} height={size.height} onZoom={setZoom} />;
  return (
    <div className="bench-drawing" data-layout={layout} data-narrow={narrow !== null || undefined} data-below={wheelBelow || undefined}>
      {phone && !narrow && (
        <div className="phone-strip">
          <LineReading />
          {buttons}
        </div>
      )}
      <div ref={ref} className="bench-flow">
        <Flow
          document={document}
          still={narrow !== null}
          bench={bench}
          width={size.width}
          height={size.height}
          zoom={zoom}
          touch={touch}
          besideWheel={wheelBeside}
          onZoom={setZoom}
          onOpen={onOpen}
        />
        {!phone && buttons}
        {!phone && (
          <div className="bench-panel" style={bench.keyPlace ?? undefined}>
            <InkKey plain={wheelBeside} />
          </div>
        )}
        {wheelBeside && bench.wheelPlace && (
          <div className="bench-panel bench-panel-wheel" style={bench.wheelPlace}>
            {tag ? <TurnWheel spec={tag.spec} state={tag.state} /> : <MomentLine />}
          </div>
        )}
        {document.components.length === 0 && (
          <p className="bench-empty">Nothing is drawn yet. The Draw stage begins with a pump and a motor.</p>
        )}
      </div>
      {tag && wheelBelow && <TurnWheel spec={tag.spec} state={tag.state} wide onParts={narrow ? layDown : undefined} />}
      {phone && !(narrow && wheelBelow) ? <FlowList tags={bench.screws} folded={wheelBelow} onOpen={onOpen} /> : <SpokenList />}
    </div>
  );
}

interface FlowProps {
  readonly document: CircuitDocument;
  /** The whole arrangement is always in sight: nothing is dragged and the page itself zooms. */
  readonly still: boolean;
  readonly bench: BenchLayout;
  readonly width: number;
  readonly height: number;
  readonly zoom: number | null;
  readonly touch: boolean;
  /** The turn wheel has the buttons of the tag in hand. */
  readonly besideWheel: boolean;
  readonly onZoom: (zoom: number | null) => void;
  readonly onOpen: (id: string) => void;
}

function Flow({ document, still, bench, width, height, zoom, touch, besideWheel, onZoom, onOpen }: FlowProps) {
  const activeCase = useDocument((state) => state.activeCase);
  const inHand = useDocument((state) => state.inHand);
  const format = useFormat();
  const flow = useReactFlow();
  const [moving, setMoving] = useState<{ id: string; x: number; y: number } | null>(null);
  const { fit, grow, routes, small, tags, readings, slips, ink } = bench;

  const fitted = zoom === null;
  useEffect(() => {
    if (!fitted || width === 0) return;
    flow.setViewport({ zoom: fit.zoom, x: -fit.left * 10 * fit.zoom, y: -fit.top * 10 * fit.zoom });
  }, [flow, fitted, fit.zoom, fit.left, fit.top, width]);

  const opened = useRef(onOpen);
  opened.current = onOpen;
  const open = useCallback((id: string) => opened.current(id), []);

  const pressedSheet = useRef(false);
  const formerPlaces = useRef<readonly TagPlace[]>([]);
  const samePlaces = (next: readonly TagPlace[]) => {
    const before = formerPlaces.current;
    if (before.length !== next.length || next.some((place, k) => place !== before[k])) formerPlaces.current = next;
    return formerPlaces.current;
  };
  const formerNodes = useRef<ReadonlyMap<string, Node>>(new Map());
  // biome-ignore lint/correctness/useExhaustiveDependencies: `samePlaces` keeps the former list through a reference
  const nodes = useMemo((): Node[] => {
    const fixed = { draggable: false, selectable: false, connectable: false, focusable: false };
    const at = (id: string, x: number, y: number) => (moving?.id === id ? { x: moving.x, y: moving.y } : { x: x * 10, y: y * 10 });
    const places = tags.map(({ place }): TagPlace => {
      if (moving?.id !== `tag ${place.address}`) return place;
      const box = { ...place.box, x: moving.x / 10, y: moving.y / 10 };
      const from = { x: place.string.from.x + box.x - place.box.x, y: place.string.from.y + box.y - place.box.y };
      return { ...place, box, string: { ...place.string, from } };
    });
    const next: Node[] = [
      {
        id: 'sheet',
        type: 'sheet',
        position: { x: 0, y: 0 },
        zIndex: 0,
        ...fixed,
        data: { document, caseId: activeCase, routes, textScale: small ? 0 : Math.max(1, grow), slips, grow, onOpen: open },
      },
      { id: 'strings', type: 'strings', position: { x: 0, y: 0 }, zIndex: 1, ...fixed, data: { places: samePlaces(places), grow, inHand } },
      ...readings.map(({ spec, box }) => ({
        id: `reading ${spec.id}`,
        type: 'reading',
        position: { x: box.x * 10, y: box.y * 10 },
        zIndex: 2,
        ...fixed,
        data: { spec, grow },
      })),
      ...tags.map(({ spec, state, place }) => ({
        id: `tag ${spec.address}`,
        type: 'tag',
        position: at(`tag ${spec.address}`, place.box.x, place.box.y),
        zIndex: inHand === spec.address ? 9 : 3,
        selectable: false,
        connectable: false,
        focusable: false,
        draggable: !still,
        data: {
          spec,
          state,
          form: place.form,
          eyelet: place.eyelet,
          ink,
          inHand: inHand === spec.address,
          touch: touch || besideWheel,
          toolsAbove: zoom === null && (place.box.y + place.box.h - fit.top) * 10 * fit.zoom + 36 > height,
          onOpen: open,
          grow,
          chipText: chipWords(format.quantity(state.value, spec.quantity), small || still),
          withUnit: !small && !still,
        },
      })),
    ];
    const steady = steadyNodes(formerNodes.current, next);
    formerNodes.current = new Map(steady.map((node) => [node.id, node]));
    return steady;
  }, [
    document,
    activeCase,
    routes,
    small,
    grow,
    slips,
    readings,
    tags,
    inHand,
    ink,
    touch,
    besideWheel,
    zoom,
    fit,
    height,
    open,
    format,
    moving,
    still,
  ]);

  function follow(changes: NodeChange[]) {
    for (const change of changes) {
      if (change.type === 'position' && change.position && change.dragging) setMoving({ id: change.id, ...change.position });
    }
  }
  function drop() {
    if (!moving) return;
    const entry = tags.find(({ spec }) => `tag ${spec.address}` === moving.id);
    setMoving(null);
    if (!entry) return;
    const { box, string, address } = entry.place;
    const dx = Math.round((moving.x / 10 + box.w / 2 - string.to.x) * 4) / 4;
    const dy = Math.round((moving.y / 10 + box.h / 2 - string.to.y) * 4) / 4;
    useDocument
      .getState()
      .edit((current) => setTagPlace(current, address, { dx, dy, pinned: current.tagPlaces[address]?.pinned ?? false }));
  }
  function moved(event: MouseEvent | TouchEvent | null, viewport: Viewport) {
    if (event) onZoom(viewport.zoom);
  }
  return (
    <ReactFlow
      nodes={nodes}
      edges={noEdges}
      nodeTypes={benchNodeTypes}
      onNodesChange={follow}
      onNodeDragStop={drop}
      onMoveEnd={moved}
      onPointerDownCapture={(event) => {
        pressedSheet.current = !(event.target as Element).closest('.react-flow__node');
      }}
      onPaneClick={() => {
        if (pressedSheet.current) useDocument.getState().takeInHand(null);
      }}
      panOnDrag={!still}
      zoomOnScroll={!still}
      zoomOnPinch={!still}
      minZoom={LEAST_ZOOM}
      maxZoom={MOST_ZOOM}
      nodesConnectable={false}
      nodesFocusable={false}
      edgesFocusable={false}
      elementsSelectable={false}
      selectNodesOnDrag={false}
      zoomOnDoubleClick={false}
      deleteKeyCode={null}
      selectionKeyCode={null}
      multiSelectionKeyCode={null}
      panActivationKeyCode={null}
      disableKeyboardA11y
      proOptions={hideCredit}
      aria-label="The circuit"
    >
      <Background variant={BackgroundVariant.Dots} gap={50} size={2.2} offset={1} />
    </ReactFlow>
  );
}

const noEdges: never[] = [];
const hideCredit = { hideAttribution: true };
