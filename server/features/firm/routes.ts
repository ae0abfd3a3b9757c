import type { Role } from '#shared/access/index.ts';
import { readFirm } from '#shared/contracts/index.ts';
import { route, type Route } from '#server/http/route.ts';

interface Colleague {
  id: string;
  name: string;
  email: string | null;
  roles: Role[];
}

export const firmRoutes: readonly Route[] = [
  route(readFirm, async ({ door, person }) => {
    const { id, name, invented, solePractitioner } = await door.firm();
    const onlyReader = person.roles.every((role) => role === 'reader');
    const people = await door.select<Colleague>(
      `SELECT p.id, p.name, CASE WHEN :hidden THEN NULL ELSE p.email END AS email, m.roles
       FROM memberships m JOIN people p ON p.id = m.person_id
       WHERE m.firm_id = :firmId AND m.active ORDER BY p.name, p.id`,
      { hidden: onlyReader },
    );
    return { id, name, invented, solePractitioner, people };
  }),
];
