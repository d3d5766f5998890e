/** What a person typed, as a number in the field's unit, or why it is none. */
export type ParsedQuantity = { value: number } | { error: string };

const plainNumber = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i;

/** Units of the fields in the words of mathjs; rates and plain factors have none. */
const mathUnit: Record<string, string> = {
  ms: 'ms',
  s: 's',
  mV: 'mV',
  V: 'V',
  Hz: 'Hz',
  '°': 'deg',
  µV: 'uV',
};

function plain(text: string): number | null {
  return plainNumber.test(text) ? Number(text.replace(',', '.')) : null;
}

/**
 * Reads "70", "0,4", "1.2 s", "1 s + 50 ms", "30 min", "1000 uV", and for rates also "72/min" or an interval such as "800 ms".
 * mathjs is loaded only when something other than a plain number was typed.
 */
export async function parseQuantity(typed: string, unit: string): Promise<ParsedQuantity> {
  const text = typed.trim().replace(/−/g, '-');
  const bare = unit !== '' && text.endsWith(unit) ? text.slice(0, -unit.length).trim() : text;
  const number = plain(bare.replace(/\s*(bpm|per minute)$/i, ''));
  if (number !== null) return { value: number };
  const error = { error: `“${typed.trim()}” is not a number${unit ? ` or a quantity in ${unit}` : ''}.` };
  try {
    const { evaluate, isUnit } = await import('./quantity-math');
    // “min” alone would be the smallest of a list.
    const words = text
      .replaceAll('µ', 'u')
      .replace(/(\d),(\d)/g, '$1.$2')
      .replace(/\bmin\b/g, 'minute');
    const result: unknown = evaluate(words);
    if (typeof result === 'number') return Number.isFinite(result) ? { value: result } : error;
    if (!isUnit(result)) return error;
    if (unit === '/min') return { value: 60_000 / result.toNumber('ms') };
    return unit in mathUnit ? { value: result.toNumber(mathUnit[unit]) } : error;
  } catch {
    return error;
  }
}
