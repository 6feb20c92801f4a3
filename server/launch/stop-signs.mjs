/** Calls `stop` once for Ctrl-C, SIGTERM, a closed terminal, or when the process that started this one has gone
 *  (npm killed without a word). A second Ctrl-C calls `hurry`. */
export function onStopSign(stop, hurry) {
  let told = false;
  const handle = (signal) => {
    if (told) return hurry();
    told = true;
    clearInterval(watch);
    stop(signal);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => handle(signal));
  const parent = process.ppid;
  const watch = setInterval(() => {
    if (process.ppid !== parent) handle('parent');
  }, 500);
  watch.unref();
}
