import { memo, useEffect, useRef, useState } from 'react';
import type { NodeProps } from 'reactflow';
import { removeItems } from '#shared/circuit/edit/removal.ts';
import { changeLabel, changeNote } from '#shared/circuit/edit/sheet.ts';
import { findComponent, nameInWords } from '#shared/circuit/kind-lookup.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { partFocus, useDrawing } from './drawing-store.ts';
import type { LabelData, NoteData } from './flow-model.ts';

const dateWords = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' });

function dated(date: string): string {
  const time = Date.parse(date);
  return Number.isNaN(time) ? date : dateWords.format(time);
}

/** A paper slip with what someone wrote, and when. */
export const NoteNode = memo(function NoteNode({ id, data, selected }: NodeProps<NoteData>) {
  const { note } = data;
  return (
    <Slip
      id={id}
      kind="note"
      text={note.text}
      selected={selected}
      label={`Note: ${note.text || 'empty'}`}
      most={400}
      onWritten={(text) =>
        text.trim() === '' ? removeItems(useDocument.getState().document, [id]) : changeNote(useDocument.getState().document, id, text)
      }
    >
      <span className="slip-foot">{['note', note.author, dated(note.date)].filter(Boolean).join(', ')}</span>
    </Slip>
  );
});

/** A small metal plate with a shelf name, tied to its part. */
export const LabelNode = memo(function LabelNode({ id, data, selected }: NodeProps<LabelData>) {
  const { label } = data;
  const owner = useDocument((state) => {
    const component = findComponent(state.document, label.component);
    return component ? nameInWords(component) : label.component;
  });
  return (
    <Slip
      id={id}
      kind="label"
      text={label.text}
      selected={selected}
      label={`Part label of ${owner}: ${label.text || 'empty'}`}
      most={60}
      onWritten={(text) =>
        text.trim() === '' ? removeItems(useDocument.getState().document, [id]) : changeLabel(useDocument.getState().document, id, text)
      }
    />
  );
});

interface SlipProps {
  readonly id: string;
  readonly kind: 'note' | 'label';
  readonly text: string;
  readonly selected: boolean;
  readonly label: string;
  readonly most: number;
  readonly onWritten: (text: string) => ReturnType<typeof changeNote>;
  readonly children?: React.ReactNode;
}

function Slip({ id, kind, text, selected, label, most, onWritten, children }: SlipProps) {
  const writing = useDrawing((state) => state.writing === id);
  const set = useDrawing((state) => state.set);
  if (writing) return <SlipField id={id} kind={kind} text={text} label={label} most={most} onWritten={onWritten} />;
  return (
    // biome-ignore lint/a11y/useSemanticElements: a button element would swallow the drag in one browser
    <div
      role="button"
      tabIndex={0}
      className={`slip slip-${kind}`}
      data-part={id}
      aria-pressed={selected}
      aria-label={label}
      onDoubleClick={() => set({ writing: id })}
      onKeyDown={(event) => {
        if (event.key !== 'Enter') return;
        event.stopPropagation();
        set({ writing: id });
      }}
    >
      <span className="slip-text">{text}</span>
      {children}
    </div>
  );
}

function SlipField({ id, kind, text, label, most, onWritten }: Omit<SlipProps, 'selected' | 'children'>) {
  const [entry, setEntry] = useState(text);
  const field = useRef<HTMLTextAreaElement>(null);
  const set = useDrawing((state) => state.set);
  // The canvas hides a new slip until it has measured it, and what is hidden takes no focus.
  useEffect(() => {
    let tries = 0;
    let frame = 0;
    const take = () => {
      field.current?.focus();
      field.current?.select();
      if (document.activeElement !== field.current && tries++ < 30) frame = requestAnimationFrame(take);
    };
    take();
    return () => cancelAnimationFrame(frame);
  }, []);
  const done = (next: string, refocus: boolean) => {
    useDocument.getState().edit(() => onWritten(next));
    set({ writing: null, focus: refocus ? partFocus(id) : null });
  };
  return (
    <textarea
      ref={field}
      className={`slip slip-${kind} slip-field nodrag nowheel`}
      aria-label={label}
      maxLength={most}
      rows={kind === 'note' ? 3 : 1}
      value={entry}
      onChange={(event) => setEntry(event.target.value)}
      onBlur={() => done(entry, false)}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape') done(text, true);
        if (event.key === 'Enter' && !event.shiftKey) {
          event.preventDefault();
          done(entry, true);
        }
      }}
    />
  );
}
