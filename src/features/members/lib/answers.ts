import { curves, drivers, nextInStock, requiredDepth } from '#shared/engine/index.ts';
import type { Curves, Driver, Member, Plan, RequiredDepth, StockSection } from '#shared/engine/types.ts';

/** What is looked at, not waited for: curves, drivers, least depths, next section. */
export interface Answers {
  curves: Curves | null;
  drivers: readonly Driver[];
  depth: RequiredDepth | null;
  next: StockSection | null;
}

export const noAnswers: Answers = { curves: null, drivers: [], depth: null, next: null };

/** Works the answers out; takes too long for a keystroke, so it is done beside the page. */
export function answersFor(plan: Plan, member: Member, stock: readonly StockSection[]): Answers {
  return {
    curves: curves(plan, member),
    drivers: drivers(plan, member),
    depth: requiredDepth(plan, member),
    next: nextInStock(plan, member, stock),
  };
}
