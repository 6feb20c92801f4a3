import { useMemo } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { type CommandOffer, offeredCommands } from '#shared/duty/command-offers.ts';
import { defaultLanes } from '#shared/duty/lanes.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import type { RunResult } from '#shared/simulation/result.ts';

/** The three small sheets of the tape: which flag to add, which lanes to show, what to save. */

export interface AddFlagMenuProps {
  readonly document: CircuitDocument;
  readonly onAdd: (offer: CommandOffer) => void;
}

export function AddFlagMenu({ document, onAdd }: AddFlagMenuProps) {
  const groups = useMemo(() => offeredCommands(document, kindOf), [document]);
  if (groups.length === 0) return <p className="tape-menu-empty">Nothing on the drawing takes a command yet.</p>;
  return (
    <>
      {groups.map((group) => (
        <fieldset key={group.title} className="tape-menu-group">
          <legend>{group.title}</legend>
          {group.offers.map((offer) => (
            <button key={offer.id} type="button" className="tape-menu-item" onClick={() => onAdd(offer)}>
              {offer.words}
            </button>
          ))}
        </fieldset>
      ))}
    </>
  );
}

export interface LaneMenuProps {
  readonly document: CircuitDocument;
  readonly run: RunResult | null;
  readonly shown: readonly string[];
  readonly most: number;
  readonly onChoose: (addresses: readonly string[] | null) => void;
}

export function LaneMenu({ document, run, shown, most, onChoose }: LaneMenuProps) {
  const usual = useMemo(() => defaultLanes(document), [document]);
  const groups = useMemo(() => channelGroups(document, run), [document, run]);
  if (!run) return <p className="tape-menu-empty">Lanes can be chosen once a run is in.</p>;
  const toggle = (address: string) => {
    const next = shown.includes(address) ? shown.filter((entry) => entry !== address) : [...shown, address].slice(-Math.max(1, most));
    onChoose(next.length > 0 ? next : null);
  };
  return (
    <>
      <button type="button" className="tape-menu-item" onClick={() => onChoose(null)}>
        Usual lanes ({usual.length})
      </button>
      {groups.map((group) => (
        <fieldset key={group.title} className="tape-menu-group">
          <legend>{group.title}</legend>
          {group.channels.map((channel) => (
            <label key={channel.address} className="tape-menu-item">
              <input type="checkbox" checked={shown.includes(channel.address)} onChange={() => toggle(channel.address)} />
              {channel.label}
            </label>
          ))}
        </fieldset>
      ))}
    </>
  );
}

function channelGroups(document: CircuitDocument, run: RunResult | null) {
  const names = new Map<string, string>(document.components.map((entry) => [entry.id, entry.name || entry.id]));
  const groups = new Map<string, { address: string; label: string }[]>();
  for (const channel of run?.channels ?? []) {
    const owner = channel.address.split('.')[0] ?? '';
    const title = owner === 'line' ? 'Lines' : (names.get(owner) ?? owner);
    const list = groups.get(title) ?? [];
    list.push({ address: channel.address, label: channel.label });
    groups.set(title, list);
  }
  return [...groups].map(([title, channels]) => ({ title, channels }));
}
