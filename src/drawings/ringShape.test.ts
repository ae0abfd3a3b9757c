import { describe, expect, it } from 'vitest';
import { ringPath } from './ringShape.ts';

describe('a growth ring', () => {
  it('is always the same for the same ring, and differs from the next', () => {
    expect(ringPath(50, 20, 1)).toBe(ringPath(50, 20, 1));
    expect(ringPath(50, 20, 1)).not.toBe(ringPath(50, 20, 2));
  });

  it('stays close to its radius, so that rings never cross', () => {
    const numbers = ringPath(0, 100, 3).match(/-?\d+\.\d+,-?\d+\.\d+/g) ?? [];
    const radii = numbers.map((pair) => Math.hypot(...(pair.split(',').map(Number) as [number, number])));
    expect(Math.min(...radii)).toBeGreaterThan(88);
    expect(Math.max(...radii)).toBeLessThan(116);
  });
});
