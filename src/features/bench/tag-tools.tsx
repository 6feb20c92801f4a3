import { setTagPlace } from '#shared/circuit/edit/sheet.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { tagPlaceNow } from './bench-places.ts';
import type { TagSpec } from './tag-specs.ts';
import type { TagState } from './tag-state.ts';
import { inOneStep, QUARTER, setLock, type TurnRefusal, toAsFound, turnBy } from './turning.ts';

export interface TagToolsProps {
  readonly spec: TagSpec;
  readonly state: TagState;
  readonly pinned: boolean;
  readonly above: boolean;
  readonly onRefused: (refusal: TurnRefusal | null) => void;
}

/** Buttons of the tag in hand: a quarter turn either way, the lock nut, back to as found, pin. */
export function TagTools({ spec, state, pinned, above, onRefused }: TagToolsProps) {
  const { document } = useDocument.getState();
  const dragged = spec.address in document.tagPlaces;
  function pin() {
    const place = tagPlaceNow(spec.address);
    const before = useDocument.getState().document.tagPlaces[spec.address];
    const at = before ?? place;
    if (!at) return;
    useDocument.getState().edit((current) => setTagPlace(current, spec.address, pinned ? null : { dx: at.dx, dy: at.dy, pinned: true }));
  }
  return (
    <div className={`tag-tools nodrag${above ? ' tag-tools-above' : ''}`}>
      <button type="button" aria-label="A quarter turn out" onClick={() => onRefused(turnBy(spec, -QUARTER))}>
        −¼
      </button>
      <button type="button" aria-label="A quarter turn in" onClick={() => onRefused(turnBy(spec, QUARTER))}>
        +¼
      </button>
      {spec.screw && (
        <button
          type="button"
          aria-pressed={state.locked}
          onClick={() => {
            setLock(spec, !state.locked);
            onRefused(null);
          }}
        >
          {state.locked ? 'Loosen' : 'Lock'}
        </button>
      )}
      <button type="button" disabled={state.value === state.asFound} onClick={() => onRefused(inOneStep(() => toAsFound(spec)))}>
        As found
      </button>
      <button type="button" aria-pressed={pinned} onClick={pin}>
        {pinned || dragged ? 'Unpin' : 'Pin'}
      </button>
    </div>
  );
}
