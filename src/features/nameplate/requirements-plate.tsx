import { useState } from 'react';
import { addRequirement, changeRequirement, removeRequirement } from '#shared/circuit/edit/duty.ts';
import type { Requirement } from '#shared/circuit/schema.ts';
import { PhraseText } from '#src/components/quantity.tsx';
import { QuantityField } from '#src/components/quantity-field.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { PlateCard } from './plate-card.tsx';
import { limitQuantity, measureWords, type Requirable, requirables } from './requirement-words.ts';

/** What the machine must do: force, time, motor. A run is measured by it. */
export function RequirementsPlate() {
  const document = useDocument((state) => state.document);
  const choices = requirables(document);
  return (
    <PlateCard target="requirements" title="Requirements" note="what a run is measured by">
      {document.requirements.length === 0 && <p className="plate-port">None yet: add what the machine must do.</p>}
      <ol className="requirement-list">
        {document.requirements.map((requirement) => (
          <RequirementRow key={requirement.id} requirement={requirement} choices={choices} />
        ))}
      </ol>
      <AddRequirement choices={choices} />
      <p className="plate-about">
        A time to reach counts from the start of its phase. The stall margin is pull-out torque at the lowest supply over the highest torque
        asked; the house rule is 1.25.
      </p>
    </PlateCard>
  );
}

interface RowProps {
  readonly requirement: Requirement;
  readonly choices: readonly Requirable[];
}

function RequirementRow({ requirement, choices }: RowProps) {
  const document = useDocument((state) => state.document);
  const result = useRuns((state) =>
    state.byCase[useDocument.getState().activeCase]?.assessment?.requirements.find((entry) => entry.id === requirement.id),
  );
  const chosen = choices.find((entry) => entry.address === requirement.quantity);
  const quantity = chosen?.quantity ?? 'number';
  const limit = limitQuantity(requirement, quantity);
  const change = (patch: Partial<Omit<Requirement, 'id'>>) => {
    const before = useDocument.getState().document;
    const next = changeRequirement(before, requirement.id, patch);
    if (next === before) return { message: 'needs a least or a most value, the least not above the most' };
    useDocument.getState().edit(() => next);
    return undefined;
  };
  return (
    <li className="requirement" data-met={result?.met}>
      <div className="requirement-head">
        <strong>{chosen?.words ?? requirement.quantity}</strong>
        <select
          className="select"
          aria-label="Measured"
          value={requirement.measure}
          onChange={(event) => {
            const measure = event.target.value as Requirement['measure'];
            change({
              measure,
              ...(measure === 'time to reach' && requirement.at === undefined ? { at: requirement.min ?? requirement.max ?? 0 } : {}),
            });
          }}
        >
          {Object.entries(measureWords).map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </select>
        <button
          type="button"
          className="button button-small"
          onClick={() => useDocument.getState().edit((present) => removeRequirement(present, requirement.id))}
        >
          Delete
        </button>
      </div>
      <div className="requirement-fields">
        {requirement.measure === 'time to reach' && (
          <QuantityField label="Value to be reached" value={requirement.at ?? null} quantity={quantity} onCommit={(at) => change({ at })} />
        )}
        <QuantityField
          label="At least"
          value={requirement.min ?? null}
          quantity={limit}
          placeholder="no limit"
          onCommit={(min) => change({ min })}
          onClear={() => void change({ min: undefined })}
        />
        <QuantityField
          label="At most"
          value={requirement.max ?? null}
          quantity={limit}
          placeholder="no limit"
          onCommit={(max) => change({ max })}
          onClear={() => void change({ max: undefined })}
        />
        <label className="quantity-field">
          <span className="field-label">Phase</span>
          <select
            className="select"
            value={requirement.phase ?? ''}
            onChange={(event) => change({ phase: event.target.value === '' ? undefined : event.target.value })}
          >
            <option value="">whole duty</option>
            {[...new Set(document.duty.commands.map((command) => command.label))].map((label) => (
              <option key={label} value={label}>
                {label}
              </option>
            ))}
          </select>
        </label>
      </div>
      {result && (
        <p className="source-note">
          {result.met ? 'Met: ' : 'Not met: '}
          <PhraseText phrase={result.words} />
        </p>
      )}
    </li>
  );
}

/** A starting limit for a new requirement, which is then set in its row. */
function AddRequirement({ choices }: { readonly choices: readonly Requirable[] }) {
  const [message, setMessage] = useState('');
  return (
    <label className="plate-add">
      <span>Add a requirement on</span>
      <select
        className="select"
        value=""
        onChange={(event) => {
          const choice = choices.find((entry) => entry.address === event.target.value);
          if (!choice) return;
          const start = choice.address === 'stall margin' ? { min: 1.25 } : choice.address === 'rms current' ? { max: 1 } : { min: 0 };
          const before = useDocument.getState().document;
          const made = addRequirement(before, { quantity: choice.address, measure: 'peak', ...start });
          setMessage(made.id ? '' : 'There are forty requirements already.');
          if (made.id) useDocument.getState().edit(() => made.document);
        }}
      >
        <option value="">choose</option>
        {choices.map((choice) => (
          <option key={choice.address} value={choice.address}>
            {choice.words}
          </option>
        ))}
      </select>
      {message && <span role="alert">{message}</span>}
    </label>
  );
}
