/** Loads what may be needed later once a person has begun to work, so that dialogs and the other screen still open without a
 *  network. Returns a function that gives up. */
export function loadLater(loads: readonly (() => Promise<unknown>)[], delay = 1500): () => void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const begin = () => {
    stopListening();
    timer = setTimeout(() => {
      for (const load of loads) load().catch(() => undefined);
    }, delay);
  };
  const stopListening = () => {
    window.removeEventListener('pointerdown', begin);
    window.removeEventListener('keydown', begin);
  };
  window.addEventListener('pointerdown', begin);
  window.addEventListener('keydown', begin);
  return () => {
    stopListening();
    clearTimeout(timer);
  };
}
