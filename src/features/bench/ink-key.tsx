import { memo, useRef } from 'react';
import { findCase } from '#shared/circuit/effective.ts';
import { findKind } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { caseLetter } from '#shared/pictures/case-pens.ts';
import { oilTintCss, strandInk, strandOffsets } from '#shared/pictures/pressure-ink.ts';
import { type Moment, useMoment } from '#src/components/schematic/moment.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

const RUNG = 45;
const HEIGHT = 16;
const ABOVE = 22;
export const KEY_WIDTH = RUNG * 5 + ABOVE + 26;
export const KEY_HEIGHT = 72;
/** Without the line above it. */
export const PLAIN_KEY_HEIGHT = 48;

/** Address of the pressure the pointer shows: the first port that feeds a net, else the first gauge. */
function keyAddress(document: CircuitDocument): string | null {
  for (const component of document.components) {
    const port = findKind(component.kind)?.ports.find((entry) => entry.source);
    if (port) return `${component.id}.${port.id}.pressure`;
  }
  const gauge = document.components.find((component) => component.kind === 'pressure-gauge');
  return gauge ? `${gauge.id}.M.pressure` : null;
}

/** "Solenoid a on" → "solenoid a on", but "V3 to a" stays. */
function inSentence(label: string): string {
  return /^\p{Lu}\p{Ll}/u.test(label) ? label.charAt(0).toLowerCase() + label.slice(1) : label;
}

/** "At 3.34 s, case B, solenoid a on". */
export const MomentLine = memo(function MomentLine() {
  const format = useFormat();
  const ink = useDocument((state) => findCase(state.document, state.activeCase)?.ink ?? 0);
  const words = useRef<HTMLSpanElement>(null);
  const when = useRef<HTMLElement>(null);
  useMoment(({ time, run }: Moment) => {
    if (when.current) when.current.textContent = `At ${format.quantity(time, 'time', { digits: 2 }).text}`;
    if (!words.current) return;
    const phase = run?.phases.find((entry) => time >= entry.from && time < entry.to)?.label;
    words.current.textContent = `case ${caseLetter(ink)}${phase ? `, ${inSentence(phase)}` : ''}`;
  });
  return (
    <p className="ink-key-line">
      <strong ref={when} /> <span ref={words} />
    </p>
  );
});

/** The line above the drawing and the ladder of the pressure ink, with a pointer at the present pressure. */
export const InkKey = memo(function InkKey({ plain }: { readonly plain?: boolean }) {
  const format = useFormat();
  const address = useDocument((state) => keyAddress(state.document));
  const ink = useDocument((state) => findCase(state.document, state.activeCase)?.ink ?? 0);
  const inkScale = useRuns((state) => state.inkScale);
  const pointer = useRef<SVGPathElement>(null);

  useMoment(({ at, inkScale: scale }: Moment) => {
    const pressure = address ? at(address) : undefined;
    if (pointer.current) {
      const share = Math.min(1.1, Math.max(0, pressure ?? 0) / scale);
      pointer.current.setAttribute('transform', `translate(${1 + share * RUNG * 5} 0)`);
      pointer.current.setAttribute('visibility', pressure === undefined ? 'hidden' : 'visible');
    }
  });

  const marks = [0, 0.2, 0.4, 0.6, 0.8, 1].map((share) => ({ share, label: format.quantity(share * inkScale, 'pressure') }));
  return (
    <div className="ink-key">
      {!plain && <MomentLine />}
      <svg
        width={KEY_WIDTH}
        height={48}
        viewBox={`0 0 ${KEY_WIDTH} 48`}
        role="img"
        aria-label={`Pressure ink from 0 to ${marks[5]?.label.text}`}
      >
        <path ref={pointer} d="M-5 0H5L0 8Z" fill={`var(--case-${ink})`} />
        {[0, 1, 2, 3, 4].map((rung) => (
          <g key={rung} transform={`translate(${1 + rung * RUNG} 11)`}>
            <rect width={RUNG} height={HEIGHT} fill={oilTintCss(rung * 0.2 + 0.1)} />
            {strandOffsets(rung, HEIGHT).map((offset) => (
              <path
                key={offset}
                d={`M0 ${HEIGHT / 2 + offset}h${RUNG}`}
                stroke={`var(--${strandInk(rung * 0.2 + 0.1)})`}
                strokeWidth="1"
                opacity="0.8"
              />
            ))}
            <rect width={RUNG} height={HEIGHT} className="ink-key-rung" />
          </g>
        ))}
        <g transform={`translate(${1 + RUNG * 5} 11)`}>
          <rect width={ABOVE} height={HEIGHT} fill={oilTintCss(1)} />
          {strandOffsets(5, HEIGHT).map((offset) => (
            <path key={offset} d={`M0 ${HEIGHT / 2 + offset}h${ABOVE}`} stroke="var(--sheet)" strokeWidth="1" opacity="0.8" />
          ))}
          <rect width={ABOVE} height={HEIGHT} className="ink-key-above" />
        </g>
        {marks.map(({ share, label }) => (
          <text
            key={share}
            x={1 + share * RUNG * 5 + (share === 0 ? 2 : 0)}
            y="43"
            textAnchor={share === 0 ? 'start' : 'middle'}
            className="ink-key-mark"
          >
            {label.value}
          </text>
        ))}
        <text x={RUNG * 5 + 19} y="43" className="ink-key-mark">
          {marks[5]?.label.unit}
        </text>
      </svg>
    </div>
  );
});
