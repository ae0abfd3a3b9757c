import type { Role } from '#shared/access/index.ts';
import type { Door } from '#server/db/door.ts';

/** The person of a request, with the roles they hold in the firm at this moment. */
export interface Person {
  id: string;
  name: string;
  email: string;
  roles: readonly Role[];
}

/** The person an open door is bound to; null when they no longer belong to the firm. */
export async function personOf(door: Door): Promise<Person | null> {
  const [person] = await door.select<Person>(
    `SELECT p.id, p.name, p.email, m.roles FROM memberships m JOIN people p ON p.id = m.person_id
     WHERE m.firm_id = :firmId AND m.person_id = :personId AND m.active`,
    { personId: door.personId },
  );
  return person && person.roles.length > 0 ? person : null;
}
