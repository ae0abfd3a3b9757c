import { UniqueConstraintError } from 'sequelize';
import type { AccessRecord } from '#shared/access/index.ts';
import {
  patchDraft,
  readDraft,
  releaseEdition,
  returnEdition,
  startDraft,
  submitEdition,
  withdrawEdition,
} from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { Refusal } from '#server/http/problem.ts';
import { route, type Route } from '#server/http/route.ts';
import type { EditionRow } from '#server/models/rows.ts';
import { changeDraft } from './changeDraft.ts';
import { releaseIt, returnIt, submitIt, withdrawIt } from './moves.ts';
import { presentDraft } from './present.ts';
import { draftNext } from './startDraft.ts';

interface Loaded {
  access: AccessRecord;
  edition: EditionRow;
}

async function load(door: Door, id: string, lock?: 'update'): Promise<Loaded | null> {
  const edition = await door.editions.one({ id }, lock ? { lock } : {});
  return edition && { access: { editionState: edition.state }, edition };
}
const toRead = ({ door, params }: { door: Door; params: { id: string } }) => load(door, params.id);
/** Locked: of two moves at one moment one comes second, and sees the new state. */
const toChange = ({ door, params }: { door: Door; params: { id: string } }) =>
  load(door, params.id, 'update');

export const draftRoutes: readonly Route[] = [
  route(startDraft, {
    load: async ({ door, params }) => {
      const basis = await door.bases.one({ id: params.id }, { lock: 'update' });
      return basis && { access: {}, basis };
    },
    act: async ({ door, person, body, record, services: { judge } }) => {
      try {
        const edition = await draftNext(door, person, record.basis, body);
        return await presentDraft(door, judge, person, edition.id);
      } catch (error) {
        if (!(error instanceof UniqueConstraintError)) throw error;
        throw new Refusal(
          'not-in-this-state',
          'Someone drafted the next edition at the same moment. Go on with theirs.',
        );
      }
    },
  }),

  route(readDraft, {
    load: toRead,
    act: ({ door, person, record, services: { judge } }) =>
      presentDraft(door, judge, person, record.edition.id),
  }),

  route(patchDraft, {
    load: toChange,
    act: ({ door, person, body, record }) => changeDraft(door, person, record.edition, body),
  }),

  route(submitEdition, {
    load: toChange,
    act: async ({ door, person, body, record, services: { judge } }) => {
      await submitIt(door, person, record.edition, body);
      return presentDraft(door, judge, person, record.edition.id);
    },
  }),

  route(returnEdition, {
    load: toChange,
    act: async ({ door, person, body, record, services: { judge } }) => {
      await returnIt(door, person, record.edition, body);
      return presentDraft(door, judge, person, record.edition.id);
    },
  }),

  route(releaseEdition, {
    load: toChange,
    act: async ({ door, person, record, services: { judge } }) => {
      await releaseIt(door, judge, person, record.edition);
      return presentDraft(door, judge, person, record.edition.id);
    },
  }),

  route(withdrawEdition, {
    load: toChange,
    act: async ({ door, person, body, record, services: { judge } }) => {
      await withdrawIt(door, record.edition, body.reason);
      return presentDraft(door, judge, person, record.edition.id);
    },
  }),
];
