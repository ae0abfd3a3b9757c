import { Type, type Static } from '@sinclair/typebox';
import { actions, roles } from '#shared/access/index.ts';
import { closed, oneOf, type Edition, type Member } from '#shared/basis/schema/index.ts';
import { editionStates } from '#shared/basis/lifecycle.ts';
import type { Result } from '#shared/engine/types.ts';

export const Uuid = Type.String({ format: 'uuid' });
export const ById = closed({ id: Uuid });
export const Instant = Type.String({ format: 'date-time' });
export const Version = Type.Integer({ minimum: 1 });
export const nullable = <T extends Parameters<typeof Type.Union>[0][number]>(schema: T) =>
  Type.Union([schema, Type.Null()]);

export const Role = oneOf(...roles);
export const EditionStateName = oneOf(...editionStates);
export const VerdictWord = oneOf('passes', 'close', 'fails', 'none');

/** What the person asking may do with this record. */
export const Abilities = Type.Array(oneOf(...actions), {
  description: 'Actions that the person asking may do with this record.',
});

/** A person, as shown beside what they did. */
export const PersonName = closed({ id: Uuid, name: Type.String() });
export type PersonName = Static<typeof PersonName>;

/** The edition behind a verdict; never leave it out where a verdict is shown. */
export const EditionReference = closed({
  id: Uuid,
  basisId: Uuid,
  basisTitle: Type.String(),
  number: Type.Integer(),
  state: EditionStateName,
  hash: Type.String(),
  /** Stored values that no second person verified. */
  unverified: Type.Integer(),
});
export type EditionReference = Static<typeof EditionReference>;

/** What a list needs of a stored result. */
export const ResultSummary = closed({
  id: Uuid,
  word: VerdictWord,
  check: nullable(Type.String()),
  checkTitle: nullable(Type.String()),
  utilisation: nullable(Type.Number()),
  because: nullable(Type.String()),
  /** Unverified values and departures behind this result. */
  unverified: Type.Integer(),
  departures: Type.Integer(),
  memberVersion: Version,
  edition: EditionReference,
  engine: Type.String(),
  hash: Type.String(),
  at: Instant,
});
export type ResultSummary = Static<typeof ResultSummary>;

/** Documents with published JSON Schemas of their own in `rules/schema/`. */
export const EditionDocument = Type.Unsafe<Edition>(
  Type.Object(
    { schema: Type.Literal('edition/1') },
    { description: 'An edition document; its JSON Schema is published apart.' },
  ),
);
export const MemberDocument = Type.Unsafe<Member>(
  Type.Object(
    { schema: Type.Literal('member/1') },
    { description: 'A member document; its JSON Schema is published apart.' },
  ),
);
export const ResultDocument = Type.Unsafe<Result>(
  Type.Object(
    { schema: Type.Literal('result/1') },
    { description: 'A result document with its ledger; its JSON Schema is published apart.' },
  ),
);

/** Paging by number; `total` counts everything that was asked for. */
export const paging = {
  page: Type.Optional(Type.Integer({ minimum: 1, maximum: 10_000, default: 1 })),
  size: Type.Optional(Type.Integer({ minimum: 1, maximum: 200, default: 50 })),
};
export const pageOf = <T extends Parameters<typeof Type.Array>[0]>(item: T) =>
  closed({ items: Type.Array(item), page: Type.Integer(), size: Type.Integer(), total: Type.Integer() });
