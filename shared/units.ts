/** Conversions between the units that names in this project carry. Every factor lives here. */

export const msPerS = 1000;
export const usPerMs = 1000;
export const usPerS = 1_000_000;
export const msPerMinute = 60_000;
export const uvPerMv = 1000;

/** Whole microseconds of an interval in ms, rounded half up once, when the interval is formed. */
export function msToUs(ms: number): number {
  return Math.floor(ms * usPerMs + 0.5);
}

/** Whole microseconds to seconds. */
export function usToS(us: number): number {
  return us / usPerS;
}

/** Whole microseconds between events that come `ratePerMinute` times a minute: floor(60000/rate*1000 + 0.5). */
export function rateToIntervalUs(ratePerMinute: number): number {
  return Math.floor((msPerMinute / ratePerMinute) * usPerMs + 0.5);
}

/** Events per minute from a mean interval in ms. */
export function intervalToRate(intervalMs: number): number {
  return msPerMinute / intervalMs;
}

export function degToRad(deg: number): number {
  return (deg * Math.PI) / 180;
}

export function radToDeg(rad: number): number {
  return (rad * 180) / Math.PI;
}
