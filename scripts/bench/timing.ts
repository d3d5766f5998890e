/** Time that an action takes, ms. */
export function timeMs(action: () => void): number {
  const started = process.hrtime.bigint();
  action();
  return Number(process.hrtime.bigint() - started) / 1e6;
}

/** Middle value of a list that is not empty. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1];
}
