import { describe, expect, it } from 'vitest';
import { numbersFor } from './locale.ts';

describe('numbers as a person reads them', () => {
  it('follow the locale’s decimal sign, with a narrow space between thousands', () => {
    const english = numbersFor('en-GB');
    const german = numbersFor('de-DE');
    expect(english.decimals(12345.678, 2)).toBe('12\u202F345.68');
    expect(german.decimals(12345.678, 2)).toBe('12\u202F345,68');
    expect(english.digits(0.012345, 3)).toBe('0.0123');
    expect(german.exact(1234.5)).toBe('1234,5');
    expect(english.exact(-0.25)).toBe('-0.25');
    expect(german.format).toEqual({ decimal: ',' });
  });
});
