import { type KeyboardEvent, useEffect, useLayoutEffect, useMemo, useRef, useState } from 'react';
import { useViewport } from 'reactflow';
import { isOpen } from '#shared/circuit/edit/joins.ts';
import { portPlace } from '#shared/circuit/edit/place-parts.ts';
import { portInWords } from '#shared/circuit/kind-lookup.ts';
import { allNextParts, likelyJoin, nextParts } from '#shared/circuit/next-parts.ts';
import type { CircuitDocument, PortRef } from '#shared/circuit/schema.ts';
import { Icon } from '#src/components/icons.tsx';
import { SymbolIcon } from '#src/components/schematic/symbol-icon.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { growAt, joinPorts, joinTargets, takeApart } from './actions.ts';
import { closeStrip, openStrip, useDrawing } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';

interface Choice {
  readonly id: string;
  readonly words: string;
  /** Kind whose symbol is shown and drawn pale. */
  readonly kind?: string;
  readonly mark?: 'more' | 'join' | 'cut' | 'back';
  readonly likely?: boolean;
  readonly take: () => void;
}

/** What may follow a port: a strip at the ring. Arrows choose, Enter takes, Escape puts it away. */
export function NextStrip({ width, height }: { readonly width: number; readonly height: number }) {
  const strip = useDrawing((state) => state.strip);
  const document = useDocument((state) => state.document);
  const place = strip && portPlace(document, strip.ref);
  if (!strip || !place) return null;
  return (
    <OpenStrip
      key={`${strip.ref.component}.${strip.ref.port} ${strip.list}`}
      portRef={strip.ref}
      list={strip.list}
      document={document}
      place={place}
      room={{ width, height }}
    />
  );
}

interface OpenStripProps {
  readonly portRef: PortRef;
  readonly list: 'next' | 'all' | 'join';
  readonly document: CircuitDocument;
  readonly place: { readonly x: number; readonly y: number };
  readonly room: { readonly width: number; readonly height: number };
}

function OpenStrip({ portRef, list, document, place, room }: OpenStripProps) {
  const { x, y, zoom } = useViewport();
  const box = useRef<HTMLDivElement>(null);
  const phone = useLayout() === 'phone';
  const [size, setSize] = useState({ width: 0, height: 0 });
  const { question, choices } = useMemo(() => choicesAt(document, portRef, list), [document, portRef, list]);
  const likely = Math.max(
    0,
    choices.findIndex((choice) => choice.likely),
  );
  const [index, setIndex] = useState(likely);
  const set = useDrawing((state) => state.set);
  const choice = choices[index];

  useLayoutEffect(() => {
    const element = box.current;
    if (element) setSize({ width: element.offsetWidth, height: element.offsetHeight });
  }, []);
  const drawn = size.width > 0;
  useEffect(() => {
    if (!drawn) return;
    box.current?.querySelector<HTMLElement>(`[data-choice="${index}"]`)?.focus({ preventScroll: true });
  }, [index, drawn]);
  useEffect(() => set({ preview: choice?.kind ?? null }), [set, choice]);

  const at = { x: x + place.x * MODULE * zoom, y: y + place.y * MODULE * zoom };
  const left = Math.max(8, Math.min(room.width - size.width - 8, at.x - size.width * 0.45));
  const above = at.y > size.height + 26;
  const top = above ? Math.max(8, at.y - size.height - 70) : Math.min(room.height - size.height - 8, at.y + 60);

  function handleKey(event: KeyboardEvent) {
    const many = choices.length;
    const wide = list === 'join' ? 1 : 0;
    const steps: Record<string, number> = { ArrowRight: 1, ArrowLeft: -1, ArrowDown: wide ? 1 : 1, ArrowUp: -1 };
    const step = steps[event.key];
    event.stopPropagation();
    if (event.key === 'Escape') {
      event.preventDefault();
      if (list === 'next') closeStrip();
      else openStrip(portRef);
    } else if (step !== undefined) {
      event.preventDefault();
      setIndex((index + step + many) % many);
    } else if (event.key === 'Home' || event.key === 'End') {
      event.preventDefault();
      setIndex(event.key === 'Home' ? 0 : many - 1);
    } else if (event.key === 'Tab') {
      closeStrip();
    }
  }

  return (
    <>
      <span
        className="strip-leader"
        style={{ left: at.x, top: above ? top + size.height : at.y + 12, height: above ? at.y - 12 - top - size.height : top - at.y - 12 }}
      />
      <div
        ref={box}
        className={`strip strip-${list}`}
        role="menu"
        aria-label={question}
        tabIndex={-1}
        style={phone ? undefined : { left, top, opacity: drawn ? undefined : 0 }}
        onKeyDown={handleKey}
      >
        <div className="strip-head" role="presentation">
          <span>{question}</span>
          {list === 'next' && <span className="strip-hint">or drag to another ring</span>}
        </div>
        <div className="strip-choices" role="presentation">
          {choices.map((entry, at) => (
            <button
              key={entry.id}
              type="button"
              role="menuitem"
              className="strip-choice"
              data-choice={at}
              data-likely={entry.likely || undefined}
              tabIndex={at === index ? 0 : -1}
              aria-label={entry.likely ? `${entry.words}, likeliest` : entry.words}
              onClick={entry.take}
              onFocus={() => setIndex(at)}
              onPointerEnter={(event) => event.pointerType === 'mouse' && setIndex(at)}
            >
              {entry.kind && list !== 'join' && <SymbolIcon kind={entry.kind} width={70} height={44} />}
              {entry.mark && <StripMark mark={entry.mark} />}
              <span>{entry.words}</span>
            </button>
          ))}
          {choices.length === 0 && <p className="strip-none">Nothing on the sheet can be joined here yet.</p>}
        </div>
      </div>
    </>
  );
}

