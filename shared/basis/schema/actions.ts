import { Type, type Static } from '@sinclair/typebox';
import { closed, Formula, Id, named, oneOf, Provenance, Symbol, Text, Title } from './common.ts';

/** An option of duration. The list is ordered from the longest to the shortest. */
export const Duration = closed({ id: Id, title: Title, note: Type.Optional(Text) });
export type Duration = Static<typeof Duration>;

/** A number each action carries for the combinations, such as psi_0. */
export const ActionValue = closed({ symbol: Symbol, title: Title });
export type ActionValue = Static<typeof ActionValue>;

/** A cause of load. */
export const Action = closed({
  id: Id,
  symbol: Symbol,
  title: Title,
  nature: oneOf('permanent', 'variable'),
  duration: Id,
  values: named(Symbol, Type.Number()),
  /** Placed span by span to its worst where there are several spans. */
  patterned: Type.Boolean(),
  /** Actions that are never taken together with this one. */
  excludes: Type.Optional(Type.Array(Id, { maxItems: 30 })),
  provenance: Provenance,
  note: Type.Optional(Text),
});
export type Action = Static<typeof Action>;

/**
 * A term of a combination pattern: which actions, and the factor on each. The factor is a formula
 * over clauses, choices and the action's own values.
 */
export const CombinationTerm = closed({
  /** `permanent`: each permanent action. `leading`: the one that leads. `accompanying`: the other
   *  variable ones. `variable`: each variable one. Or a list of actions by id. */
  of: Type.Union([
    oneOf('permanent', 'leading', 'accompanying', 'variable'),
    Type.Array(Id, { minItems: 1, maxItems: 30 }),
  ]),
  factor: Formula,
});
export type CombinationTerm = Static<typeof CombinationTerm>;

/**
 * A combination written once and expanded by the engine over the actions a member carries.
 * A pattern with a `leading` term is expanded with each variable action leading in turn; one without
 * is expanded once. `subsets`: also with each subset of the variable actions left away, since a
 * shorter list can have a longer duration and so a lower resistance.
 */
export const CombinationPattern = closed({
  id: Id,
  title: Title,
  reference: Type.String({ maxLength: 80 }),
  /** `strength`, or the name of a deflection state such as `instantaneous`, `final`, `variable`. */
  state: Id,
  terms: Type.Array(CombinationTerm, { minItems: 1, maxItems: 20 }),
  subsets: Type.Optional(Type.Boolean()),
  /** Expanded only if the member carries each of these actions. */
  needs: Type.Optional(Type.Array(Id, { maxItems: 30 })),
  /** Fixed duration; left out: that of the shortest-lived action with a factor other than 0. */
  duration: Type.Optional(Id),
  provenance: Provenance,
  note: Type.Optional(Text),
});
export type CombinationPattern = Static<typeof CombinationPattern>;
