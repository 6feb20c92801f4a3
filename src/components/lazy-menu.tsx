import { Suspense, useState } from 'react';
import { Icon, type IconName } from './icons.tsx';
import { later } from './later.ts';

export type MenuEntry =
  | { readonly id: string; readonly label: string; readonly hint?: string; readonly disabled?: boolean; readonly onAction: () => void }
  | { readonly rule: string };

export interface MenuProps {
  /** Word on the button, or its spoken name when it shows an icon. */
  readonly label: string;
  readonly className: string;
  readonly face?: IconName;
  /** A chevron after the word. */
  readonly chevron?: boolean;
  readonly entries: readonly MenuEntry[];
}

const OpenMenu = later(async () => (await import('./menu.tsx')).OpenMenu);

/** A menu button whose list is loaded when it is first pressed, so that the first view stays light. */
export function LazyMenu(props: MenuProps) {
  const [used, setUsed] = useState(false);
  const face = (
    <button
      type="button"
      className={props.className}
      aria-haspopup="true"
      aria-expanded={used}
      aria-label={props.face ? props.label : undefined}
      onClick={() => setUsed(true)}
    >
      <MenuFace {...props} />
    </button>
  );
  if (!used) return face;
  return (
    <Suspense fallback={face}>
      <OpenMenu {...props} defaultOpen />
    </Suspense>
  );
}

export function MenuFace({ face, label, chevron }: Pick<MenuProps, 'face' | 'label' | 'chevron'>) {
  if (face) return <Icon name={face} />;
  return (
    <>
      {label}
      {chevron && <Icon name="chevron" size={12} />}
    </>
  );
}
