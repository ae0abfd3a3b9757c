import { describe, expect, it } from 'vitest';
import { arrangements, clipToSpans } from './arrangements.ts';
import type { BeamLoad, Restraint } from './types.ts';

const pins = (count: number) => Array.from({ length: count }, (): Restraint => 'pin');

describe('arrangements', () => {
  it('of one span: loaded', () => {
    expect(arrangements(1, pins(2))).toEqual([[0]]);
  });

  it('of two spans: both, and each alone', () => {
    expect(arrangements(2, pins(3))).toEqual([[0, 1], [0], [1]]);
  });

  it('of three spans: outer, centre, two adjacent, and what these leave', () => {
    expect(arrangements(3, pins(4))).toEqual([[0, 1, 2], [0, 2], [1], [0, 1], [2], [1, 2], [0]]);
  });

  it('of four spans hold the set that hogs most over the second support: 1, 2 and 4', () => {
    expect(arrangements(4, pins(5))).toContainEqual([0, 1, 3]);
  });

  it('count overhangs as spans', () => {
    expect(arrangements(2, ['pin', 'pin', 'free'])).toEqual([[0, 1], [0], [1]]);
  });

  it('grow with the spans, not with their sets, and repeat none', () => {
    const sets = arrangements(12, pins(13));
    expect(sets.length).toBe(3 + 2 * 11);
    expect(new Set(sets.map((set) => set.join())).size).toBe(sets.length);
  });
});

describe('loads on some spans', () => {
  const beam = { spans: [2, 3, 4] };
  const ramp: BeamLoad = { kind: 'line', from: 1, to: 6, startIntensity: 0, endIntensity: 10 };

  it('line loads are cut at the supports and keep their slope', () => {
    expect(clipToSpans([ramp], beam, [1])).toEqual([
      { kind: 'line', from: 2, to: 5, startIntensity: 2, endIntensity: 8 },
    ]);
    expect(clipToSpans([ramp], beam, [0, 2])).toEqual([
      { kind: 'line', from: 1, to: 2, startIntensity: 0, endIntensity: 2 },
      { kind: 'line', from: 5, to: 6, startIntensity: 8, endIntensity: 10 },
    ]);
  });

  it('a load on a support belongs to the span on its left, at the start to the first', () => {
    const loads: BeamLoad[] = [0, 2, 9].map((x) => ({ kind: 'point', x, force: 1 }));
    expect(clipToSpans(loads, beam, [0])).toEqual([loads[0], loads[1]]);
    expect(clipToSpans(loads, beam, [1])).toEqual([]);
    expect(clipToSpans(loads, beam, [2])).toEqual([loads[2]]);
  });

  it('a load that rounding puts beyond the last support is not lost', () => {
    const load: BeamLoad = { kind: 'couple', x: 9 + 1e-14, moment: 1 };
    expect(clipToSpans([load], beam, [0, 1, 2])).toEqual([load]);
  });
});
