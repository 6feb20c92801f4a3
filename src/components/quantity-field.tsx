import { useEffect, useId, useRef, useState } from 'react';
import { createPortal } from 'react-dom';
import { preferredUnit, unitById } from '#shared/units/convert.ts';
import { type ParseLimits, parseQuantity, type RefusedQuantity, typedText } from '#shared/units/parse.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import { CautionIcon } from './icons.tsx';
import { useFormat } from './use-format.ts';

export interface FieldRefusal {
  readonly message: string;
  /** Nearest value that would be taken [SI]. */
  readonly nearest?: number;
}

export interface QuantityFieldProps {
  readonly label: string;
  readonly hideLabel?: boolean;
  /** SI value in force; null = not given. */
  readonly value: number | null;
  /** As typed, with its unit; without it the value is shown in the preferred unit. */
  readonly typed?: string;
  readonly quantity: QuantityId;
  readonly limits?: ParseLimits;
  /** Shown when there is no value. */
  readonly placeholder?: string;
  /** Takes the value, or says why not and what would be taken. */
  readonly onCommit: (value: number, typed: string) => FieldRefusal | undefined;
  /** Called when the field is emptied; without it an empty field is refused. */
  readonly onClear?: () => void;
  readonly describedBy?: string;
  /** Where the words of a refusal go, when not below the field (a row of its own in a table). */
  readonly refusalSlot?: HTMLElement | null;
}

/** A number field that takes any unit of its quantity. Enter or leaving commits; Escape gives the former value back. */
export function QuantityField(props: QuantityFieldProps) {
  const { label, value, typed, quantity, limits, onCommit, onClear } = props;
  const format = useFormat();
  const id = useId();
  const field = useRef<HTMLInputElement>(null);
  const unit = preferredUnit(quantity, format.preferences);
  const settled =
    value === null ? '' : typed !== undefined ? typedText(typed, quantity) : format.quantity(value, quantity, { style: 'plate' }).text;
  const [entry, setEntry] = useState(settled);
  const [refusal, setRefusal] = useState<RefusedQuantity | null>(null);
  useEffect(() => {
    setEntry(settled);
    setRefusal(null);
  }, [settled]);

  function accept(next: number, text: string) {
    setEntry(text);
    const refused = onCommit(next, text);
    if (!refused) return setRefusal(null);
    const { message, nearest } = refused;
    const words = nearest === undefined ? '' : format.quantity(nearest, quantity, { style: 'plate' }).text;
    setRefusal({
      ok: false,
      reason: 'out-of-range',
      message: `${label} ${message}; ${text} cannot be set.`,
      nearest: nearest === undefined ? undefined : { label: words, value: nearest, typed: words },
    });
  }
  function keep() {
    setEntry(settled);
    setRefusal(null);
  }
  function commit() {
    if (entry.trim() === settled.trim()) return setRefusal(null);
    if (entry.trim() === '' && onClear) return onClear();
    const outcome = parseQuantity(entry, quantity, typedUnit(), {
      min: -Infinity,
      max: Infinity,
      label,
      preferences: format.preferences,
      ...limits,
    });
    if (outcome.ok) accept(outcome.value, outcome.typed);
    else setRefusal(outcome);
  }
  /** A bare number keeps the unit the value was typed in. */
  function typedUnit(): string {
    const suffix = typed?.split(' ').slice(1).join(' ');
    return suffix ? unitBySymbol(quantity, suffix, unit.id) : unit.id;
  }

  const refusalId = `${id}-refusal`;
  const words = (refused: RefusedQuantity) => (
    <div id={refusalId} role="alert" className="field-refusal">
      <Refusal refusal={refused} settled={settled} use={accept} keep={keep} />
    </div>
  );
  return (
    <div className="quantity-field">
      <label htmlFor={id} className={props.hideLabel ? 'visually-hidden' : 'field-label'}>
        {label}
      </label>
      <input
        ref={field}
        id={id}
        className="field reading"
        data-refused={refusal !== null || undefined}
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        value={entry}
        placeholder={props.placeholder}
        aria-invalid={refusal !== null || undefined}
        aria-describedby={[refusal ? refusalId : undefined, props.describedBy].filter(Boolean).join(' ') || undefined}
        onChange={(event) => setEntry(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') {
            event.stopPropagation();
            keep();
          }
        }}
      />
      {refusal && (props.refusalSlot ? createPortal(words(refusal), props.refusalSlot) : words(refusal))}
    </div>
  );
}

function unitBySymbol(quantity: QuantityId, symbol: string, fallback: string): string {
  const unit = unitById(quantity, fallback);
  const parsed = parseQuantity(`1 ${symbol}`, quantity, unit.id);
  return parsed.ok ? parsed.unit : fallback;
}

export interface RefusalProps {
  readonly refusal: RefusedQuantity;
  /** What stays when the entry is dropped; '' = nothing was given. */
  readonly settled: string;
  readonly use: (value: number, typed: string) => void;
  readonly keep: () => void;
}

/** Why an entry was refused, and what may be taken instead. */
export function Refusal({ refusal, settled, use, keep }: RefusalProps) {
  const choices = refusal.readings ?? (refusal.nearest ? [refusal.nearest] : []);
  return (
    <>
      <CautionIcon size={17} />
      <span className="refusal-words">{refusal.message}</span>
      <span className="refusal-choices">
        {choices.map((choice) => (
          <button
            key={choice.label}
            type="button"
            className="button button-small"
            onMouseDown={hold}
            onClick={() => use(choice.value, choice.typed)}
          >
            {refusal.readings ? choice.label : `Use ${choice.label}`}
          </button>
        ))}
        <button type="button" className="button button-small" onMouseDown={hold} onClick={keep}>
          {settled === '' ? 'Leave it empty' : `Keep ${settled}`}
        </button>
      </span>
    </>
  );
}

/** Keeps the focus in the field, so that leaving it does not commit before the button is let go. */
function hold(event: { preventDefault: () => void }) {
  event.preventDefault();
}
