import { useEffect, useId, useRef, useState } from 'react';
import { changeCommand, moveCommand, removeCommand } from '#shared/circuit/edit/duty.ts';
import type { CircuitDocument, Command } from '#shared/circuit/schema.ts';
import { madeWords } from '#shared/duty/command-words.ts';
import { supplyInputs, targetInput } from '#shared/duty/duty.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import { type FieldRefusal, QuantityField } from '#src/components/quantity-field.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { showIn } from './tape-model.ts';

export interface FlagEditorProps {
  readonly document: CircuitDocument;
  readonly command: Command;
  readonly left: number;
  readonly onEdit: (change: (document: CircuitDocument) => CircuitDocument) => void;
  readonly onClose: () => void;
}

/** The small sheet of one command: time, ramp, what it acts on, value in any unit, label. */
export function FlagEditor({ document, command, left, onEdit, onClose }: FlagEditorProps) {
  const id = useId();
  const sheet = useRef<HTMLDivElement>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const { preferences } = useFormat();
  const input = targetInput(document, kindOf, command.target, command.input);
  useEffect(() => {
    sheet.current?.querySelector('input')?.focus();
  }, []);

  /** Makes the change, or says why not. */
  function change(patch: Partial<Omit<Command, 'id'>>): FieldRefusal | undefined {
    const { problem } = changeCommand(document, command.id, patch);
    setRefused(problem?.message ?? null);
    if (problem) return { message: problem.message, nearest: problem.nearest };
    onEdit((now) => changeCommand(now, command.id, patch).document);
    return undefined;
  }
  const targets = targetsOf(document);
  const inputs = inputsOf(document, command.target);
  function retarget(target: string, wanted?: string) {
    const all = inputsOf(document, target);
    const next = all.find((entry) => entry.id === wanted) ?? all[0];
    if (!next) return;
    const spec = targetInput(document, kindOf, target, next.id);
    const value =
      target === 'supply'
        ? next.id === 'frequency'
          ? document.supply.frequency
          : document.supply.voltage
        : (spec?.words[0]?.value ?? spec?.max ?? 0);
    change({ target, input: next.id, value: Math.min(Math.abs(value) < 1e5 ? value : 0, spec?.max ?? value), label: '' });
  }

  return (
    <div
      ref={sheet}
      role="dialog"
      aria-label={`Command ${madeWords(document, kindOf, command, showIn(preferences))}`}
      className="tape-editor"
      style={{ left }}
      onKeyDownCapture={(event) => {
        if (event.key !== 'Escape') return;
        event.stopPropagation();
        onClose();
      }}
      onKeyDown={(event) => event.stopPropagation()}
    >
      <div className="tape-editor-fields">
        <QuantityField
          label="Time"
          value={command.time}
          quantity="time"
          limits={{ min: 0, max: document.duty.duration, label: 'Time' }}
          onCommit={(time) => {
            onEdit((now) => moveCommand(now, command.id, time));
            return undefined;
          }}
        />
        <QuantityField
          label="Ramp"
          value={command.ramp}
          quantity="time"
          limits={{ min: 0, max: 3600, label: 'Ramp' }}
          onCommit={(ramp) => change({ ramp })}
        />
        <label className="tape-editor-label" htmlFor={`${id}-target`}>
          Acts on
          <select id={`${id}-target`} className="select" value={command.target} onChange={(event) => retarget(event.target.value)}>
            {targets.map((target) => (
              <option key={target.id} value={target.id}>
                {target.words}
              </option>
            ))}
          </select>
        </label>
        <label className="tape-editor-label" htmlFor={`${id}-input`}>
          Input
          <select
            id={`${id}-input`}
            className="select"
            value={command.input}
            onChange={(event) => retarget(command.target, event.target.value)}
          >
            {inputs.map((entry) => (
              <option key={entry.id} value={entry.id}>
                {entry.label}
              </option>
            ))}
          </select>
        </label>
        {input && input.words.length > 0 && (
          <label className="tape-editor-label" htmlFor={`${id}-word`}>
            Position
            <select
              id={`${id}-word`}
              className="select"
              value={input.words.some((word) => word.value === command.value) ? String(command.value) : 'other'}
              onChange={(event) => event.target.value !== 'other' && change({ value: Number(event.target.value), label: '' })}
            >
              {input.words.map((word) => (
                <option key={word.value} value={String(word.value)}>
                  {word.label}
                </option>
              ))}
              <option value="other">other</option>
            </select>
          </label>
        )}
        {input && (
          <QuantityField
            label="Value"
            value={command.value}
            quantity={input.quantity}
            limits={{ min: input.min, max: input.max, label: input.label }}
            onCommit={(value) => change({ value, label: '' })}
          />
        )}
        <LabelField
          label={command.label}
          made={madeWords(document, kindOf, command, showIn(preferences))}
          onCommit={(label) => change({ label })}
        />
      </div>
      {refused && (
        <p role="alert" className="tape-editor-refused">
          {refused}
        </p>
      )}
      <div className="tape-editor-foot">
        <button
          type="button"
          className="button-quiet"
          onClick={() => {
            onEdit((now) => removeCommand(now, command.id));
            onClose();
          }}
        >
          Delete
        </button>
        <button type="button" className="button" onClick={onClose}>
          Close
        </button>
      </div>
    </div>
  );
}

function LabelField({
  label,
  made,
  onCommit,
}: {
  readonly label: string;
  readonly made: string;
  readonly onCommit: (label: string) => void;
}) {
  const id = useId();
  const [entry, setEntry] = useState(label);
  useEffect(() => setEntry(label), [label]);
  const commit = () => entry.trim() !== label && onCommit(entry.trim().slice(0, 60));
  return (
    <label className="tape-editor-label" htmlFor={id}>
      Label
      <input
        id={id}
        className="field"
        value={entry}
        maxLength={60}
        placeholder={made}
        onChange={(event) => setEntry(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => event.key === 'Enter' && commit()}
      />
    </label>
  );
}

function targetsOf(document: CircuitDocument): { id: string; words: string }[] {
  const parts = document.components
    .filter((component) => inputsOf(document, component.id).length > 0)
    .map((component) => ({ id: component.id, words: `${component.name || component.id} ${kindOf(component.kind)?.word ?? ''}`.trim() }));
  return [...parts, { id: 'supply', words: 'Supply' }];
}

function inputsOf(document: CircuitDocument, target: string): { id: string; label: string }[] {
  if (target === 'supply') return Object.entries(supplyInputs).map(([id, input]) => ({ id, label: input.label }));
  const component = document.components.find((entry) => entry.id === target);
  const kind = component && kindOf(component.kind);
  if (!kind) return [];
  const own = kind.inputs.filter((input) => input.id !== 'supplyVoltage' && input.id !== 'supplyFrequency');
  return [
    ...own.map((input) => ({ id: input.id, label: input.label })),
    ...kind.faults.map((fault) => ({ id: `fault.${fault.id}`, label: `Fault: ${fault.label}` })),
  ];
}
