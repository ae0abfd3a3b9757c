import { describe, expect, it } from 'vitest';
import { layOut, type Layout, placeOn, type SpanRule } from './geometry.ts';

const layout = (change: Partial<Layout> = {}): Layout => ({
  measured: 'clear',
  lengths: [3000, 2000],
  restraints: ['pin', 'pin', 'pin'],
  bearings: [100, 80, 60],
  cosine: 1,
  ...change,
});

function spans(change: Partial<Layout>, rule: SpanRule): number[] {
  const outcome = layOut(layout(change), rule);
  if (!outcome.ok) throw new Error(outcome.findings.map(({ message }) => message).join());
  return outcome.geometry.spans.map(({ length }) => length);
}

describe('layOut', () => {
  it('works centre to centre of bearings', () => {
    expect(spans({}, { rule: 'centres' })).toEqual([3090, 2070]);
    expect(spans({ measured: 'centres' }, { rule: 'centres' })).toEqual([3000, 2000]);
  });

  it('adds an allowance to the clear span at each end', () => {
    const rule: SpanRule = { rule: 'clearPlus', allowance: 25 };
    expect(spans({}, rule)).toEqual([3050, 2050]);
    expect(spans({ measured: 'centres' }, rule)).toEqual([3000 - 90 + 50, 2000 - 70 + 50]);
    expect(spans({ measured: 'centres', bearings: [null, null, null] }, rule)).toEqual([3000, 2000]);
  });

  it('adds nothing at a free end', () => {
    expect(spans({ restraints: ['pin', 'pin', 'free'] }, { rule: 'centres' })).toEqual([3090, 2040]);
  });

  it('goes along the slope', () => {
    const [first] = spans({ measured: 'centres', cosine: 0.8 }, { rule: 'centres' });
    expect(first).toBe(3750);
  });

  it('says which support lacks a bearing', () => {
    const outcome = layOut(layout({ bearings: [100, null, 60] }), { rule: 'centres' });
    expect(outcome.ok).toBe(false);
    expect(!outcome.ok && outcome.findings.map(({ code, pointer }) => [code, pointer])).toEqual([
      ['bearing-missing', '/supports/1/bearing'],
    ]);
  });

  it('refuses a span that its supports leave nothing of', () => {
    const outcome = layOut(layout({ measured: 'centres', lengths: [40, 2000] }), {
      rule: 'clearPlus',
      allowance: 0,
    });
    expect(!outcome.ok && outcome.findings[0]?.code).toBe('span-too-short');
  });
});

describe('placeOn', () => {
  const outcome = layOut(layout(), { rule: 'centres' });
  if (!outcome.ok) throw new Error('no geometry');
  const { geometry } = outcome;

  it('puts the ends of measured spans on the nodes', () => {
    expect([0, 3000, 5000].map((x) => placeOn(geometry, x))).toEqual([0, 3090, 5160]);
  });

  it('measures from the face of the support inside a span', () => {
    expect(placeOn(geometry, 1000)).toBe(1050);
    expect(placeOn(geometry, 3500)).toBe(3090 + 40 + 500);
  });

  it('finds no place outside the member', () => {
    expect(placeOn(geometry, -1)).toBeNull();
    expect(placeOn(geometry, 5001)).toBeNull();
    expect(placeOn(geometry, Number.NaN)).toBeNull();
  });
});
