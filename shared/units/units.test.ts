import { describe, expect, it } from 'vitest';
import { decimalSignOf, unitForReading, withDecimals, withDigits } from './format.ts';
import { readNumber, readQuantity } from './quantity.ts';
import { coherentUnit, convert, dimensionInWords, unitOf } from './units.ts';

const point = { decimal: '.' } as const;
const comma = { decimal: ',' } as const;

describe('units', () => {
  it.each([
    [1, 'in', 'mm', 25.4],
    [1, 'lbf', 'N', 4.4482216152605],
    [1, 'psi', 'N/mm2', 4.4482216152605 / 25.4 ** 2],
    [1, 'kN/m2', 'psf', 20.88543423],
    [1, 'plf', 'N/m', 14.5939029],
    [12, 'ft', 'm', 3.6576],
    [2.5, 'GPa', 'N/mm2', 2500],
    [1, 'pcf', 'kg/m3', 16.01846337],
  ])('%d %s is … %s', (value, from, to, wanted) => {
    expect(convert(value, from, to)).toBeCloseTo(wanted, 7);
  });

  it('is exact within a system', () => {
    expect(convert(0.1, 'N/mm2', 'N/mm2')).toBe(0.1);
    expect(convert(7.5, 'MPa', 'N/mm2')).toBe(7.5);
    expect(convert(3, 'kN/m', 'N/mm')).toBe(3);
  });

  it('refuses to convert between kinds, and unknown units', () => {
    expect(convert(1, 'mm', 'N')).toBeUndefined();
    expect(convert(1, 'furlong', 'mm')).toBeUndefined();
  });

  it('finds coherent units and says dimensions in words', () => {
    expect(coherentUnit({ length: -2, force: 1, density: 0 }, 'metric')).toBe('N/mm2');
    expect(coherentUnit({ length: -2, force: 1, density: 0 }, 'inch-pound')).toBe('psi');
    expect(dimensionInWords(unitOf('N/mm2')?.dimension ?? { length: 9, force: 9, density: 9 })).toBe(
      'force / length²',
    );
    expect(dimensionInWords({ length: 0, force: 0, density: 0 })).toBe('a pure number');
  });
});

describe('what people type', () => {
  it.each([
    ['3600', 'mm', 3600],
    ['3.6 m', 'mm', 3600],
    ['3.6m', 'mm', 3600],
    ['12 ft 6 in', 'in', 150],
    ['12\' 6"', 'in', 150],
    ['12 ft 6 in', 'mm', 3810],
    ['1.5 kN/m2', 'kN/m2', 1.5],
    ['1.5 kN/m²', 'kN/m2', 1.5],
    ['30 psf', 'psf', 30],
    ['30 psf', 'kN/m2', 1.4364],
    ['2.31 kN', 'kN', 2.31],
    ['5 kN m', 'kN m', 5],
    ['-0.5', 'kN/m2', -0.5],
    ['10 800', 'N/mm2', 10800],
    ['1,234', 'mm', 1234],
    ['0.5', '1', 0.5],
    ['12 %', '1', 0.12],
  ])('%s in %s', (text, unit, wanted) => {
    const outcome = readQuantity(text, unit, point);
    expect(outcome.ok ? outcome.value : outcome.message).toBeCloseTo(wanted, 4);
  });

  it('takes a decimal comma from those who write one', () => {
    expect(readNumber('1,5', comma)).toBe(1.5);
    expect(readNumber('1.234,5', comma)).toBe(1234.5);
    expect(readQuantity('1,5 kN/m2', 'kN/m2', comma)).toEqual({ ok: true, value: 1.5 });
    expect(readNumber('0,125', point)).toBe(0.125);
  });

  it.each([
    ['', 'A value is needed'],
    ['tall', 'can’t be read'],
    ['3 kN', 'not in kN'],
    ['3 parsecs', 'not a unit'],
    ['1e999', 'too large'],
    ['3.6.6', 'can’t be read'],
  ])('refuses “%s” with a reason', (text, reason) => {
    const outcome = readQuantity(text, 'mm', point);
    expect(outcome.ok ? '' : outcome.message).toContain(reason);
  });
});

describe('numbers for reading', () => {
  it('keeps decimals, groups with a narrow space and follows the locale', () => {
    expect(withDecimals(10800, 0, 'en-GB')).toBe('10\u202F800');
    expect(withDecimals(-1.5, 2, 'en-GB')).toBe('−1.50');
    expect(withDecimals(1.5, 2, 'de-DE')).toBe('1,50');
    expect(withDigits(1.02253, 4, 'en-GB')).toBe('1.023');
    expect(decimalSignOf('fr-FR')).toBe(',');
  });

  it('sets units', () => {
    expect(unitForReading('N/mm2')).toBe('N/mm²');
    expect(unitForReading('1')).toBe('');
  });
});
