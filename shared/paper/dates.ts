const months = 'January February March April May June July August September October November December'.split(
  ' ',
);

/** A day as sheets print it, in UTC: `1 December 2026`. */
export function printedDay(date: Date): string {
  return `${date.getUTCDate()} ${months[date.getUTCMonth()]} ${date.getUTCFullYear()}`;
}
