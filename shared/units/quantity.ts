import { convert, sameDimension, unitOf, unitSymbols } from './units.ts';

/** How numbers are written: which sign separates decimals. */
export interface NumberFormat {
  decimal: '.' | ',';
}

export type QuantityOutcome = { ok: true; value: number } | { ok: false; message: string };

/** Spellings people use beside the unit's own symbol. */
const spellings: Record<string, string> = {
  "'": 'ft',
  '"': 'in',
  '′': 'ft',
  '″': 'in',
  'kN/m²': 'kN/m2',
  'N/mm²': 'N/mm2',
  kNm: 'kN m',
  'kN·m': 'kN m',
  'lb/ft2': 'psf',
  'lb/ft': 'plf',
  lbs: 'lbf',
  lb: 'lbf',
  metre: 'm',
  inch: 'in',
  feet: 'ft',
  'kg/m³': 'kg/m3',
  '°': 'deg',
};
const byLowerCase = new Map(unitSymbols.map((symbol) => [symbol.toLowerCase(), symbol]));

function unitNamed(text: string): string | undefined {
  const name = text.trim().replace(/\s+/g, ' ');
  if (unitOf(name)) return name;
  return spellings[name] ?? byLowerCase.get(name.toLowerCase());
}

/**
 * Reads a number as people write it: either decimal sign, thousands set apart by spaces (or by the sign that
 * is not the decimal one, in threes). Undefined when it is not a number.
 */
export function readNumber(text: string, { decimal }: NumberFormat): number | undefined {
  let body = text
    .trim()
    .replace(/[\s\u00A0\u202F\u2009]/g, '')
    .replace(/^[−–]/, '-');
  const other = decimal === '.' ? ',' : '.';
  const grouped = new RegExp(`^[-+]?\\d{1,3}(\\${other}\\d{3})+(\\${decimal}\\d+)?$`);
  if (grouped.test(body) && (body.includes(decimal) || body.split(other).length > 2 || decimal === '.')) {
    // "1,234" where the point is decimal, "1.234,5" where the comma is.
    if (body.split(other).length > 2 || body.includes(decimal) || /^[-+]?[1-9]\d{0,2},\d{3}$/.test(body)) {
      body = body.replaceAll(other, '');
    }
  }
  body = body.replace(',', '.');
  return /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(body) ? Number(body) : undefined;
}

/**
 * Reads what a person typed into a field: "3600", "3.6 m", "12 ft 6 in", "1,5 kN/m2", "30 psf".
 *
 * @param text As typed.
 * @param unit Unit of the field; a number without a unit is taken in it, and the value comes back in it.
 */
export function readQuantity(text: string, unit: string, format: NumberFormat): QuantityOutcome {
  const trimmed = text.trim();
  if (trimmed === '') return { ok: false, message: 'A value is needed here.' };
  const plain = readNumber(trimmed, format);
  if (plain !== undefined) return finite(plain);
  const parts = [
    ...trimmed.matchAll(
      /([-+−]?\d[\d.,\s\u00A0\u202F]*(?:e[-+]?\d+)?)\s*([^\d\s][^\d]*?(?:\/[a-z]+[23²³]?|[23²³])?)(?=\s*[-+−]?\d|\s*$)/giu,
    ),
  ];
  const whole = parts
    .map((part) => part[0])
    .join('')
    .replace(/\s/g, '');
  if (parts.length === 0 || whole !== trimmed.replace(/\s/g, '')) {
    return { ok: false, message: `“${trimmed}” can’t be read as a number with a unit.` };
  }
  let sum = 0;
  for (const [, number = '', name = ''] of parts) {
    const value = readNumber(number, format);
    const symbol = unitNamed(name);
    if (value === undefined) return { ok: false, message: `“${number.trim()}” is not a number.` };
    if (symbol === undefined)
      return { ok: false, message: `“${name.trim()}” is not a unit that is known here.` };
    const converted = convert(value, symbol, unit);
    if (converted === undefined) {
      return {
        ok: false,
        message: `A value in ${unit === '1' ? 'plain numbers' : unit} is needed here, not in ${symbol}.`,
      };
    }
    sum += parts.length > 1 && sum < 0 ? -converted : converted;
  }
  return finite(sum);
}

function finite(value: number): QuantityOutcome {
  return Number.isFinite(value) ? { ok: true, value } : { ok: false, message: 'The number is too large.' };
}

/** Whether two unit symbols measure the same kind of thing. */
export function measuresTheSame(a: string, b: string): boolean {
  const [one, other] = [unitOf(a), unitOf(b)];
  return one !== undefined && other !== undefined && sameDimension(one.dimension, other.dimension);
}
