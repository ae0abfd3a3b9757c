import type { Action, CombinationPattern, Edition } from '#shared/basis/schema/index.ts';
import type { Problem } from '../run/env.ts';

/** More combinations than this are refused: nobody could read them, and they would hold up everyone. */
export const MOST_COMBINATIONS = 400;

/** One action within an expanded combination. */
export interface ExpandedTerm {
  /** Index into the edition's actions. */
  action: number;
  factor: number;
  /** Index of the term in its pattern. */
  term: number;
}

/** A pattern with its actions and factors filled in. */
export interface ExpandedCombination {
  id: string;
  title: string;
  /** Index of the pattern in the edition. */
  pattern: number;
  state: string;
  /** Index into the edition's durations. */
  duration: number;
  leading?: number;
  /** Terms with a factor other than 0, in the edition's order of actions. */
  terms: readonly ExpandedTerm[];
  /** A factor that has no value: the combination can't be used. */
  problem?: Problem;
}

/** Gives the factor on an action, or why there is none. */
export type FactorOf = (pattern: number, term: number, action: number) => number | Problem;

export type Expansion =
  { ok: true; combinations: ExpandedCombination[] } | { ok: false; message: string; pattern: number };

/**
 * Writes out the combination patterns over the actions that a member carries.
 *
 * A pattern with a `leading` term is written once for each variable action that leads, one without such
 * a term once. Actions that exclude each other are never in one combination: each largest set without
 * such a pair is written out, and with `subsets` each smaller one too. A leading pattern on a member
 * without variable actions is written once with nothing leading, so that no member escapes.
 *
 * @param carried Indices of the actions with a load on the member, rising.
 * @param byPattern Whether the pattern matters beside factors and duration, so that like combinations
 *   of different patterns are kept apart.
 */
export function expandCombinations(
  edition: Edition,
  carried: readonly number[],
  factorOf: FactorOf,
  byPattern: boolean,
): Expansion {
  const seen = new Set<string>();
  const ids = new Map<string, number>();
  const combinations: ExpandedCombination[] = [];
  for (let p = 0; p < edition.combinations.length; p += 1) {
    const pattern = edition.combinations[p] as CombinationPattern;
    if (!needsMet(pattern, edition, carried)) continue;
    const sets = variableSets(pattern, edition, carried);
    if (!sets) return tooMany(p, pattern);
    for (const set of sets) {
      for (const leading of leaders(pattern, set)) {
        const combination = write(edition, p, carried, set, leading, factorOf);
        if (!combination) continue;
        const key = keyOf(combination, byPattern);
        if (seen.has(key)) continue;
        seen.add(key);
        const like = (ids.get(combination.id) ?? 0) + 1;
        ids.set(combination.id, like);
        combinations.push(like === 1 ? combination : { ...combination, id: `${combination.id}~${like}` });
        if (combinations.length > MOST_COMBINATIONS) return tooMany(p, pattern);
      }
    }
  }
  return { ok: true, combinations };
}

function tooMany(pattern: number, { title }: CombinationPattern): Expansion {
  const message =
    `The loads on this member give more than ${MOST_COMBINATIONS} combinations. ` +
    `Use fewer actions, or take the smaller sets of actions out of “${title}”.`;
  return { ok: false, pattern, message };
}

const actionAt = (edition: Edition, index: number) => edition.actions[index] as Action;

function needsMet(pattern: CombinationPattern, edition: Edition, carried: readonly number[]): boolean {
  return (pattern.needs ?? []).every((id) => carried.some((index) => actionAt(edition, index).id === id));
}

/** The term of a pattern that takes an action; a list by name comes before the kinds. */
function termFor(pattern: CombinationPattern, action: Action, leads: boolean): number {
  const named = pattern.terms.findIndex(({ of }) => Array.isArray(of) && of.includes(action.id));
  if (named >= 0) return named;
  if (action.nature === 'permanent') return pattern.terms.findIndex(({ of }) => of === 'permanent');
  const role = leads ? 'leading' : 'accompanying';
  const byRole = pattern.terms.findIndex(({ of }) => of === role);
  return byRole >= 0 ? byRole : pattern.terms.findIndex(({ of }) => of === 'variable');
}

