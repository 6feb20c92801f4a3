import { useEffect, useId, useRef, useState } from 'react';
import type { RefusedQuantity } from '#shared/units/parse.ts';
import { Refusal } from '#src/components/quantity-field.tsx';
import { useFormat } from '#src/components/use-format.ts';
import type { TagSpec } from './tag-specs.ts';
import type { TagState } from './tag-state.ts';
import { type Typed, takeValue, typeValue } from './turning.ts';

export interface TagEntryProps {
  readonly spec: TagSpec;
  readonly state: TagState;
  /** What was already typed. */
  readonly first: string;
  readonly onDone: () => void;
}

/** Typing a value into a tag, with any unit: "2000 psi". */
export function TagEntry({ spec, state, first, onDone }: TagEntryProps) {
  const format = useFormat();
  const id = useId();
  const field = useRef<HTMLInputElement>(null);
  const settled = state.typed ?? format.quantity(state.value, spec.quantity, { style: 'plate' }).text;
  const [entry, setEntry] = useState(first === '' ? settled : first);
  const [refusal, setRefusal] = useState<RefusedQuantity | null>(null);
  useEffect(() => {
    field.current?.focus();
    if (first === '') field.current?.select();
  }, [first]);

  function back() {
    const tag = field.current?.closest('.tag, .turn-wheel')?.querySelector<HTMLElement>('[role="slider"]');
    onDone();
    tag?.focus({ preventScroll: true });
  }
  function take(text: string) {
    settle(typeValue(spec, text, format.preferences));
  }
  function settle(outcome: Typed) {
    if (outcome.ok) back();
    else setRefusal(outcome.refusal);
  }
  return (
    <div className="tag-entry nodrag">
      <input
        ref={field}
        className="field reading"
        aria-label={`${spec.label}, value and unit`}
        aria-invalid={refusal !== null || undefined}
        aria-describedby={refusal ? id : undefined}
        data-refused={refusal !== null || undefined}
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        value={entry}
        onChange={(event) => {
          setEntry(event.target.value);
          setRefusal(null);
        }}
        onKeyDown={(event) => {
          event.stopPropagation();
          if (event.key === 'Enter') take(entry);
          if (event.key === 'Escape') back();
        }}
        onBlur={(event) => {
          if (event.relatedTarget instanceof Node && event.currentTarget.parentElement?.contains(event.relatedTarget)) return;
          if (refusal || entry.trim() === '' || entry.trim() === settled) onDone();
          else take(entry);
        }}
      />
      {refusal && (
        <div id={id} role="alert" className="field-refusal tag-refusal">
          <Refusal
            refusal={refusal}
            settled={settled}
            use={(value, typed) => settle(refusal.nearest ? takeValue(spec, value, typed) : typeValue(spec, typed, format.preferences))}
            keep={back}
          />
        </div>
      )}
    </div>
  );
}
