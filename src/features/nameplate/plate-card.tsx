import { type ReactNode, useEffect, useId, useRef } from 'react';
import { useNameplate } from '#src/stores/nameplate-store.ts';
import { PlateString } from './plate-string.tsx';

export interface PlateCardProps {
  /** What the string ties it to: a component or line id; plates of the whole circuit have no string. */
  readonly target: string;
  readonly title: string;
  readonly note: string;
  readonly children: ReactNode;
}

function Rivet({ place }: { readonly place: string }) {
  return (
    <svg className={`rivet rivet-${place}`} width="13" height="13" viewBox="0 0 13 13" aria-hidden="true">
      <circle cx="6.5" cy="6.5" r="5.5" fill="var(--metal)" stroke="var(--ink)" strokeWidth="1.4" />
      <path d="M3.2 3.6 9.8 9.4" stroke="var(--ink)" strokeWidth="1.5" />
    </svg>
  );
}

/** A plate with four rivets and a double border, tied to its symbol by a string. Escape closes it. */
export function PlateCard({ target, title, note, children }: PlateCardProps) {
  const close = useNameplate((state) => state.close);
  const heading = useId();
  const card = useRef<HTMLElement>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new target takes the focus
  useEffect(() => {
    const before = document.activeElement;
    card.current?.focus();
    return () => {
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, [target]);
  return (
    <>
      <PlateString target={target} card={card} />
      <section
        ref={card}
        className="plate"
        role="dialog"
        aria-labelledby={heading}
        tabIndex={-1}
        data-plate={target}
        onKeyDown={(event) => {
          if (event.key === 'Escape') close();
          event.stopPropagation();
        }}
      >
        {['nw', 'ne', 'sw', 'se'].map((place) => (
          <Rivet key={place} place={place} />
        ))}
        <div className="plate-inner">
          <header className="plate-head">
            <h2 id={heading}>{title}</h2>
            <span className="plate-note">{note}</span>
            <button type="button" className="button-quiet" onClick={close}>
              Close
            </button>
          </header>
          <div className="plate-body">{children}</div>
        </div>
      </section>
    </>
  );
}
