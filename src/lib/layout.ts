import { useSyncExternalStore } from 'react';

/** The four arrangements of the bench by width of the window (UI.md section 12). */
export type Layout = 'desk' | 'rail' | 'narrow' | 'phone';

const queries = [
  ['desk', '(min-width: 1280px)'],
  ['rail', '(min-width: 1024px)'],
  ['narrow', '(min-width: 600px)'],
] as const;

function subscribe(notify: () => void): () => void {
  const lists = queries.map(([, query]) => window.matchMedia(query));
  for (const list of lists) list.addEventListener('change', notify);
  return () => {
    for (const list of lists) list.removeEventListener('change', notify);
  };
}

function current(): Layout {
  return queries.find(([, query]) => window.matchMedia(query).matches)?.[0] ?? 'phone';
}

export function useLayout(): Layout {
  return useSyncExternalStore(subscribe, current);
}

const coarse = '(pointer: coarse)';

function subscribeTouch(notify: () => void): () => void {
  const list = window.matchMedia(coarse);
  list.addEventListener('change', notify);
  return () => list.removeEventListener('change', notify);
}

/** True when the main pointer is a finger. */
export function useTouch(): boolean {
  return useSyncExternalStore(subscribeTouch, () => window.matchMedia(coarse).matches);
}
