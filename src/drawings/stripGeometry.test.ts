import { describe, expect, it } from 'vitest';
import type { Curves } from '#shared/engine/types.ts';
import { bandOf, extentOf, nearestSample, readAt, spreadLabels } from './stripGeometry.ts';

const curves: Curves = {
  x: [0, 1, 2],
  byCombination: { C1: { V: [3, 0, -3], M: [0, 2, 0], w: [0, 1, 0] } },
  envelope: {
    V: { most: [5, 1, 0], least: [0, -1, -5] },
    M: { most: [0, 4, 0], least: [0, -1, 0] },
    w: { most: [0, 2, 0], least: [0, 0, 0] },
  },
  peaks: [],
};

describe('member strip geometry', () => {
  it('fills one combination between its curve and zero', () => {
    expect(bandOf(curves, 'V', 'C1')).toEqual({ most: [3, 0, 0], least: [0, 0, -3] });
  });

  it('takes the envelope when no combination, or one that is gone, is asked for', () => {
    expect(bandOf(curves, 'M', null)).toBe(curves.envelope.M);
    expect(bandOf(curves, 'M', 'C9')).toBe(curves.envelope.M);
  });

  it('reads the larger edge at the nearest sample', () => {
    expect(nearestSample(curves.x, 1.6)).toBe(2);
    expect(readAt(curves.envelope.V, 2)).toBe(-5);
  });

  it('never gives an empty range', () => {
    expect(extentOf({ most: [0, 0], least: [0, 0] })).toEqual([-1, 1]);
    expect(extentOf({ most: [2, 3], least: [1, 2] })).toEqual([0, 3]);
  });

  it('spreads labels without changing their order', () => {
    expect(spreadLabels([10, 12, 40], 12)).toEqual([10, 22, 40]);
    expect(spreadLabels([12, 10], 12)).toEqual([22, 10]);
  });
});