/** The sets of variable actions that a pattern is written out for, larger ones first; null: too many. */
function variableSets(
  pattern: CombinationPattern,
  edition: Edition,
  carried: readonly number[],
): readonly (readonly number[])[] | null {
  const variable = carried.filter((index) => {
    const action = actionAt(edition, index);
    return (
      action.nature === 'variable' &&
      (termFor(pattern, action, true) >= 0 || termFor(pattern, action, false) >= 0)
    );
  });
  const clashes = (a: number, b: number) =>
    actionAt(edition, a).excludes?.includes(actionAt(edition, b).id) === true ||
    actionAt(edition, b).excludes?.includes(actionAt(edition, a).id) === true;
  if (pattern.subsets) return compatibleSets(variable, clashes);
  const tied = variable.filter((v) => variable.some((other) => other !== v && clashes(v, other)));
  const free = variable.filter((v) => !tied.includes(v));
  const sets = compatibleSets(tied, clashes);
  return (
    sets
      ?.filter((set) => tied.every((v) => set.includes(v) || set.some((member) => clashes(v, member))))
      .map((set) => [...free, ...set].sort((a, b) => a - b)) ?? null
  );
}

/** Sets tried at most; beyond that there are more than `MOST_COMBINATIONS` in any case. */
const MOST_SETS = 1 << 12;

/** All sets without a clashing pair, larger ones first, each in the order given; null: too many. */
function compatibleSets(
  items: readonly number[],
  clashes: (a: number, b: number) => boolean,
): readonly (readonly number[])[] | null {
  let sets: number[][] = [[]];
  for (const item of items) {
    const grown = sets.filter((set) => !set.some((member) => clashes(item, member)));
    sets = [...sets, ...grown.map((set) => [...set, item])];
    if (sets.length > MOST_SETS) return null;
  }
  return sets.sort((a, b) => b.length - a.length);
}

function leaders(pattern: CombinationPattern, set: readonly number[]): readonly (number | undefined)[] {
  const hasLeader = pattern.terms.some(({ of }) => of === 'leading');
  return hasLeader && set.length > 0 ? set : [undefined];
}

function write(
  edition: Edition,
  p: number,
  carried: readonly number[],
  set: readonly number[],
  leading: number | undefined,
  factorOf: FactorOf,
): ExpandedCombination | null {
  const pattern = edition.combinations[p] as CombinationPattern;
  const terms: ExpandedTerm[] = [];
  let problem: Problem | undefined;
  for (const index of carried) {
    const action = actionAt(edition, index);
    if (action.nature === 'variable' && !set.includes(index)) continue;
    const term = termFor(pattern, action, index === leading);
    if (term < 0) continue;
    const factor = factorOf(p, term, index);
    if (typeof factor !== 'number') problem ??= factor;
    else if (factor !== 0) terms.push({ action: index, factor, term });
  }
  if (terms.length === 0 && !problem) return null;
  return {
    id: idOf(edition, pattern, terms, leading),
    title: titleOf(edition, terms) || pattern.title,
    pattern: p,
    state: pattern.state,
    duration: durationOf(edition, pattern, terms),
    ...(leading === undefined ? {} : { leading }),
    terms,
    ...(problem ? { problem } : {}),
  };
}

/** The fixed duration of the pattern, else that of the shortest-lived action. */
function durationOf(edition: Edition, pattern: CombinationPattern, terms: readonly ExpandedTerm[]): number {
  const at = (id: string) => edition.durations.findIndex((duration) => duration.id === id);
  if (pattern.duration !== undefined) return at(pattern.duration);
  return terms.reduce(
    (shortest, { action }) => Math.max(shortest, at(actionAt(edition, action).duration)),
    0,
  );
}

function idOf(
  edition: Edition,
  pattern: CombinationPattern,
  terms: readonly ExpandedTerm[],
  leading: number | undefined,
): string {
  const ordered = [...terms].sort((a, b) => Number(b.action === leading) - Number(a.action === leading));
  const variable = ordered.filter(({ action }) => actionAt(edition, action).nature === 'variable');
  const ids = (variable.length ? variable : ordered).map(({ action }) => actionAt(edition, action).id);
  return `${pattern.id}/${ids.join('+')}`;
}

/** The combination in symbols, such as "1.35 G + 1.5 Q". Rounded for reading; exact in the terms. */
function titleOf(edition: Edition, terms: readonly ExpandedTerm[]): string {
  return terms
    .map(({ action, factor }) => {
      const size = Math.abs(factor);
      const number = size === 1 ? '' : `${String(Number(size.toPrecision(4)))} `;
      return { sign: factor < 0 ? '−' : '+', text: `${number}${actionAt(edition, action).symbol}` };
    })
    .map(({ sign, text }, i) => (i === 0 ? (sign === '−' ? `−${text}` : text) : ` ${sign} ${text}`))
    .join('');
}

function keyOf(
  { pattern, state, duration, terms, problem }: ExpandedCombination,
  byPattern: boolean,
): string {
  const factors = terms.map(({ action, factor }) => `${action}:${factor}`).join(',');
  return `${byPattern ? pattern : ''}|${state}|${duration}|${factors}|${problem ? pattern : ''}`;
}
