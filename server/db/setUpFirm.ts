import { randomUUID } from 'node:crypto';
import { QueryTypes, type Transaction } from 'sequelize';
import type { Role } from '#shared/access/index.ts';
import type { Database } from './connection.ts';
import { openDoor } from './door.ts';

export interface NewPerson {
  name: string;
  email: string;
  passwordHash: string;
  roles: readonly Role[];
}

export interface NewFirm {
  name: string;
  invented: boolean;
  solePractitioner?: boolean;
}

export interface SetUpFirm {
  firmId: string;
  /** Ids in the order the people were given. */
  people: string[];
}

/**
 * Sets up a firm with its people: the one thing that nobody inside a firm can do. Takes a connection of
 * the owner, since the application's role may add neither firms nor people. The first person is named on
 * the trail.
 */
export async function setUpFirm(
  owner: Database,
  transaction: Transaction,
  { name, invented, solePractitioner = false }: NewFirm,
  people: readonly NewPerson[],
): Promise<SetUpFirm> {
  const firmId = randomUUID();
  const ids = people.map(() => randomUUID());
  const [personId] = ids;
  if (personId === undefined) throw new Error('A firm needs at least one person.');
  const door = await openDoor(owner, transaction, { firmId, personId });
  const write = (sql: string, bind: unknown[]) =>
    owner.sequelize.query(sql, { bind, transaction, type: QueryTypes.RAW });
  await write('INSERT INTO firms (id, name, invented, sole_practitioner) VALUES ($1, $2, $3, $4)', [
    firmId,
    name,
    invented,
    solePractitioner,
  ]);
  for (const [i, person] of people.entries()) {
    await write('INSERT INTO people (id, email, name, password_hash) VALUES ($1, $2, $3, $4)', [
      ids[i],
      person.email,
      person.name,
      person.passwordHash,
    ]);
    await door.memberships.add({ personId: ids[i] ?? '', roles: [...person.roles] });
  }
  await door.record(
    { kind: 'firm.set-up', v: 1, detail: { name } },
    { type: 'firm', id: firmId, label: name },
  );
  return { firmId, people: ids };
}
