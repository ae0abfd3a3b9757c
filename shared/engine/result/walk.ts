import { type Assessment, atCombination, atMember, atPlace, type Spot } from '../assess/assess.ts';
import type { Standing } from '../assess/stand.ts';

/** Where a check governs; for a refusal or a missing answer the first such place. */
export function spotOf({ refused, unanswered, worst, utilisation }: Assessment): Spot {
  if (refused) return refused;
  return utilisation > -Infinity ? worst : (unanswered ?? worst);
}

/** Puts the evaluation back at a place. */
export function moveTo({ runtime, env, context, combinations }: Standing, spot: Spot): void {
  const combination = combinations[spot.combination];
  if (!combination) {
    atMember(runtime, env, context);
    return;
  }
  atCombination(runtime, env, context, combination);
  if (spot.place) atPlace(runtime, env, context, spot.place);
}
