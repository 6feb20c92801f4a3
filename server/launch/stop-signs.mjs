/** Calls `stop` once for Ctrl-C, SIGTERM, or when the process that started this one has gone
 *  (npm killed without a word). A second Ctrl-C calls `hurry`.
 *  A closed terminal is left to the system's default: it ends this process, and the closed channels end the others; nohup works. */
export function onStopSign(stop, hurry) {
  let told = false;
  const handle = (signal) => {
    if (told) return hurry();
    told = true;
    clearInterval(watch);
    stop(signal);
  };
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => handle(signal));
  const parent = process.ppid;
  const watch = setInterval(() => {
    if (process.ppid !== parent) handle('parent');
  }, 500);
  watch.unref();
}
