import { casePen } from '#shared/pictures/case-pens.ts';

export interface CaseLetterProps {
  readonly letter: string;
  /** Index of the case ink. */
  readonly ink: number;
  readonly size?: number;
  readonly label?: string;
}

/** The pen square of a case: letter and ink together. */
export function CaseLetter({ letter, ink, size = 24, label }: CaseLetterProps) {
  return (
    <span
      className="case-letter"
      style={{ width: size, height: size, fontSize: Math.max(12, size * 0.62), backgroundColor: `var(--case-${ink})` }}
    >
      {label && <span className="visually-hidden">{label} </span>}
      {letter}
    </span>
  );
}

/** Numeral of a finding: the same one in the margin, on the tape and on the load picture. */
export function FindingNumeral({ number, size = 22 }: { readonly number: number; readonly size?: number }) {
  return (
    <span className="finding-numeral" style={{ width: size, height: size }}>
      {number}
    </span>
  );
}

/** The trace's own line, for cards and legends: letter, ink and dash travel together. */
export function CaseDash({ ink, width = 34 }: { readonly ink: number; readonly width?: number }) {
  const pen = casePen(ink);
  return (
    <svg width={width} height="8" viewBox={`0 0 ${width} 8`} aria-hidden="true">
      <path d={`M0 4H${width}`} stroke={`var(--case-${ink})`} strokeWidth={pen.width} strokeDasharray={pen.dash.join(' ') || undefined} />
    </svg>
  );
}
