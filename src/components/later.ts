import { type ComponentType, lazy } from 'react';
import { useKeeping } from '#src/stores/keeping-store.ts';

const PAUSE = 2000;

/** Loads a part of the page however long that takes: while the server cannot be reached it says so once and tries again. */
export async function loadPatiently<T>(load: () => Promise<T>, pause = PAUSE): Promise<T> {
  for (let told = false; ; told = true) {
    try {
      return await load();
    } catch {
      if (!told)
        useKeeping.getState().setNotice('The server does not answer. What was asked for opens as soon as it does; the circuit is kept.');
      await new Promise((resolve) => setTimeout(resolve, pause));
    }
  }
}

/** A component that is not on the first view: loaded when it is first shown, and never the end of what is already on the screen. */
export function later<P extends object>(load: () => Promise<ComponentType<P>>) {
  return lazy(async () => ({ default: await loadPatiently(load) }));
}
