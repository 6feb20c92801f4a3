import { useEffect } from 'react';
import { useFormat } from '#src/components/use-format.ts';
import type { TagSpec } from './tag-specs.ts';
import { setLock, type TurnRefusal } from './turning.ts';

export interface TagRefusalProps {
  readonly spec: TagSpec;
  readonly refusal: TurnRefusal;
  readonly onDone: () => void;
}

/** Why a turn was not taken: at the tag, in words, with the one thing that helps. */
export function TagRefusal({ spec, refusal, onDone }: TagRefusalProps) {
  const { words } = useFormat();
  useEffect(() => {
    if (refusal.locked) return;
    const timer = setTimeout(onDone, 4000);
    return () => clearTimeout(timer);
  }, [refusal, onDone]);
  return (
    <div className="tag-refusal nodrag" role="status">
      <span>{words(refusal.message)}</span>
      <span className="refusal-choices">
        {refusal.locked && (
          <button
            type="button"
            className="button button-small"
            onClick={() => {
              setLock(spec, false);
              onDone();
            }}
          >
            Loosen the nut
          </button>
        )}
        <button type="button" className="button button-small" onClick={onDone}>
          {refusal.locked ? 'Leave it' : 'Close'}
        </button>
      </span>
    </div>
  );
}
