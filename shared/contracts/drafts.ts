import { Type, type Static } from '@sinclair/typebox';
import { closed } from '#shared/basis/schema/index.ts';
import { EditionSummary } from './bases.ts';
import { Abilities, ById, EditionDocument, Instant, PersonName, Uuid, Version } from './common.ts';
import { contract } from './contract.ts';

const Sentence = Type.String({ minLength: 1, maxLength: 2000, pattern: '\\S' });

/** A remark of a checker, pinned to a place of the edition by JSON pointer. */
export const Remark = closed({
  pointer: Type.String({ maxLength: 400 }),
  text: Type.String({ minLength: 1, maxLength: 2000, pattern: '\\S' }),
});
export type Remark = Static<typeof Remark>;

/** A change as RFC 6902 has it. What fits the draft is for the handler to say. */
const Operation = Type.Object(
  {
    op: Type.Unsafe<'add' | 'remove' | 'replace' | 'move' | 'copy' | 'test'>({
      type: 'string',
      enum: ['add', 'remove', 'replace', 'move', 'copy', 'test'],
    }),
    path: Type.String({ maxLength: 400 }),
    from: Type.Optional(Type.String({ maxLength: 400 })),
    value: Type.Optional(Type.Unknown()),
  },
  { additionalProperties: false },
);

export const Draft = closed({
  summary: EditionSummary,
  version: Version,
  document: EditionDocument,
  /** Who changed it last, and when. */
  changedBy: PersonName,
  changedAt: Instant,
  remarks: Type.Array(closed({ ...Remark.properties, by: PersonName, at: Instant })),
  /** What stands in the way of a release by the person asking, as sentences. */
  blockers: Type.Array(Type.String()),
  proofs: closed({ held: Type.Integer(), failed: Type.Integer() }),
  abilities: Abilities,
});
export type Draft = Static<typeof Draft>;

export const startDraft = contract({
  name: 'startDraft',
  method: 'POST',
  path: '/bases/:id/drafts',
  action: 'editions.draft',
  summary: 'Draft the next edition of a basis from one of its editions',
  params: ById,
  body: closed({ from: Uuid, reason: Sentence }),
  example: { from: '00000000-0000-4000-8000-000000000000', reason: 'A circular on grading.' },
  output: Draft,
  status: 201,
});

export const readDraft = contract({
  name: 'readDraft',
  method: 'GET',
  path: '/editions/:id/draft',
  action: 'editions.read',
  summary: 'An edition as it is worked on: document with version, remarks, what stands in the way of release',
  params: ById,
  output: Draft,
});

export const patchDraft = contract({
  name: 'patchDraft',
  method: 'PATCH',
  path: '/editions/:id/document',
  action: 'editions.edit',
  summary:
    'Change a draft by RFC 6902 operations made on a version; changes that don’t clash with newer ones are merged',
  params: ById,
  body: closed({ version: Version, patch: Type.Array(Operation, { minItems: 1, maxItems: 20_000 }) }),
  example: { version: 1, patch: [{ op: 'replace', path: '/title', value: 'House basis' }] },
  output: closed({
    version: Version,
    hash: Type.String(),
    /** Somebody changed other places meanwhile; `document` is what came out. */
    merged: Type.Boolean(),
    document: Type.Union([EditionDocument, Type.Null()]),
  }),
});

/** What a `stale-version` problem of a draft carries as `stored`. */
export interface StoredDraft {
  version: number;
  document: Static<typeof EditionDocument>;
  clashes: { pointer: string; mine: unknown; theirs: unknown }[];
  changedBy: PersonName;
}

export const submitEdition = contract({
  name: 'submitEdition',
  method: 'POST',
  path: '/editions/:id/submit',
  action: 'editions.submit',
  summary: 'Hand a draft to a second person for check, with a summary of its changes',
  params: ById,
  body: closed({ version: Version, reason: Sentence }),
  example: { version: 1, reason: 'Grade stresses after the circular.' },
  output: Draft,
});

export const returnEdition = contract({
  name: 'returnEdition',
  method: 'POST',
  path: '/editions/:id/return',
  action: 'editions.return',
  summary: 'Return an edition to its author with remarks pinned to places',
  params: ById,
  body: closed({ reason: Sentence, remarks: Type.Array(Remark, { maxItems: 200 }) }),
  example: {
    reason: 'See the remark.',
    remarks: [{ pointer: '/grades/rows/0', text: 'Compare with the declaration.' }],
  },
  output: Draft,
});

export const releaseEdition = contract({
  name: 'releaseEdition',
  method: 'POST',
  path: '/editions/:id/release',
  action: 'editions.release',
  summary: 'Release an edition as a second person; it never changes again, and the one before is superseded',
  params: ById,
  output: Draft,
});

export const withdrawEdition = contract({
  name: 'withdrawEdition',
  method: 'POST',
  path: '/editions/:id/withdraw',
  action: 'editions.withdraw',
  summary: 'Withdraw a released edition with a reason; every project that pins it is warned',
  params: ById,
  body: closed({ reason: Sentence }),
  example: { reason: 'The grading rule behind it was withdrawn.' },
  output: Draft,
});
