import { describe, expect, it } from 'vitest';
import { day, moment } from './time.ts';

const now = new Date(2026, 11, 1, 15, 0);
const at = (...parts: [number, number, number, number, number]) => new Date(...parts).toISOString();

describe('moments for reading', () => {
  it('gives the time today, the day this year, the year before', () => {
    expect(moment(at(2026, 11, 1, 9, 5), now)).toBe('09:05');
    expect(moment(at(2026, 2, 12, 9, 5), now)).toBe('12 March, 09:05');
    expect(moment(at(2025, 2, 12, 9, 5), now)).toBe('12 March 2025');
    expect(day(at(2026, 2, 12, 9, 5))).toBe('12 March 2026');
  });
});
