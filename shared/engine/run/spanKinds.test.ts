import { describe, expect, it } from 'vitest';
import type { BeamLoad } from '#shared/analysis/types.ts';
import { loadForm, spanKind } from './spanKinds.ts';

const line = (from: number, to: number, start = 1, end = start): BeamLoad => ({
  kind: 'line',
  from,
  to,
  startIntensity: start,
  endIntensity: end,
});
const point = (x: number, force = 1): BeamLoad => ({ kind: 'point', x, force });

describe('spanKind', () => {
  it('tells spans apart by what the member does at their ends', () => {
    expect(spanKind(['pin', 'pin'], 0)).toBe('simple');
    expect(spanKind(['fixed', 'pin'], 0)).toBe('end');
    expect(spanKind(['fixed', 'fixed'], 0)).toBe('inner');
    expect(spanKind(['pin', 'pin', 'pin', 'pin'], 0)).toBe('end');
    expect(spanKind(['pin', 'pin', 'pin', 'pin'], 1)).toBe('inner');
    expect(spanKind(['pin', 'pin', 'free'], 1)).toBe('cantilever');
    expect(spanKind(['free', 'pin', 'pin'], 0)).toBe('cantilever');
  });
});

describe('loadForm', () => {
  it('looks at the loads of its own span only', () => {
    expect(loadForm([line(10, 20)], 0, 10, false)).toBe('none');
    expect(loadForm([line(10, 20)], 0, 10, true)).toBe('end-moment');
    expect(loadForm([line(0, 20)], 0, 10, true)).toBe('uniform');
    expect(loadForm([point(5), point(15)], 0, 10, true)).toBe('point');
  });

  it('calls everything else mixed', () => {
    expect(loadForm([line(0, 10), point(5)], 0, 10, true)).toBe('mixed');
    expect(loadForm([line(0, 5)], 0, 10, true)).toBe('mixed');
    expect(loadForm([line(0, 10, 1, 2)], 0, 10, true)).toBe('mixed');
    expect(loadForm([{ kind: 'couple', x: 5, moment: 1 }], 0, 10, true)).toBe('mixed');
  });

  it('counts a point load at a free end, not one over a support', () => {
    expect(loadForm([point(10)], 0, 10, true)).toBe('end-moment');
    expect(loadForm([point(10)], 0, 10, true, { left: false, right: true })).toBe('point');
    expect(loadForm([point(0)], 0, 10, true, { left: true, right: false })).toBe('point');
    expect(loadForm([line(0, 10), point(10)], 0, 10, true, { left: false, right: true })).toBe('mixed');
    expect(loadForm([point(0)], 0, 10, true, { left: false, right: true })).toBe('end-moment');
  });
});
