import { Type, type Static } from '@sinclair/typebox';
import { closed } from '#shared/basis/schema/index.ts';
import { nullable, PersonName, ResultSummary, Uuid, Instant } from './common.ts';
import { EditionSummary } from './bases.ts';
import { contract } from './contract.ts';

/** A member on the desk, with the project it belongs to. */
export const DeskMember = closed({
  id: Uuid,
  mark: Type.String(),
  title: Type.String(),
  project: closed({ id: Uuid, title: Type.String() }),
  result: nullable(ResultSummary),
  savedBy: PersonName,
  savedAt: Instant,
});
export type DeskMember = Static<typeof DeskMember>;

export const readDesk = contract({
  name: 'readDesk',
  method: 'GET',
  path: '/desk',
  action: 'desk.read',
  summary: 'What waits for the person: failing and close members, editions in check, what changed last',
  output: closed({
    /** Of live projects, the highest utilisation first; at most 50, `failingTotal` counts all. */
    failing: Type.Array(DeskMember),
    close: Type.Array(DeskMember),
    failingTotal: Type.Integer(),
    closeTotal: Type.Integer(),
    inCheck: Type.Array(EditionSummary),
    recent: Type.Array(DeskMember),
  }),
});
