import type { Edition } from '#shared/basis/schema/index.ts';
import type { Problem } from '../run/env.ts';
import { type Expansion, expandCombinations, type FactorOf } from './expand.ts';

/** Most expansions remembered. */
const REMEMBERED = 32;

interface Remembered {
  carried: readonly number[];
  /** Every factor asked for, in the order it was asked for. */
  factors: readonly (number | Problem)[];
  asked: readonly (readonly [pattern: number, term: number, action: number])[];
  expansion: Expansion;
}

/**
 * Combinations written out before. Most members of an edition carry the same few sets of actions with the
 * same factors; then only the factors are worked out again, to see that they are the same.
 */
export class ExpansionMemo {
  #known: Remembered[] = [];

  expand(edition: Edition, carried: readonly number[], factorOf: FactorOf, byPattern: boolean): Expansion {
    for (const known of this.#known) {
      if (same(known, carried) && sameFactors(known, factorOf)) return known.expansion;
    }
    const asked: [number, number, number][] = [];
    const factors: (number | Problem)[] = [];
    const values = new Map<string, number | Problem>();
    const recording: FactorOf = (pattern, term, action) => {
      const key = `${pattern},${term},${action}`;
      const before = values.get(key);
      if (before !== undefined) return before;
      const value = factorOf(pattern, term, action);
      values.set(key, value);
      asked.push([pattern, term, action]);
      factors.push(value);
      return value;
    };
    const expansion = expandCombinations(edition, carried, recording, byPattern);
    if (factors.every((factor) => typeof factor === 'number')) {
      if (this.#known.length >= REMEMBERED) this.#known = [];
      this.#known.push({ carried: [...carried], factors, asked, expansion });
    }
    return expansion;
  }
}

function same({ carried }: Remembered, other: readonly number[]): boolean {
  return carried.length === other.length && carried.every((action, i) => action === other[i]);
}

function sameFactors({ asked, factors }: Remembered, factorOf: FactorOf): boolean {
  return asked.every(([pattern, term, action], i) => factorOf(pattern, term, action) === factors[i]);
}
