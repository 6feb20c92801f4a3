import { addCommand, changeCommand, removeCommand, setDuty } from '#shared/circuit/edit/duty.ts';
import { findKind, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { Command } from '#shared/circuit/schema.ts';
import { offeredCommands } from '#shared/duty/command-offers.ts';
import { QuantityField } from '#src/components/quantity-field.tsx';
import { fieldSpec } from '#src/lib/field-specs.ts';
import { applyValue } from '#src/stores/apply-value.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { PlateCard } from './plate-card.tsx';
import { PlateTable } from './plate-table.tsx';
import { plateValue } from './plate-value.ts';

/** The duty as a table: what the flags on the tape say. */
export function DutyPlate() {
  const document = useDocument((state) => state.document);
  const { duty } = document;
  const groups = offeredCommands(document, findKind);
  const offers = groups.flatMap((group) => group.offers);

  function add(id: string) {
    const offer = offers.find((entry) => entry.id === id);
    if (!offer) return;
    useDocument
      .getState()
      .edit((present) => addCommand(present, { ...offer, label: offer.words, time: useCursor.getState().time }).document);
  }

  return (
    <PlateCard target="duty" title="Duty" note="the flags on the tape">
      <PlateTable caption="Duty" target="duty" fields={['duration']} heads />
      <label className="plate-check">
        <input
          type="checkbox"
          checked={duty.repeat}
          onChange={(event) => useDocument.getState().edit((present) => setDuty(present, { repeat: event.target.checked }))}
        />
        Repeats without a pause: the RMS current and the relay are reckoned over it
      </label>
      <table className="plate-table plate-duty">
        <caption className="plate-caption">Commands in their order</caption>
        <thead>
          <tr>
            <th scope="col">Words on the flag</th>
            <th scope="col">Time</th>
            <th scope="col">Ramp</th>
            <th scope="col">Value</th>
            <th scope="col">
              <span className="visually-hidden">Delete</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {duty.commands.map((command) => (
            <CommandRow key={command.id} command={command} />
          ))}
        </tbody>
      </table>
      <label className="plate-add">
        <span>Add a command at the cursor</span>
        <select className="select" value="" onChange={(event) => add(event.target.value)}>
          <option value="">choose</option>
          {groups.map((group) => (
            <optgroup key={group.title} label={group.title}>
              {group.offers.map((offer) => (
                <option key={offer.id} value={offer.id}>
                  {offer.words}
                </option>
              ))}
            </optgroup>
          ))}
        </select>
      </label>
    </PlateCard>
  );
}

function CommandRow({ command }: { readonly command: Command }) {
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  const component = document.components.find((entry) => entry.id === command.target);
  const target = component ? nameInWords(component) : 'Supply';
  return (
    <tr>
      <td>
        <input
          key={command.label}
          className="field"
          aria-label={`Words on the flag of ${target}`}
          defaultValue={command.label}
          maxLength={60}
          onBlur={(event) => {
            const label = event.target.value.trim();
            useDocument.getState().edit((present) => changeCommand(present, command.id, { label }).document);
          }}
        />
        <span className="source-note">{target}</span>
      </td>
      {(['time', 'ramp', 'value'] as const).map((part) => {
        const field = `command.${command.id}.${part}`;
        const spec = fieldSpec(document, 'duty', field);
        const row = plateValue(document, activeCase, 'duty', field);
        if (spec?.type !== 'number' || typeof row?.value !== 'number') return <td key={part} />;
        return (
          <td key={part} className="plate-value" data-changed={row.changed || undefined}>
            <QuantityField
              label={spec.label}
              hideLabel
              value={row.value}
              typed={row.typed}
              quantity={spec.quantity}
              limits={{ min: spec.min, max: spec.max, label: spec.label }}
              onCommit={(value, typed) => applyValue('duty', field, value, typed)}
            />
          </td>
        );
      })}
      <td>
        <button
          type="button"
          className="button button-small"
          aria-label={`Delete "${command.label}"`}
          onClick={() => useDocument.getState().edit((present) => removeCommand(present, command.id))}
        >
          Delete
        </button>
      </td>
    </tr>
  );
}