function choicesAt(document: CircuitDocument, ref: PortRef, list: 'next' | 'all' | 'join'): { question: string; choices: Choice[] } {
  const part = (next: { kind: string; word: string; likely: boolean }): Choice => ({
    id: next.kind,
    words: next.word,
    kind: next.kind,
    likely: next.likely,
    take: () => growAt(ref, next.kind),
  });
  const back: Choice = { id: 'back', words: 'back', mark: 'back', take: () => openStrip(ref) };
  if (list === 'join') {
    const targets = joinTargets(document, ref);
    const choices = targets.map(
      (target): Choice => ({
        id: `${target.ref.component}.${target.ref.port}`,
        words: target.words,
        likely: false,
        take: () => joinPorts(ref, target.ref),
      }),
    );
    return { question: `Join ${portInWords(document, ref)} to`, choices: [...choices, back] };
  }
  if (list === 'all') return { question: 'All parts', choices: [...allNextParts(document, ref).map(part), back] };
  const next = nextParts(document, ref);
  const open = isOpen(document, ref);
  const pair = likelyJoin(document, ref);
  const choices: Choice[] = next.parts.map((entry) => part(pair ? { ...entry, likely: false } : entry));
  if (pair)
    choices.unshift({
      id: 'pair',
      words: `join to ${portInWords(document, pair)}`,
      mark: 'join',
      likely: true,
      take: () => joinPorts(ref, pair),
    });
  choices.push({ id: 'all', words: 'all parts', mark: 'more', take: () => openStrip(ref, 'all') });
  choices.push({ id: 'join', words: 'join to…', mark: 'join', take: () => openStrip(ref, 'join') });
  if (!open) choices.push({ id: 'cut', words: 'take apart', mark: 'cut', take: () => takeApart(ref) });
  return { question: open ? next.question : `Branch off ${portInWords(document, ref)}`, choices };
}

function StripMark({ mark }: { readonly mark: NonNullable<Choice['mark']> }) {
  return (
    <span className="strip-mark">
      {mark === 'more' && <Icon name="more" size={26} />}
      {mark === 'back' && <Icon name="chevron" size={22} />}
      {mark === 'join' && (
        <svg width="44" height="24" viewBox="0 0 44 24" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="2">
          <circle cx="7" cy="12" r="5" />
          <circle cx="37" cy="12" r="5" />
          <path d="M12 12h20" strokeDasharray="3 3" />
        </svg>
      )}
      {mark === 'cut' && (
        <svg width="44" height="24" viewBox="0 0 44 24" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="2">
          <path d="M2 12h13M29 12h13M17 5l10 14" />
        </svg>
      )}
    </span>
  );
}
