import './drawing.css';
import { type ReactNode, useEffect, useLayoutEffect, useRef } from 'react';
import { ReactFlowProvider, useReactFlow, useViewport } from 'reactflow';
import { useSize } from '#src/lib/use-size.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { DrawBar } from './draw-bar.tsx';
import { useDrawing } from './drawing-store.ts';
import { EmptySheet } from './empty-sheet.tsx';
import { fitSheet, keepInView } from './fit-sheet.ts';
import { NextStrip } from './next-strip.tsx';
import { PartsDrawer } from './parts-drawer.tsx';
import { ProblemSlips } from './problem-slips.tsx';
import { SelectionTools } from './selection-tools.tsx';
import { Sheet } from './sheet.tsx';
import { useDrawKeys } from './use-draw-keys.ts';

/** The Draw stage: the line above, the sheet, the parts drawer. `children` are laid over the sheet (the open nameplate). */
export function DrawStage({ children }: { readonly children?: ReactNode }) {
  return (
    <ReactFlowProvider>
      <Stage>{children}</Stage>
    </ReactFlowProvider>
  );
}

function Stage({ children }: { readonly children?: ReactNode }) {
  const [sheet, room] = useSize<HTMLDivElement>();
  const flow = useReactFlow();
  const empty = useDocument((state) => state.document.components.length === 0 && state.document.notes.length === 0);
  const said = useDrawing((state) => state.said);
  const keys = useDrawKeys({ in: () => void flow.zoomIn(), out: () => void flow.zoomOut(), fit: () => fitSheet(flow, room) });
  useFocusWhenDrawn(sheet);
  const kept = useKeptFocus(sheet);
  useEffect(
    () => () =>
      useDrawing
        .getState()
        .set({ strip: null, preview: null, placing: null, deletion: null, writing: null, joinFrom: null, said: '', focus: null }),
    [],
  );
  const ready = room.width > 0;
  // biome-ignore lint/correctness/useExhaustiveDependencies: fitted once, when the sheet has its size
  useEffect(() => {
    if (ready) fitSheet(flow, room);
  }, [ready]);

  const count = useDocument((state) => state.document.components.length);
  const before = useRef(count);
  // biome-ignore lint/correctness/useExhaustiveDependencies: only a part that was added moves the view
  useEffect(() => {
    if (count > before.current) keepInView(flow, room);
    before.current = count;
  }, [count]);

  return (
    <div className="drawing-stage">
      <DrawBar room={room} />
      <section
        ref={sheet}
        className="draw-sheet"
        aria-label="The sheet"
        tabIndex={-1}
        {...keys}
        onFocus={kept.onFocus}
        onBlur={(event) => {
          keys.onBlur();
          kept.onBlur(event);
        }}
      >
        <Sheet />
        <ZoomOnSheet sheet={sheet} />
        <ProblemSlips width={room.width} height={room.height} />
        <SelectionTools width={room.width} height={room.height} />
        <NextStrip width={room.width} height={room.height} />
        {empty && <EmptySheet onTaken={() => fitSheet(flow, room)} />}
        {children}
      </section>
      <PartsDrawer room={room} />
      <p className="visually-hidden" aria-live="polite">
        {said}
      </p>
    </div>
  );
}

/** Tells the styles the zoom, so that rings keep a size that a hand can hit. */
function ZoomOnSheet({ sheet }: { readonly sheet: React.RefObject<HTMLElement | null> }) {
  const { zoom } = useViewport();
  useEffect(() => sheet.current?.style.setProperty('--zoom', zoom.toFixed(3)), [sheet, zoom]);
  return null;
}

/** Gives the focus to what an action asked for, as soon as the canvas has drawn it. */
function useFocusWhenDrawn(sheet: React.RefObject<HTMLElement | null>) {
  const focus = useDrawing((state) => state.focus);
  const tries = useRef(0);
  useEffect(() => {
    if (!focus) return;
    tries.current = 0;
    let frame = 0;
    const look = () => {
      const [what, id = ''] = focus.split(' ');
      const selector = what === 'port' ? `[data-ring="${id}"]` : `[data-part="${id}"]`;
      const element = sheet.current?.querySelector<HTMLElement>(selector);
      if (element || tries.current++ > 20) {
        element?.focus({ preventScroll: true });
        useDrawing.getState().set({ focus: null });
      } else frame = requestAnimationFrame(look);
    };
    look();
    return () => cancelAnimationFrame(frame);
  }, [focus, sheet]);
}

/** When the thing that had the focus leaves the sheet (undo, delete), the sheet itself takes it, so that the next key still acts. */
function useKeptFocus(sheet: React.RefObject<HTMLElement | null>) {
  const document = useDocument((state) => state.document);
  const within = useRef(false);
  // biome-ignore lint/correctness/useExhaustiveDependencies: looked at after every change of the circuit
  useLayoutEffect(() => {
    if (within.current && globalThis.document.activeElement === globalThis.document.body) sheet.current?.focus({ preventScroll: true });
  }, [document]);
  return {
    onFocus: () => {
      within.current = true;
    },
    onBlur: (event: React.FocusEvent) => {
      if (event.relatedTarget && !sheet.current?.contains(event.relatedTarget as Node)) within.current = false;
    },
  };
}
