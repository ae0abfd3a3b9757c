import { Type, type Static } from '@sinclair/typebox';
import { closed, Id, named, oneOf, Provenance, Symbol, Text, Title, Unit } from './common.ts';

/** A list a person picks from. `project` choices are inherited by members and can be overridden there. */
export const Choice = closed({
  symbol: Symbol,
  title: Title,
  scope: oneOf('grade', 'project', 'member'),
  options: Type.Array(closed({ id: Id, title: Title, note: Type.Optional(Text) }), {
    minItems: 1,
    maxItems: 60,
  }),
  /** Taken where nobody chose; left out: the person has to choose. */
  default: Type.Optional(Id),
  note: Type.Optional(Text),
});
export type Choice = Static<typeof Choice>;

/** A number entered for a member, a span or a support beyond those every member has. */
export const Input = closed({
  symbol: Symbol,
  title: Title,
  scope: oneOf('member', 'span', 'support'),
  unit: Unit,
  minimum: Type.Optional(Type.Number()),
  maximum: Type.Optional(Type.Number()),
  /** Taken where nothing was entered; left out: a clause that needs it says that it is missing. */
  default: Type.Optional(Type.Number()),
  note: Type.Optional(Text),
});
export type Input = Static<typeof Input>;

/** A material property. */
export const GradeColumn = closed({
  symbol: Symbol,
  title: Title,
  unit: Unit,
  note: Type.Optional(Text),
});
export type GradeColumn = Static<typeof GradeColumn>;

/** A value that depends on a size: n + 1 rising edges (null: unbounded) around n values. */
export const SizeBands = closed({
  by: Symbol,
  edge: oneOf('below', 'above'),
  edges: Type.Array(Type.Union([Type.Number(), Type.Null()]), { minItems: 2, maxItems: 20 }),
  values: Type.Array(Type.Number(), { minItems: 1, maxItems: 19 }),
});
export type SizeBands = Static<typeof SizeBands>;

/** A grade: a row of properties. A missing property is missing, never zero. */
export const Grade = closed({
  id: Id,
  title: Title,
  /** Options of the grade-scoped choices, such as the family of the material. */
  choices: named(Symbol, Id),
  values: named(Symbol, Type.Union([Type.Number(), SizeBands])),
  /** Provenance of the row; `cells` holds those that differ, by column symbol. */
  provenance: Provenance,
  cells: Type.Optional(named(Symbol, Provenance)),
  note: Type.Optional(Text),
});
export type Grade = Static<typeof Grade>;

export const Grades = closed({
  columns: Type.Array(GradeColumn, { minItems: 1, maxItems: 60 }),
  rows: Type.Array(Grade, { maxItems: 500 }),
});
export type Grades = Static<typeof Grades>;
