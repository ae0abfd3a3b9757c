const narrowSpace = '\u202F';
const cache = new Map<string, Intl.NumberFormat>();

function formatter(locale: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = `${locale}${JSON.stringify(options)}`;
  const known = cache.get(key);
  if (known) return known;
  const made = new Intl.NumberFormat(locale, options);
  cache.set(key, made);
  return made;
}

/** A number for reading, with a fixed count of decimals, thousands set apart by a narrow space. */
export function withDecimals(value: number, decimals: number, locale: string): string {
  return joined(
    formatter(locale, { minimumFractionDigits: decimals, maximumFractionDigits: decimals }),
    value,
  );
}

/** A number for reading with this many significant digits, without padding zeros. */
export function withDigits(value: number, digits: number, locale: string): string {
  return joined(formatter(locale, { maximumSignificantDigits: digits }), value);
}

function joined(format: Intl.NumberFormat, value: number): string {
  return format
    .formatToParts(value)
    .map(({ type, value: text }) => (type === 'group' ? narrowSpace : type === 'minusSign' ? '−' : text))
    .join('');
}

/** The sign that separates decimals in a locale. */
export function decimalSignOf(locale: string): '.' | ',' {
  const sign = formatter(locale, {})
    .formatToParts(1.5)
    .find(({ type }) => type === 'decimal')?.value;
  return sign === ',' ? ',' : '.';
}

const raised: Record<string, string> = { '2': '²', '3': '³', '4': '⁴' };

/** A unit for reading: "N/mm²" for "N/mm2", nothing for pure numbers. */
export function unitForReading(unit: string): string {
  if (unit === '1' || unit === 'word') return '';
  if (unit === 'deg') return '°';
  return unit.replace(/(?<=[a-z])[234]/g, (digit) => raised[digit] ?? digit);
}
