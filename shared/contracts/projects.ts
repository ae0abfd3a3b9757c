import { Type, type Static } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';
import { memberStates, projectStates } from '#shared/access/index.ts';
import {
  Abilities,
  ById,
  EditionReference,
  Instant,
  nullable,
  pageOf,
  paging,
  PersonName,
  ResultSummary,
  Uuid,
  Version,
} from './common.ts';
import { contract } from './contract.ts';

const title = Type.String({ minLength: 1, maxLength: 200, pattern: '\\S' });
const line = Type.String({ maxLength: 200 });
const Choices = Type.Record(
  Type.String({ pattern: '^[A-Za-z][A-Za-z0-9_]{0,39}$' }),
  Type.String({ minLength: 1, maxLength: 64 }),
  {
    maxProperties: 60,
    description: 'Options of the project choices, such as exposure; members inherit them.',
  },
);

/** Live members by verdict; `none`: not checked, or no verdict possible. */
export const VerdictCounts = closed({
  passes: Type.Integer(),
  close: Type.Integer(),
  fails: Type.Integer(),
  none: Type.Integer(),
});

export const Project = closed({
  id: Uuid,
  title: Type.String(),
  site: Type.String(),
  client: Type.String(),
  state: oneOf(...projectStates),
  choices: Choices,
  edition: nullable(EditionReference),
  stockListId: nullable(Uuid),
  counts: VerdictCounts,
  version: Version,
  createdBy: PersonName,
  createdAt: Instant,
  changedAt: Instant,
  abilities: Abilities,
});
export type Project = Static<typeof Project>;

/** A row of a project's table of members. Lengths in the member's own units. */
export const MemberRow = closed({
  id: Uuid,
  mark: Type.String(),
  title: Type.String(),
  state: oneOf(...memberStates),
  units: oneOf('metric', 'inch-pound'),
  /** Option of the edition's choice `use`, where it has one. */
  use: nullable(Type.String()),
  spans: Type.Array(Type.Number()),
  section: closed({ b: Type.Number(), h: Type.Number(), pieces: Type.Integer() }),
  grade: Type.String(),
  result: nullable(ResultSummary),
  version: Version,
  savedBy: PersonName,
  savedAt: Instant,
});
export type MemberRow = Static<typeof MemberRow>;

export const listProjects = contract({
  name: 'listProjects',
  method: 'GET',
  path: '/projects',
  action: 'projects.read',
  summary: 'Projects of the firm, last changed first',
  query: closed({
    ...paging,
    search: Type.Optional(Type.String({ maxLength: 100 })),
    state: Type.Optional(oneOf(...projectStates, 'any')),
  }),
  output: pageOf(Project),
});

const stockListId = Type.Optional(nullable(Uuid));

export const createProject = contract({
  name: 'createProject',
  method: 'POST',
  path: '/projects',
  action: 'projects.create',
  summary: 'Open a project',
  body: closed({
    title,
    site: Type.Optional(line),
    client: Type.Optional(line),
    stockListId,
    choices: Type.Optional(Choices),
  }),
  example: { title: 'Signal cabin, upper floor' },
  output: Project,
  status: 201,
});

export const readProject = contract({
  name: 'readProject',
  method: 'GET',
  path: '/projects/:id',
  action: 'projects.read',
  summary: 'One project with its pinned edition',
  params: ById,
  output: Project,
});

export const updateProject = contract({
  name: 'updateProject',
  method: 'PATCH',
  path: '/projects/:id',
  action: 'projects.update',
  summary: 'Change title, site, client, state, stock list or choices; changed choices re-check the members',
  params: ById,
  body: closed({
    version: Version,
    title: Type.Optional(title),
    site: Type.Optional(line),
    client: Type.Optional(line),
    state: Type.Optional(oneOf(...projectStates)),
    stockListId,
    choices: Type.Optional(Choices),
  }),
  example: { version: 1, client: 'A client' },
  output: Project,
});

export const pinEdition = contract({
  name: 'pinEdition',
  method: 'PUT',
  path: '/projects/:id/edition',
  action: 'projects.pin',
  summary: 'Pin a released edition, on purpose; every member is checked against it',
  params: ById,
  body: closed({
    editionId: Uuid,
    version: Version,
    reason: Type.String({ minLength: 1, maxLength: 2000, pattern: '\\S' }),
  }),
  example: {
    editionId: '00000000-0000-4000-8000-000000000000',
    version: 1,
    reason: 'Agreed with the client.',
  },
  output: Project,
});

export const listProjectMembers = contract({
  name: 'listProjectMembers',
  method: 'GET',
  path: '/projects/:id/members',
  action: 'members.read',
  summary: 'Live members of a project, by mark',
  params: ById,
  output: closed({ items: Type.Array(MemberRow) }),
});
