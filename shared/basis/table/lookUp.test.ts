import { describe, expect, it } from 'vitest';
import type { Table, TableKey } from '../schema/index.ts';
import { prepareTable } from './lookUp.ts';

const axis = (
  match: TableKey['match'],
  points: TableKey['points'],
  more: Partial<TableKey> = {},
): TableKey => ({
  title: 'Key',
  match,
  unit: '1',
  outside: 'refuse',
  points,
  ...more,
});
const table = (keys: TableKey[], values: Table['values']) =>
  prepareTable({
    id: 't',
    title: 'Table',
    unit: '1',
    keys,
    values,
    provenance: { source: 's', standing: 'invented' },
  });
const value = (t: ReturnType<typeof table>, ...keys: (number | string)[]) => {
  const outcome = t.lookUp(keys);
  return outcome.ok ? outcome.value : outcome.message;
};

describe('table look-up', () => {
  it('finds words exactly and refuses others with what there is', () => {
    const t = table([axis('exact', ['long', 'medium'])], [1, 1.25]);
    expect(value(t, 'medium')).toBe(1.25);
    expect(value(t, 'short')).toMatch(/long, medium/);
  });

  it('gives a band’s edge to its owner', () => {
    const below = table([axis('band', [null, 72, 300, null], { edge: 'below' })], [1, 2, 3]);
    expect([72, 72.0001, 300, 301].map((h) => value(below, h))).toEqual([1, 2, 2, 3]);
    const above = table([axis('band', [null, 72, 300, null], { edge: 'above' })], [1, 2, 3]);
    expect([71.99, 72, 300].map((h) => value(above, h))).toEqual([1, 2, 3]);
  });

  it('refuses or clamps outside bounded bands', () => {
    const points = [100, 200, 300];
    expect(value(table([axis('band', points, { edge: 'below' })], [1, 2]), 100)).toMatch(/outside/);
    const clamped = table([axis('band', points, { edge: 'below', outside: 'clamp' })], [1, 2]);
    expect([50, 400].map((x) => value(clamped, x))).toEqual([1, 2]);
  });

  it('steps down and up', () => {
    const down = table([axis('stepDown', [10, 20, 30])], [1, 2, 3]);
    expect([10, 19.9, 20, 99].map((x) => value(down, x))).toEqual([1, 1, 2, 3]);
    expect(value(down, 9)).toMatch(/outside/);
    const up = table([axis('stepUp', [10, 20, 30])], [1, 2, 3]);
    expect([5, 10, 10.1].map((x) => value(up, x))).toEqual([1, 1, 2]);
    expect(value(up, 31)).toMatch(/outside/);
  });

  it('interpolates straight and in the logarithm', () => {
    const linear = table([axis('linear', [10, 20])], [1, 2]);
    expect(value(linear, 15)).toBe(1.5);
    expect(value(linear, 21)).toMatch(/outside/);
    const log = table([axis('log', [1, 100])], [0, 2]);
    expect(value(log, 10)).toBeCloseTo(1, 12);
  });

  it('works over three keys, interpolating along the last two', () => {
    const t = table(
      [axis('exact', ['a', 'b']), axis('linear', [0, 1]), axis('linear', [0, 10])],
      [0, 10, 100, 110, 1000, 1010, 1100, 1110],
    );
    expect(value(t, 'b', 0.5, 5)).toBe(1055);
    expect(t.explain(['b', 1, 0]).cell).toBe(6);
    expect(t.explain(['b', 0.5, 0]).cell).toBeUndefined();
  });

  it('refuses gaps, words where numbers are needed, and interpolating words', () => {
    expect(value(table([axis('exact', ['a'])], [null]), 'a')).toMatch(/no value/);
    expect(value(table([axis('linear', [0, 1])], [0, 1]), 'a')).toMatch(/needs a number/);
    expect(value(table([axis('linear', [0, 1])], ['x', 'y']), 0.5)).toMatch(/words/);
  });
});
