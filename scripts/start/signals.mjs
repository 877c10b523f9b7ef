/**
 * Calls `onStop` once, when this process is asked to end or when the npm that started it is gone. npm passes a SIGTERM on to its shell only,
 * and the shell dies without telling us: without looking after the parent, everything would run on unseen.
 * @param {(reason: string) => void} onStop
 * @param {(reason: string) => void} [onRepeated] for further signals; one Ctrl-C may arrive twice, from the terminal and from npm, so those within a second do not count
 */
export function whenAskedToStop(onStop, onRepeated = () => {}) {
  let firstAt = 0;
  const stop = (reason) => {
    clearInterval(watch);
    if (firstAt === 0) {
      firstAt = Date.now();
      onStop(reason);
    } else if (Date.now() - firstAt > 1000) {
      onRepeated(reason);
    }
  };
  const parent = process.ppid;
  const watch = setInterval(() => {
    if (process.env.npm_lifecycle_event && process.ppid !== parent) stop('npm has ended');
  }, 500);
  watch.unref();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stop(signal));
}
