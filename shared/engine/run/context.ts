import type { Edition } from '#shared/basis/schema/index.ts';
import type { Place, PlaceVisitor } from '../assess/places.ts';
import type { Situation } from '../assess/situation.ts';
import type { ExpandedCombination } from '../combine/expand.ts';
import type { Geometry } from '../member/geometry.ts';
import type { Given } from '../member/given.ts';
import type { Problem } from './env.ts';

/** Where an evaluation stands: the member, and the combination, action and place it is at. */
export interface Context {
  edition: Edition;
  given: Given;
  geometry: Geometry | null;
  situation: Situation | null;
  /** Why there are no deflections, where the edition gives the member no stiffness. */
  noStiffness: Problem | null;
  visitor: PlaceVisitor | null;
  pattern: number;
  combination: ExpandedCombination | null;
  /** Action whose factor is being worked out, −1 for none. */
  action: number;
  place: Place | null;
  /** Values that stand in place of clauses, by slot: departures and trials. */
  overrides: ReadonlyMap<number, number> | null;
}
