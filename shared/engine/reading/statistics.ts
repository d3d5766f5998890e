/** Arithmetic mean; null for an empty list. */
export function mean(values: readonly number[]): number | null {
  if (values.length === 0) return null;
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** Middle value (mean of the two middle ones for an even count); null for an empty list. */
export function median(values: readonly number[]): number | null {
  if (values.length === 0) return null;
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

/** Mean direction of angles in degrees, in (−180, 180]; null for an empty list. */
export function meanAngleDeg(angles: readonly number[]): number | null {
  if (angles.length === 0) return null;
  let x = 0;
  let y = 0;
  for (const angle of angles) {
    x += Math.cos((angle * Math.PI) / 180);
    y += Math.sin((angle * Math.PI) / 180);
  }
  return (Math.atan2(y, x) * 180) / Math.PI;
}

/** Successive differences; one shorter than the list. */
export function differences(values: readonly number[]): number[] {
  return values.slice(1).map((value, i) => value - values[i]);
}

/** Rounded to `digits` decimals, for figures that are shown; null stays null. */
export function rounded(value: number, digits: number): number;
export function rounded(value: number | null, digits: number): number | null;
export function rounded(value: number | null, digits: number): number | null {
  if (value === null) return null;
  const factor = 10 ** digits;
  return Math.round(value * factor) / factor + 0;
}
