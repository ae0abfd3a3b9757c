import {
  createProject,
  listProjectMembers,
  listProjects,
  pinEdition as pinContract,
  readProject,
  updateProject,
} from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { route, type Route } from '#server/http/route.ts';
import { changeProject, refuseStale, refuseUnknownStock } from './changeProject.ts';
import { memberRows } from './memberRows.ts';
import { pinEdition } from './pinEdition.ts';
import { listOfProjects, presentProject } from './present.ts';

const load =
  (lock?: 'update') =>
  async ({ door, params }: { door: Door; params: { id: string } }) => {
    const row = await door.projects.one({ id: params.id }, lock ? { lock } : {});
    return row && { access: { projectState: row.state }, row };
  };

export const projectRoutes: readonly Route[] = [
  route(listProjects, ({ door, person, query }) =>
    listOfProjects(door, person, {
      search: query.search ?? '',
      state: query.state ?? 'any',
      page: query.page ?? 1,
      size: query.size ?? 50,
    }),
  ),

  route(createProject, async ({ door, person, body }) => {
    await refuseUnknownStock(door, body.stockListId);
    const row = await door.projects.add({ ...body, createdBy: person.id });
    await door.record(
      { kind: 'project.opened', v: 1, detail: { title: row.title } },
      { type: 'project', id: row.id, label: row.title },
    );
    return presentProject(door, person, row.id);
  }),

  route(readProject, {
    load: load(),
    act: ({ door, person, record }) => presentProject(door, person, record.row.id),
  }),

  route(updateProject, {
    load: load('update'),
    act: async ({ door, person, body, record: { row }, services: { judge } }) => {
      refuseStale(row, body, await presentProject(door, person, row.id));
      await changeProject(door, judge, row, body);
      return presentProject(door, person, row.id);
    },
  }),

  route(pinContract, {
    load: load('update'),
    act: async ({ door, person, body, record: { row }, services: { judge } }) => {
      refuseStale(row, body, await presentProject(door, person, row.id));
      await pinEdition(door, judge, row, body);
      return presentProject(door, person, row.id);
    },
  }),

  route(listProjectMembers, {
    load: load(),
    act: async ({ door, record }) => ({ items: await memberRows(door, record.row.id) }),
  }),
];
