import { Type, type Static } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';
import {
  Abilities,
  ById,
  EditionDocument,
  EditionReference,
  Instant,
  nullable,
  PersonName,
  Uuid,
} from './common.ts';
import { contract } from './contract.ts';

const FindingCounts = closed({ errors: Type.Integer(), warnings: Type.Integer(), notes: Type.Integer() });

export const EditionSummary = closed({
  ...EditionReference.properties,
  title: Type.String(),
  purpose: Type.String(),
  method: Type.String(),
  unitSystem: oneOf('metric', 'inch-pound'),
  reason: Type.String(),
  draftedBy: PersonName,
  draftedAt: Instant,
  releasedBy: nullable(PersonName),
  releasedAt: nullable(Instant),
  /** Live projects that pin it. */
  projects: Type.Integer(),
});
export type EditionSummary = Static<typeof EditionSummary>;

export const Basis = closed({
  id: Uuid,
  title: Type.String(),
  purpose: Type.String(),
  /** Newest first. */
  editions: Type.Array(EditionSummary),
  createdBy: PersonName,
  createdAt: Instant,
  abilities: Abilities,
});
export type Basis = Static<typeof Basis>;

export const EditionRecord = closed({
  ...EditionSummary.properties,
  document: EditionDocument,
  findings: FindingCounts,
  abilities: Abilities,
});
export type EditionRecord = Static<typeof EditionRecord>;

export const listBases = contract({
  name: 'listBases',
  method: 'GET',
  path: '/bases',
  action: 'bases.read',
  summary: 'The design bases of the firm with their editions',
  output: closed({ items: Type.Array(Basis), abilities: Abilities }),
});

export const readBasis = contract({
  name: 'readBasis',
  method: 'GET',
  path: '/bases/:id',
  action: 'bases.read',
  summary: 'One basis with its editions',
  params: ById,
  output: Basis,
});

export const readEdition = contract({
  name: 'readEdition',
  method: 'GET',
  path: '/editions/:id',
  action: 'editions.read',
  summary: 'One edition with its document',
  params: ById,
  output: EditionRecord,
});

export const Starter = closed({
  slug: Type.String(),
  title: Type.String(),
  purpose: Type.String(),
  method: Type.String(),
  unitSystem: oneOf('metric', 'inch-pound'),
  unverified: Type.Integer(),
});

export const listStarters = contract({
  name: 'listStarters',
  method: 'GET',
  path: '/starters',
  action: 'bases.read',
  summary: 'Starter editions that a basis can be made from',
  output: closed({ items: Type.Array(Starter) }),
});

export const createBasis = contract({
  name: 'createBasis',
  method: 'POST',
  path: '/bases',
  action: 'bases.create',
  summary: 'Set up a basis from a starter edition; its first edition is a draft',
  body: closed({
    title: Type.String({ minLength: 1, maxLength: 200, pattern: '\\S' }),
    purpose: Type.Optional(Type.String({ maxLength: 4000 })),
    starter: Type.String({ pattern: '^[a-z0-9][a-z0-9-]{0,63}$' }),
  }),
  example: { title: 'House basis: roofs', starter: 'permissible-stress-softwood' },
  output: Basis,
  status: 201,
});
