import { Type, type Static } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';

const uuid = Type.String({ format: 'uuid' });
const text = Type.String();
const verdict = oneOf('passes', 'close', 'fails', 'none');
const nullable = <T extends Parameters<typeof Type.Union>[0][number]>(schema: T) =>
  Type.Union([schema, Type.Null()]);
const event = <K extends string, D extends Parameters<typeof closed>[0]>(kind: K, detail: D) =>
  closed({ kind: Type.Literal(kind), v: Type.Literal(1), detail: closed(detail) });

/**
 * Everything the trail can hold: a closed union. `v` is the version of the event's form; a changed form
 * gets a new version beside the old one, since what was recorded stays as it was.
 */
export const TrailEvent = Type.Union([
  event('firm.set-up', { name: text }),
  event('person.roles-changed', { name: text, roles: Type.Array(text) }),
  event('session.opened', {}),
  event('session.closed', {}),
  event('project.opened', { title: text }),
  event('project.changed', { fields: Type.Array(text), rechecked: Type.Integer() }),
  event('project.edition-pinned', {
    from: nullable(uuid),
    to: uuid,
    edition: text,
    reason: text,
    rechecked: Type.Integer(),
  }),
  event('member.added', { mark: text, project: uuid, verdict }),
  event('member.saved', { mark: text, project: uuid, version: Type.Integer(), verdict }),
  event('member.removed', { mark: text, project: uuid, version: Type.Integer() }),
  event('basis.set-up', { title: text, starter: text }),
  event('edition.drafted', { edition: text, reason: text }),
  event('edition.changed', { edition: text, version: Type.Integer(), places: Type.Integer() }),
  event('edition.submitted', { edition: text, reason: text }),
  event('edition.returned', { edition: text, reason: text }),
  event('edition.released', { edition: text, hash: text }),
  event('edition.superseded', { edition: text }),
  event('edition.withdrawn', { edition: text, reason: text }),
  event('stock.set-up', { title: text, sections: Type.Integer() }),
]);
export type TrailEvent = Static<typeof TrailEvent>;
export type TrailKind = TrailEvent['kind'];

/** What an event is about. */
export const subjectTypes = ['firm', 'person', 'project', 'member', 'basis', 'edition', 'stock'] as const;
export type SubjectType = (typeof subjectTypes)[number];

export const trailKinds: readonly TrailKind[] = TrailEvent.anyOf.map(
  ({ properties }) => properties.kind.const,
);
