import { describe, expect, it } from 'vitest';
import { nextMark } from './firstMember.ts';

describe('the next mark', () => {
  it('counts on from the last and skips what is taken', () => {
    expect(nextMark([])).toBe('B1');
    expect(nextMark(['J1', 'J2'])).toBe('J3');
    expect(nextMark(['J3', 'j2', 'J1'])).toBe('J4');
    expect(nextMark(['Lintel'])).toBe('Lintel1');
  });
});
