import { Type, type Static } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';
import { subjectTypes, TrailEvent, trailKinds } from '#shared/trail/index.ts';
import { Instant, nullable, PersonName, Uuid } from './common.ts';
import { contract } from './contract.ts';

/** Who did what on what. */
export const TrailEntry = closed({
  id: Type.Integer(),
  at: Instant,
  person: PersonName,
  subject: closed({ type: oneOf(...subjectTypes), id: Uuid, label: Type.String() }),
  event: TrailEvent,
});
export type TrailEntry = Static<typeof TrailEntry>;

export const readTrail = contract({
  name: 'readTrail',
  method: 'GET',
  path: '/trail',
  action: 'trail.read',
  summary: 'The append-only record of who did what, newest first',
  query: closed({
    /** Entries older than this one. */
    before: Type.Optional(Type.Integer({ minimum: 1 })),
    limit: Type.Optional(Type.Integer({ minimum: 1, maximum: 200, default: 50 })),
    kind: Type.Optional(oneOf(...trailKinds)),
    subject: Type.Optional(Uuid),
    person: Type.Optional(Uuid),
  }),
  output: closed({
    items: Type.Array(TrailEntry),
    /** Pass as `before` for the next older ones; null: no more. */
    older: nullable(Type.Integer()),
  }),
});
