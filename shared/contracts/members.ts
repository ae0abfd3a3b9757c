import { Type, type Static } from '@sinclair/typebox';
import { memberStates, projectStates } from '#shared/access/index.ts';
import { closed, Member as MemberBody, oneOf } from '#shared/basis/schema/index.ts';
import {
  Abilities,
  ById,
  EditionReference,
  Instant,
  MemberDocument,
  nullable,
  PersonName,
  ResultDocument,
  ResultSummary,
  Uuid,
  Version,
} from './common.ts';
import { contract } from './contract.ts';
import { exampleMember } from './example.ts';

export const MemberRecord = closed({
  id: Uuid,
  project: closed({
    id: Uuid,
    title: Type.String(),
    state: oneOf(...projectStates),
    choices: Type.Record(Type.String(), Type.String()),
    stockListId: nullable(Uuid),
  }),
  mark: Type.String(),
  state: oneOf(...memberStates),
  document: MemberDocument,
  version: Version,
  savedBy: PersonName,
  savedAt: Instant,
  /** The edition pinned by the project. */
  edition: nullable(EditionReference),
  /** Of this version against the pinned edition. */
  result: nullable(ResultSummary),
  abilities: Abilities,
});
export type MemberRecord = Static<typeof MemberRecord>;

/** What a `stale-version` problem of a member carries as `stored`. */
export interface StoredMember {
  document: Static<typeof MemberDocument>;
  version: number;
  savedBy: PersonName;
  savedAt: string;
}

export const createMember = contract({
  name: 'createMember',
  method: 'POST',
  path: '/projects/:id/members',
  action: 'members.create',
  summary: 'Add a member; it is checked against the pinned edition and the result is stored',
  params: ById,
  body: closed({ document: MemberBody }),
  example: { document: exampleMember },
  output: MemberRecord,
  status: 201,
});

export const readMember = contract({
  name: 'readMember',
  method: 'GET',
  path: '/members/:id',
  action: 'members.read',
  summary: 'One member with its document and last result',
  params: ById,
  output: MemberRecord,
});

export const saveMember = contract({
  name: 'saveMember',
  method: 'PUT',
  path: '/members/:id',
  action: 'members.save',
  summary: 'Save a member over the version it was made from; a stale version is refused with both documents',
  params: ById,
  body: closed({ version: Version, document: MemberBody }),
  example: { version: 1, document: exampleMember },
  output: MemberRecord,
});

export const removeMember = contract({
  name: 'removeMember',
  method: 'DELETE',
  path: '/members/:id',
  action: 'members.remove',
  summary: 'Take a member out of its project; its versions and results stay',
  params: ById,
  query: closed({ version: Version }),
  output: null,
});

export const listMemberVersions = contract({
  name: 'listMemberVersions',
  method: 'GET',
  path: '/members/:id/versions',
  action: 'members.read',
  summary: 'Every saved version of a member, newest first',
  params: ById,
  output: closed({
    items: Type.Array(
      closed({
        version: Version,
        document: MemberDocument,
        hash: Type.String(),
        savedBy: PersonName,
        savedAt: Instant,
        result: nullable(ResultSummary),
      }),
    ),
  }),
});

export const readMemberResult = contract({
  name: 'readMemberResult',
  method: 'GET',
  path: '/members/:id/result',
  action: 'members.read',
  summary: 'The stored result of the current version against the pinned edition, with its ledger',
  params: ById,
  output: closed({
    summary: ResultSummary,
    /** The member as it was checked: its document with the project's choices. */
    inputs: MemberDocument,
    document: ResultDocument,
  }),
});

export const verifyMember = contract({
  name: 'verifyMember',
  method: 'POST',
  path: '/members/:id/verify',
  action: 'members.verify',
  summary: 'Recompute the stored result from its stored inputs and compare byte for byte',
  params: ById,
  output: closed({
    same: Type.Boolean(),
    storedHash: Type.String(),
    recomputedHash: Type.String(),
    /** The engine that made the stored result, and the one that recomputed it. */
    storedEngine: Type.String(),
    engine: Type.String(),
    /** Where they differ, in words. */
    differences: Type.Array(Type.String()),
  }),
});
