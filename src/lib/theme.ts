import { useSyncExternalStore } from 'react';

export type Theme = 'light' | 'dark';

const dark = () => window.matchMedia('(prefers-color-scheme: dark)');

/** Sets data-theme on <html>; 'auto' follows the system. Returns a function that stops following. */
export function applyTheme(choice: 'auto' | Theme): () => void {
  const query = dark();
  const set = () => {
    document.documentElement.dataset.theme = choice === 'auto' ? (query.matches ? 'dark' : 'light') : choice;
  };
  set();
  if (choice !== 'auto') return () => undefined;
  query.addEventListener('change', set);
  return () => query.removeEventListener('change', set);
}

/** Sets data-motion on <html>; 'auto' follows the system. Returns a function that stops following. */
export function applyMotion(choice: 'auto' | 'reduced'): () => void {
  const query = window.matchMedia('(prefers-reduced-motion: reduce)');
  const set = () => {
    document.documentElement.dataset.motion = choice === 'reduced' || query.matches ? 'reduced' : 'full';
  };
  set();
  query.addEventListener('change', set);
  return () => query.removeEventListener('change', set);
}

function subscribe(attribute: string) {
  return (notify: () => void) => {
    const observer = new MutationObserver(notify);
    observer.observe(document.documentElement, { attributes: true, attributeFilter: [attribute] });
    return () => observer.disconnect();
  };
}
const subscribeTheme = subscribe('data-theme');
const subscribeMotion = subscribe('data-motion');

/** The theme in force; canvas pictures redraw on it. */
export function useTheme(): Theme {
  return useSyncExternalStore(subscribeTheme, () => (document.documentElement.dataset.theme === 'dark' ? 'dark' : 'light'));
}

/** True when movement is to be kept still. */
export function useReducedMotion(): boolean {
  return useSyncExternalStore(subscribeMotion, () => document.documentElement.dataset.motion === 'reduced');
}
