import { describe, expect, it } from 'vitest';
import { areaToLine, slopeFactor, verticalReaction } from './slope.ts';

const thirty = Math.PI / 6;

describe('loads on a slope', () => {
  it('level members take every load whole and across', () => {
    for (const load of ['onSlope', 'onPlan', 'normal'] as const) {
      expect(slopeFactor(load, 0)).toEqual({ normal: 1, along: 0 });
    }
  });

  it('at 30°: on the slope cos 30°, on plan cos² 30°, at right angles whole', () => {
    expect(slopeFactor('onSlope', thirty).normal).toBeCloseTo(Math.sqrt(3) / 2, 14);
    expect(slopeFactor('onSlope', thirty).along).toBeCloseTo(0.5, 14);
    expect(slopeFactor('onPlan', thirty).normal).toBeCloseTo(0.75, 14);
    expect(slopeFactor('onPlan', thirty).along).toBeCloseTo(Math.sqrt(3) / 4, 14);
    expect(slopeFactor('normal', thirty)).toEqual({ normal: 1, along: 0 });
  });

  it('the components add up to the vertical load: on plan it is spread over a longer member', () => {
    const { normal, along } = slopeFactor('onPlan', 0.6);
    expect(Math.hypot(normal, along)).toBeCloseTo(Math.cos(0.6), 14);
  });

  it('the supports carry the whole vertical load: w L / 2 each, L along the slope', () => {
    const acrossEach = (slopeFactor('onSlope', thirty).normal * 5) / 2;
    expect(verticalReaction(acrossEach, thirty)).toBeCloseTo(2.5, 14);
  });

  it.each([-0.1, Math.PI / 2, NaN])('a slope of %d is refused', (angle) => {
    expect(() => slopeFactor('onPlan', angle)).toThrow(RangeError);
  });
});

it('a joist at 0.4 m carries 0.4 of each square metre', () => {
  expect(areaToLine(1.5, 0.4)).toBeCloseTo(0.6, 14);
});
