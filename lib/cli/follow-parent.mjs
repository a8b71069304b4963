/**
 * Calls `stop` once the process that started this one is gone: npm passes a signal on to nobody and just ends, and
 * whoever stopped it meant us.
 * @param {() => void} stop
 */
export function followParent(stop) {
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(timer);
    stop();
  }, 500);
  timer.unref();
}
