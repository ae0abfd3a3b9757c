import { Type, type Static } from '@sinclair/typebox';
import { closed, Id, named, oneOf, Provenance, Title, Unit } from './common.ts';

/**
 * One key of a table and how it is matched.
 * - `exact`: points are words or numbers; anything else is outside.
 * - `band`: points are n + 1 rising edges around n values (null at either end: unbounded);
 *   `edge` says which band owns an edge value: the one `below` it or the one `above` it.
 * - `stepDown` / `stepUp`: points are numbers; the value of the nearest point not above / not below.
 * - `linear` / `log`: interpolated between points, straight or in the logarithm of the key.
 */
export const TableKey = closed({
  title: Title,
  match: oneOf('exact', 'band', 'stepDown', 'stepUp', 'linear', 'log'),
  unit: Unit,
  edge: Type.Optional(oneOf('below', 'above')),
  outside: oneOf('refuse', 'clamp'),
  points: Type.Array(Type.Union([Type.String({ maxLength: 64 }), Type.Number(), Type.Null()]), {
    minItems: 1,
    maxItems: 200,
  }),
});
export type TableKey = Static<typeof TableKey>;

/** A cell: a number, a word (for tables of classes), or null for a gap, which refuses. */
export const Cell = Type.Union([Type.Number(), Type.String({ maxLength: 64 }), Type.Null()]);
export type Cell = Static<typeof Cell>;

/** A table of one to three keys. `values` is row-major: the last key varies fastest. */
export const Table = closed({
  id: Id,
  title: Title,
  unit: Unit,
  keys: Type.Array(TableKey, { minItems: 1, maxItems: 3 }),
  values: Type.Array(Cell, { minItems: 1, maxItems: 5000 }),
  provenance: Provenance,
  /** Cells whose provenance differs, by their index in `values`. */
  cells: Type.Optional(named(Type.String({ pattern: '^\\d{1,4}$' }), Provenance)),
});
export type Table = Static<typeof Table>;
