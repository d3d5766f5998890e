/** The fields of a moment in UTC, as text padded with zeros: `2000`, `01`, `01`, `00`, `00`, `00`. */
export interface UtcText {
  year: string;
  month: string;
  day: string;
  hours: string;
  minutes: string;
  seconds: string;
}

function padded(value: number, digits: number): string {
  return String(value).padStart(digits, '0');
}

/** A moment's fields in UTC, as text. */
export function utcText(moment: Date): UtcText {
  return {
    year: padded(moment.getUTCFullYear(), 4),
    month: padded(moment.getUTCMonth() + 1, 2),
    day: padded(moment.getUTCDate(), 2),
    hours: padded(moment.getUTCHours(), 2),
    minutes: padded(moment.getUTCMinutes(), 2),
    seconds: padded(moment.getUTCSeconds(), 2),
  };
}
