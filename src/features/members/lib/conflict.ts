import type { Member } from '#shared/basis/schema/index.ts';

/** One place where two versions of a member differ, by JSON pointer. */
export interface Difference {
  pointer: string;
  mine: unknown;
  theirs: unknown;
  /** Both sides changed it, to different values: someone has to choose. */
  clash: boolean;
}

type Json = unknown;
const isObject = (value: Json): value is Record<string, Json> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);
const same = (a: Json, b: Json): boolean => JSON.stringify(a) === JSON.stringify(b);
const escape = (key: string): string => key.replaceAll('~', '~0').replaceAll('/', '~1');

function walk(base: Json, mine: Json, theirs: Json, pointer: string, found: Difference[]): void {
  if (same(mine, theirs)) return;
  if (isObject(mine) && isObject(theirs)) {
    const before = isObject(base) ? base : {};
    for (const key of new Set([...Object.keys(mine), ...Object.keys(theirs)])) {
      walk(before[key], mine[key], theirs[key], `${pointer}/${escape(key)}`, found);
    }
    return;
  }
  found.push({ pointer, mine, theirs, clash: !same(base, mine) && !same(base, theirs) });
}

/**
 * Where two people's versions of a member differ, given the version both started from. Lists are compared
 * as wholes: two people's rows of loads can't be told apart by position.
 */
export function differences(base: Member, mine: Member, theirs: Member): Difference[] {
  const found: Difference[] = [];
  walk(base, mine, theirs, '', found);
  return found;
}

/**
 * The merged member: for each difference, mine or theirs. Without a choice the side that changed is taken,
 * and for a clash mine.
 */
export function merge(
  base: Member,
  mine: Member,
  theirs: Member,
  choices: Readonly<Record<string, 'mine' | 'theirs'>>,
): Member {
  const pick = (b: Json, m: Json, t: Json, pointer: string): Json => {
    if (same(m, t)) return m;
    if (isObject(m) && isObject(t)) {
      const before = isObject(b) ? b : {};
      const keys = new Set([...Object.keys(m), ...Object.keys(t)]);
      return Object.fromEntries(
        [...keys]
          .map((key) => [key, pick(before[key], m[key], t[key], `${pointer}/${escape(key)}`)] as const)
          .filter(([, value]) => value !== undefined),
      );
    }
    const choice = choices[pointer] ?? (same(b, m) ? 'theirs' : 'mine');
    return choice === 'mine' ? m : t;
  };
  return pick(base, mine, theirs, '') as Member;
}
