import type { ReactNode } from 'react';

/** A dozen icons of our own; box 20 × 20, stroke in the current colour. Always beside a word or with a label on the button. */
const icons = {
  plus: <path d="M10 3v14M3 10h14" />,
  menu: <path d="M2.5 5h15M2.5 10h15M2.5 15h15" />,
  more: <path d="M4 10h.01M10 10h.01M16 10h.01" strokeWidth="3" strokeLinecap="round" />,
  close: <path d="M4 4l12 12M16 4 4 16" />,
  chevron: <path d="M5 7.5 10 12.5 15 7.5" />,
  drawing: (
    <>
      <circle cx="6" cy="13" r="4" />
      <path d="M8 9V3h7v6h-5M12.5 11h5v6h-5z" />
    </>
  ),
  tape: (
    <>
      <path d="M2 4h16v12H2z" />
      <path d="M2 12q3.5 0 5-3t5 1 6-2" />
    </>
  ),
  load: <path d="M4 2v14h14M4 5q9 1 10 11M8 2v6h6" />,
  findings: <path d="M2.5 3h15v10h-6l-4 4v-4h-5z" />,
  play: <path d="M5 3l11 7-11 7z" fill="currentColor" stroke="none" />,
  pause: <path d="M6 3v14M14 3v14" strokeWidth="4" />,
} satisfies Record<string, ReactNode>;

export type IconName = keyof typeof icons;

export function Icon({ name, size = 20 }: { readonly name: IconName; readonly size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 20 20" fill="none" stroke="currentColor" strokeWidth="1.8" aria-hidden="true">
      {icons[name]}
    </svg>
  );
}

/** The mark: a pump's circle with its slanted stroke. */
export function Mark({ size = 28 }: { readonly size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 28 28" aria-hidden="true">
      <circle cx="14" cy="14" r="12.6" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="2.4" />
      <path d="M1.5 14h25" stroke="var(--ink)" strokeWidth="2.4" />
      <path d="M9.4 4.2 18.6 23.8" stroke="var(--oxide)" strokeWidth="4" />
    </svg>
  );
}

export function CautionIcon({ size = 20 }: { readonly size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 20 20" aria-hidden="true">
      <path d="M10 1.8 19 18H1z" fill="var(--caution)" />
      <path d="M10 7.4v5" stroke="var(--sheet)" strokeWidth="2" />
      <circle cx="10" cy="15.2" r="1.2" fill="var(--sheet)" />
    </svg>
  );
}
