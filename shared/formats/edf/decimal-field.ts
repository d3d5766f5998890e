/**
 * The longest decimal of `value` that fits into a field of `width` characters, without exponent or digit grouping:
 * full precision when it fits, otherwise rounded. Throws when even its whole part does not fit.
 */
export function decimalField(value: number, width: number): string {
  for (let decimals = width; decimals >= 0; decimals--) {
    const fixed = value.toFixed(decimals);
    const text = decimals > 0 ? fixed.replace(/\.?0+$/u, '') : fixed;
    if (text.length <= width) return text === '-0' ? '0' : text;
  }
  throw new RangeError(`${value} does not fit into ${width} characters`);
}
