import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pure } from '#shared/units/units.ts';
import { compare, type FactValue } from '../condition/compare.ts';
import type { FactRange } from '../facts.ts';
import type { Condition } from '../schema/index.ts';
import { partition } from './partition.ts';
import type { SymbolInfo } from './plan.ts';

const info = (symbol: string, more: Partial<SymbolInfo>): SymbolInfo => ({
  symbol,
  title: symbol,
  origin: 'builtIn',
  index: 0,
  unit: '1',
  level: 'member',
  pointer: '',
  ...more,
});
const symbolsWith = (range: FactRange) =>
  new Map([
    ['x', info('x', { dimension: pure, range })],
    ['n', info('n', { dimension: pure, range: { from: 1, whole: true } })],
    ['w', info('w', { words: ['dry', 'wet', 'damp'] })],
  ]);

const comparison: fc.Arbitrary<Condition> = fc.oneof(
  fc.record({
    fact: fc.constantFrom('x', 'n'),
    operator: fc.constantFrom(
      'equal' as const,
      'notEqual' as const,
      'lessThan' as const,
      'lessThanInclusive' as const,
      'greaterThan' as const,
      'greaterThanInclusive' as const,
    ),
    value: fc.oneof(fc.integer({ min: -3, max: 6 }), fc.double({ noNaN: true, noDefaultInfinity: true })),
  }),
  fc.record({
    fact: fc.constant('w'),
    operator: fc.constantFrom('in' as const, 'notIn' as const),
    value: fc.subarray(['dry', 'wet', 'damp'], { minLength: 1 }),
  }),
);
const { condition } = fc.letrec<{ condition: Condition }>((tie) => ({
  condition: fc.oneof(
    { maxDepth: 3 },
    comparison,
    fc.record({ all: fc.array(tie('condition'), { minLength: 1, maxLength: 3 }) }),
    fc.record({ any: fc.array(tie('condition'), { minLength: 1, maxLength: 3 }) }),
    fc.record({ not: tie('condition') }),
  ),
}));

function holds(when: Condition, facts: Readonly<Record<string, FactValue>>): boolean {
  if ('all' in when) return when.all.every((each) => holds(each, facts));
  if ('any' in when) return when.any.some((each) => holds(each, facts));
  if ('not' in when) return !holds(when.not, facts);
  return compare(when.operator, facts[when.fact] ?? NaN, when.value as FactValue);
}

const ranges: fc.Arbitrary<FactRange> = fc.constantFrom(
  {},
  { above: 0 },
  { from: 0 },
  { from: 0, to: 5 },
  { from: 2, to: 2 },
);
const inRange = ({ above = -Infinity, from = -Infinity, to = Infinity }: FactRange) =>
  fc
    .oneof(fc.integer({ min: -4, max: 7 }), fc.double({ noNaN: true, noDefaultInfinity: true }))
    .filter((x) => x > above && x >= from && x <= to);

describe('a partition into situations', () => {
  it('has a situation for each set of facts, in which every condition comes out the same', () => {
    fc.assert(
      fc.property(
        ranges.chain((range) => fc.tuple(fc.constant(range), inRange(range))),
        fc.integer({ min: 1, max: 8 }),
        fc.constantFrom('dry', 'wet', 'damp'),
        fc.array(condition, { minLength: 1, maxLength: 3 }),
        ([range, x], n, w, conditions) => {
          const space = partition(conditions, symbolsWith(range));
          fc.pre(space.count <= 20_000);
          const tests = conditions.map((each) => space.testOf(each));
          const wanted = conditions.map((each) => holds(each, { x, n, w })).join();
          const seen = new Set<string>();
          for (const situation of space.situations()) seen.add(tests.map((test) => test(situation)).join());
          expect(seen).toContain(wanted);
        },
      ),
      { numRuns: 1500 },
    );
  });

  it('has no situation that can’t be, where facts don’t hang together', () => {
    fc.assert(
      fc.property(ranges, condition, (range, when) => {
        const space = partition([when], symbolsWith(range));
        fc.pre(space.count <= 5000);
        const test = space.testOf(when);
        for (const situation of space.situations()) {
          const facts = Object.fromEntries(
            space
              .say(situation)
              .split(', ')
              .map((text) => {
                const [fact = '', value = ''] = text.split(' = ');
                return [fact, fact === 'w' ? value : Number(value)];
              }),
          );
          expect(test(situation)).toBe(holds(when, facts));
          const { x = range.from ?? 1, n = 1 } = facts as { x?: number; n?: number };
          expect(
            x > (range.above ?? -Infinity) && x >= (range.from ?? -Infinity) && x <= (range.to ?? Infinity),
          ).toBe(true);
          expect(Number.isInteger(n) && n >= 1).toBe(true);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('counts its situations and its work', () => {
    const when: Condition = {
      all: [
        { fact: 'x', operator: 'lessThan', value: 3 },
        { fact: 'w', operator: 'equal', value: 'wet' },
      ],
    };
    const space = partition([when], symbolsWith({}));
    expect(space).toMatchObject({ count: 9, comparisons: 2, related: false });
    expect([...space.situations()]).toHaveLength(9);
  });
});
