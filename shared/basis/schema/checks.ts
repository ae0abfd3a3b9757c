import { Type, type Static } from '@sinclair/typebox';
import { closed, Formula, Id, oneOf, Symbol, Text, Title, Unit } from './common.ts';
import { Condition } from './condition.ts';

/**
 * A comparison of demand with limit (utilisation = demand / limit), or an interaction formula that
 * gives the utilisation itself.
 *
 * `at` says where it is evaluated, for each combination of its state:
 * - `moment`: at the peak sagging and hogging moments of each span;
 * - `shear`: on each side of each support;
 * - `support`: at each support;
 * - `deflection`: at the largest deflection of each span;
 * - `member`: once for the member, without a combination.
 */
export const Check = closed({
  id: Id,
  title: Title,
  reference: Type.String({ maxLength: 80 }),
  at: oneOf('moment', 'shear', 'support', 'deflection', 'member'),
  /** State of the combinations used; left out only for `member`. */
  state: Type.Optional(Id),
  demand: Type.Optional(closed({ title: Title, formula: Formula, unit: Unit })),
  limit: Type.Optional(closed({ title: Title, formula: Formula, unit: Unit })),
  utilisation: Type.Optional(closed({ formula: Formula })),
  /** The formulas are published as printed in the edition's units; dimensions are not checked. */
  empirical: Type.Optional(Type.Boolean()),
  /** Left out of the result where this does not hold. */
  applies: Type.Optional(Condition),
  note: Type.Optional(Text),
});
export type Check = Static<typeof Check>;

/** How the edition wants the structural analysis done. Symbols name clauses. */
export const AnalysisRules = closed({
  /** Spans for the analysis: centre to centre of bearings, or clear span plus an allowance at each end. */
  span: Type.Union([
    closed({ rule: Type.Literal('centres'), reference: Type.String({ maxLength: 80 }) }),
    closed({ rule: Type.Literal('clearPlus'), allowance: Symbol, reference: Type.String({ maxLength: 80 }) }),
  ]),
  /** Clause giving the bending stiffness EI. */
  bendingStiffness: Symbol,
  /** Clause giving the shear stiffness with its form factor; left out: bending deflection only. */
  shearStiffness: Type.Optional(Symbol),
  /** Self-weight per unit length and the action it belongs to; left out: the person enters it. */
  selfWeight: Type.Optional(closed({ action: Id, line: Symbol })),
  /** The reduced shear force `V_d`: at the support, or at a distance from its centre or face, with
   *  point loads inside the distance kept, left out or scaled by their distance. */
  shear: Type.Union([
    closed({ at: Type.Literal('support'), reference: Type.String({ maxLength: 80 }) }),
    closed({
      at: Type.Literal('distance'),
      distance: Symbol,
      from: oneOf('centre', 'face'),
      pointLoads: oneOf('keep', 'omit', 'scale'),
      reference: Type.String({ maxLength: 80 }),
    }),
  ]),
  /** A utilisation from here up to 1 is said to be close. */
  closeFrom: Type.Number({ exclusiveMinimum: 0, maximum: 1 }),
});
export type AnalysisRules = Static<typeof AnalysisRules>;
