import { useDeferredValue, useMemo } from 'react';
import { withProjectChoices } from '#shared/basis/inherit.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { check, compile, curves, drivers, nextInStock, requiredDepth } from '#shared/engine/index.ts';
import type { Curves, Driver, Plan, RequiredDepth, Result, StockSection } from '#shared/engine/types.ts';

/** A compiled edition, once for each document. */
export function usePlan(edition: Edition | undefined): Plan | null {
  return useMemo(() => {
    if (!edition) return null;
    const outcome = compile(edition);
    return outcome.ok ? outcome.plan : null;
  }, [edition]);
}

/** The verdict at once; what is only looked at is worked out when the keyboard rests. */
export function useVerdict(
  plan: Plan | null,
  member: Member,
  projectChoices: Readonly<Record<string, string>>,
) {
  const whole = useMemo(
    () => (plan ? withProjectChoices(plan.edition, projectChoices, member) : member),
    [plan, projectChoices, member],
  );
  const result: Result | null = useMemo(() => (plan ? check(plan, whole) : null), [plan, whole]);
  return { whole, result };
}

export interface Answers {
  curves: Curves | null;
  drivers: readonly Driver[];
  depth: RequiredDepth | null;
  next: StockSection | null;
}

/** The slower answers, on the last member for which there was time. */
export function useAnswers(plan: Plan | null, member: Member, stock: readonly StockSection[]): Answers {
  const rested = useDeferredValue(member);
  return useMemo(() => {
    if (!plan) return { curves: null, drivers: [], depth: null, next: null };
    return {
      curves: curves(plan, rested),
      drivers: drivers(plan, rested),
      depth: requiredDepth(plan, rested),
      next: nextInStock(plan, rested, stock),
    };
  }, [plan, rested, stock]);
}
