import {
  createMember,
  listMemberVersions,
  readMember,
  readMemberResult,
  removeMember as removeContract,
  saveMember as saveContract,
  verifyMember,
} from '#shared/contracts/index.ts';
import { Refusal } from '#server/http/problem.ts';
import { route, type Route } from '#server/http/route.ts';
import { currentResultOf, loadMember, loadMemberToChange } from './load.ts';
import { presentMember } from './present.ts';
import { addMember, removeMember, saveMember } from './saveMember.ts';
import { versionsOf } from './versions.ts';

function noResult(): Refusal {
  return new Refusal(
    'not-in-this-state',
    'There is no result: the project pins no edition yet. Pin a released edition, and every member is checked.',
  );
}

export const memberRoutes: readonly Route[] = [
  route(createMember, {
    load: async ({ door, params }) => {
      const project = await door.projects.one({ id: params.id }, { lock: 'share' });
      return project && { access: { projectState: project.state }, project };
    },
    act: async ({ door, person, body, record, services: { judge } }) => {
      const { id } = await addMember(door, judge, person, record.project, body.document);
      return presentMember(door, person, id);
    },
  }),

  route(readMember, {
    load: loadMember,
    act: ({ door, person, record }) => presentMember(door, person, record.member.id),
  }),

  route(saveContract, {
    load: loadMemberToChange,
    act: async ({ door, person, body, record, services: { judge } }) => {
      await saveMember(door, judge, person, record, body);
      return presentMember(door, person, record.member.id);
    },
  }),

  route(removeContract, {
    load: loadMemberToChange,
    act: async ({ door, query, record }) => {
      await removeMember(door, record, query);
      return undefined;
    },
  }),

  route(listMemberVersions, {
    load: loadMember,
    act: async ({ door, record }) => ({ items: await versionsOf(door, record.member.id) }),
  }),

  route(readMemberResult, {
    load: loadMember,
    act: async ({ door, person, record }) => {
      const current = await currentResultOf(door, record);
      const { result: summary } = await presentMember(door, person, record.member.id);
      if (!current || !summary) throw noResult();
      return { summary, inputs: current.result.inputs, document: current.result.document };
    },
  }),

  route(verifyMember, {
    load: loadMember,
    act: async ({ door, record, services: { judge } }) => {
      const current = await currentResultOf(door, record);
      if (!current) throw noResult();
      const { edition, result } = current;
      return judge.verify(edition, result.inputs, result.document, result.resultHash);
    },
  }),
];
