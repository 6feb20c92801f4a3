import { useSyncExternalStore } from 'react';

/** The four arrangements of the bench by width of the window (UI.md section 12). */
export type Layout = 'desk' | 'rail' | 'narrow' | 'phone';

const queries = [
  ['desk', '(min-width: 1280px)'],
  ['rail', '(min-width: 1024px)'],
  ['narrow', '(min-width: 600px)'],
] as const;

const lists = new Map<string, MediaQueryList>();

/** One list per question for the life of the page: asking anew costs more than rendering. */
function media(query: string): MediaQueryList {
  let list = lists.get(query);
  if (!list) {
    list = window.matchMedia(query);
    lists.set(query, list);
  }
  return list;
}

function subscribe(notify: () => void): () => void {
  for (const [, query] of queries) media(query).addEventListener('change', notify);
  return () => {
    for (const [, query] of queries) media(query).removeEventListener('change', notify);
  };
}

function current(): Layout {
  return queries.find(([, query]) => media(query).matches)?.[0] ?? 'phone';
}

export function useLayout(): Layout {
  return useSyncExternalStore(subscribe, current);
}

const coarse = '(pointer: coarse)';

function subscribeTouch(notify: () => void): () => void {
  media(coarse).addEventListener('change', notify);
  return () => media(coarse).removeEventListener('change', notify);
}

/** True when the main pointer is a finger. */
export function useTouch(): boolean {
  return useSyncExternalStore(subscribeTouch, () => media(coarse).matches);
}
