import { memo, useRef } from 'react';
import { type Moment, useMoment } from '#src/components/schematic/moment.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { explain } from '#src/stores/explain-store.ts';
import { type ReadingSpec, readingLines } from './reading-specs.ts';

export interface ReadingProps {
  readonly spec: ReadingSpec;
}

/** A reading on the drawing; its figures follow the cursor without rendering. Pressing it asks how it is computed. */
export const Reading = memo(function Reading({ spec }: ReadingProps) {
  const format = useFormat();
  const first = useRef<HTMLSpanElement>(null);
  const firstUnit = useRef<HTMLSpanElement>(null);
  const second = useRef<HTMLSpanElement>(null);
  const secondUnit = useRef<HTMLSpanElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  useMoment(({ run, time, at, stale }: Moment) => {
    const lines = readingLines(spec, run, time, at, useDocument.getState().document, format);
    write(first.current, lines[0]?.value ?? '');
    write(firstUnit.current, lines[0]?.unit ?? '');
    write(second.current, lines[1]?.value ?? '');
    write(secondUnit.current, lines[1]?.unit ?? '');
    if (!button.current) return;
    button.current.hidden = lines.length === 0;
    button.current.toggleAttribute('data-stale', stale);
  });
  return (
    <button
      ref={button}
      type="button"
      className={`bench-reading nodrag nopan${spec.small ? ' bench-reading-small' : ''}`}
      title="How is this computed?"
      tabIndex={-1}
      onClick={() => explain(spec.address)}
    >
      <span className="bench-reading-line">
        <span ref={first} className="reading" /> <span ref={firstUnit} className="unit" />
      </span>
      {spec.form === 'motor' && (
        <span className="bench-reading-line bench-reading-second">
          <span ref={second} className="reading" /> <span ref={secondUnit} className="unit" />
        </span>
      )}
    </button>
  );
});

function write(element: HTMLElement | null, text: string): void {
  if (element && element.textContent !== text) element.textContent = text;
}
