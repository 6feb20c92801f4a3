import { Icon } from '#src/components/icons.tsx';

const views = [
  ['drawing', 'Drawing'],
  ['tape', 'Tape'],
  ['load', 'Load'],
  ['findings', 'Findings'],
] as const;
export type PhoneView = (typeof views)[number][0];

export interface BottomBarProps {
  readonly view: PhoneView;
  readonly findings: number;
  readonly onChange: (view: PhoneView) => void;
}

/** The phone's four regions, one at a time. */
export function BottomBar({ view, findings, onChange }: BottomBarProps) {
  return (
    <nav className="bottom-bar no-print" aria-label="Regions">
      {views.map(([id, word]) => (
        <button key={id} type="button" aria-current={view === id} onClick={() => onChange(id)}>
          <Icon name={id} size={24} />
          <span>{id === 'findings' ? `${word} ${findings}` : word}</span>
        </button>
      ))}
    </nav>
  );
}
