import type { ReactNode } from 'react';

const icons = {
  turn: <path d="M19 8.5A8 8 0 1 0 20 14M20 3.5V9h-5.5" />,
  mirror: (
    <>
      <path d="M12 3v18" strokeDasharray="3 2" />
      <path d="M10 6v12H3zM14 6v12h7z" fill="currentColor" strokeWidth="1" />
    </>
  ),
  duplicate: <path d="M4 4h11v11H4zM9 9h11v11H9z" />,
  delete: <path d="M5 7h14M9.500 7V4.500h5V7M6.500 7l1 13h9l1-13M10.500 11v5M13.500 11v5" />,
} satisfies Record<string, ReactNode>;

export type ToolIconName = keyof typeof icons;

export function ToolIcon({ name }: { readonly name: ToolIconName }) {
  return (
    <svg width="24" height="24" viewBox="0 0 24 24" fill="none" stroke="currentColor" strokeWidth="2" aria-hidden="true">
      {icons[name]}
    </svg>
  );
}
