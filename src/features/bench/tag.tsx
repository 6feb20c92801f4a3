import { memo, useCallback, useState } from 'react';
import type { TagForm } from '#shared/pictures/tag-slots.ts';
import { useFormat } from '#src/components/use-format.ts';
import { VerdictMark } from '#src/components/verdict.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { DialFace, ScrewFace } from './screw-face.tsx';
import { TagEntry } from './tag-entry.tsx';
import { TagRefusal } from './tag-refusal.tsx';
import type { TagSpec } from './tag-specs.ts';
import type { TagState } from './tag-state.ts';
import { TagTools } from './tag-tools.tsx';
import { aboveRating, plateVoltage, spokenValue, tagNote, tagTitle, tagValue } from './tag-words.ts';
import { TurnRuler } from './turn-ruler.tsx';
import type { TurnRefusal } from './turning.ts';
import { useTurnDrag } from './use-turn-drag.ts';
import { useTurnKeys, useTurnWheel } from './use-turn-keys.ts';

export interface TagProps {
  readonly spec: TagSpec;
  readonly state: TagState;
  readonly form: TagForm;
  readonly eyelet: 'left' | 'right';
  readonly ink: number;
  readonly inHand: boolean;
  readonly touch: boolean;
  /** A chip says its unit. */
  readonly withUnit: boolean;
  /** The buttons stand above the tag: below it there is no room. */
  readonly toolsAbove: boolean;
  /** Double click, long press or Enter. */
  readonly onOpen: (componentId: string) => void;
}

const RULER = 148;

/** A screw tag on the drawing: full, compact, or the value alone. */
export const Tag = memo(function Tag({ spec, state, form, eyelet, ink, inHand, touch, withUnit, toolsAbove, onOpen }: TagProps) {
  const format = useFormat();
  const [refusal, setRefusal] = useState<TurnRefusal | null>(null);
  const [typing, setTyping] = useState<string | null>(null);
  const open = useCallback(() => onOpen(spec.component), [onOpen, spec.component]);
  const type = (first: string) => {
    setRefusal(null);
    setTyping(first);
  };
  const startTurn = useTurnDrag({ spec, onRefused: setRefusal, mode: 'around' });
  const startSlide = useTurnDrag({
    spec,
    onRefused: setRefusal,
    mode: { pixelsPerTurn: (perTurn) => ((RULER - 4) * perTurn) / Math.max(1e-30, state.max - state.min) },
  });
  const onKeyDown = useTurnKeys({ spec, onRefused: setRefusal, onOpen: open, onType: type });
  const wheel = useTurnWheel<HTMLFieldSetElement>(spec, setRefusal);
  const plate = useDocument((store) => plateVoltage(store.document, spec));
  const value = tagValue(spec, state, format);
  const pinned = useDocument((store) => store.document.tagPlaces[spec.address]?.pinned ?? false);
  const title = tagTitle(spec);
  const above = aboveRating(state);
  const share = state.max > state.min ? (state.value - state.min) / (state.max - state.min) : 0;
  const take = () => useDocument.getState().takeInHand(spec.address);

  const shown = (
    <span className="tag-value">
      <span className="reading">{value.value}</span>
      {(form !== 'chip' || withUnit) && <span className="unit">{value.unit}</span>}
    </span>
  );
  return (
    <fieldset
      ref={wheel}
      className={`tag tag-${form} nowheel`}
      data-eyelet={eyelet}
      data-in-hand={inHand || undefined}
      data-above={above || undefined}
      data-tag={spec.address}
      aria-label={title}
      title={form === 'full' ? undefined : title}
      onDoubleClick={(event) => {
        if (!(event.target as Element).closest('button, input')) open();
      }}
    >
      <div
        className="tag-screw nodrag"
        role="slider"
        tabIndex={0}
        aria-label={`${title}, ${spec.component}`}
        aria-valuemin={Number(state.min.toPrecision(6))}
        aria-valuemax={Number(state.max.toPrecision(6))}
        aria-valuenow={Number(state.value.toPrecision(6))}
        aria-valuetext={spokenValue(spec, state, format)}
        aria-keyshortcuts="ArrowUp ArrowDown Home L Enter"
        onFocus={take}
        onPointerDown={form === 'chip' ? take : startTurn}
        onKeyDown={onKeyDown}
      >
        {form === 'chip' ? (
          shown
        ) : spec.screw ? (
          <ScrewFace turns={state.turns} locked={state.locked} size={form === 'full' ? 50 : 36} inHand={inHand} />
        ) : (
          <DialFace share={share} size={form === 'full' ? 46 : 34} />
        )}
      </div>
      {form === 'compact' && (
        <button type="button" className="tag-face" tabIndex={-1} onClick={take} aria-label={`Take ${title} in hand`}>
          {shown}
        </button>
      )}
      {form === 'full' && (
        <div className="tag-body">
          <div className="tag-head">
            <button type="button" className="tag-name nodrag" tabIndex={inHand ? 0 : -1} title="Nameplate" onClick={open}>
              {title}
            </button>
            <span className="tag-note">{tagNote(spec, state, ink, pinned, plate, format)}</span>
          </div>
          {typing === null ? (
            <button
              type="button"
              className="tag-number nodrag"
              tabIndex={inHand ? 0 : -1}
              aria-label={`${value.text}. Type a value`}
              onClick={() => {
                take();
                type('');
              }}
            >
              {shown}
              {above && <VerdictMark verdict="above-rating" size={15} label="Above the lowest rating" />}
            </button>
          ) : (
            <TagEntry spec={spec} state={state} first={typing} onDone={() => setTyping(null)} />
          )}
          <div className="tag-ruler nodrag" onPointerDown={startSlide}>
            <TurnRuler state={state} width={RULER} ink={ink} refusedEnd={refusedEnd(refusal, state)} />
          </div>
        </div>
      )}
      {form === 'full' && <span className="tag-eyelet" aria-hidden="true" />}
      {inHand && form === 'full' && !touch && (
        <TagTools spec={spec} state={state} pinned={pinned} above={toolsAbove} onRefused={setRefusal} />
      )}
      {refusal && <TagRefusal spec={spec} refusal={refusal} onDone={() => setRefusal(null)} />}
    </fieldset>
  );
});

function refusedEnd(refusal: TurnRefusal | null, state: TagState): 'low' | 'high' | null {
  if (refusal?.nearest === undefined) return null;
  return refusal.nearest >= (state.min + state.max) / 2 ? 'high' : 'low';
}
