const steps = [
  { unit: 'GB', bytes: 1e9 },
  { unit: 'MB', bytes: 1e6 },
  { unit: 'kB', bytes: 1e3 },
] as const;

/** A size in words, with three digits at most: `12.4 MB`. */
export function sizeWords(bytes: number): string {
  const step = steps.find((one) => bytes >= one.bytes);
  if (!step) return `${bytes} bytes`;
  return `${Number((bytes / step.bytes).toPrecision(3))} ${step.unit}`;
}

/** A duration in words: `10 s`, `2 min`, `1 h 30 min`. */
export function durationWords(durationS: number): string {
  if (durationS < 120 || durationS % 60 !== 0) return `${Number(durationS.toFixed(3))} s`;
  const hours = Math.floor(durationS / 3600);
  const minutes = (durationS % 3600) / 60;
  return [...(hours > 0 ? [`${hours} h`] : []), ...(minutes > 0 ? [`${minutes} min`] : [])].join(' ');
}

const dateFormat = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short' });
const timeFormat = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** A day, such as `9 Mar`. */
export const dayWords = (iso: string): string => dateFormat.format(new Date(iso));

/** A moment, such as `9 Mar, 14:05`. */
export const momentWords = (iso: string): string =>
  `${dateFormat.format(new Date(iso))}, ${timeFormat.format(new Date(iso))}`;
