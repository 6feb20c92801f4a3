/** Loads what may be needed later once a person has begun to work, so that dialogs and the other screen still open without a
 *  network. Returns a function that gives up. */
export function loadLater(loads: readonly (() => Promise<unknown>)[], delay = 1500): () => void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const begin = () => {
    stopListening();
    timer = setTimeout(load, delay);
  };
  const load = () => {
    if (navigator.onLine) for (const one of loads) one().catch(() => undefined);
    else window.addEventListener('online', load, { once: true });
  };
  const stopListening = () => {
    window.removeEventListener('pointerdown', begin);
    window.removeEventListener('keydown', begin);
  };
  window.addEventListener('pointerdown', begin);
  window.addEventListener('keydown', begin);
  return () => {
    stopListening();
    window.removeEventListener('online', load);
    clearTimeout(timer);
  };
}
