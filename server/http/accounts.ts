import { QueryTypes } from 'sequelize';
import type { Database } from '#server/db/connection.ts';
import { firmsOf } from '#server/db/door.ts';
import type { Passwords } from './passwords.ts';
import type { Account } from './session.ts';

/**
 * Finds the account of an email and password: the person, and the firm they have belonged to longest.
 * Null when either is wrong, when there is no such account, and when the person is in no firm; all alike.
 */
export function accountsOf(database: Database, passwords: Passwords) {
  return async (email: string, password: string): Promise<Account | null> => {
    const [found] = await database.sequelize.query<{ person_id: string; password_hash: string }>(
      'SELECT person_id, password_hash FROM sign_in_lookup($1)',
      { bind: [email.trim()], type: QueryTypes.SELECT },
    );
    const right = await passwords.matches(found?.password_hash ?? null, password);
    if (!found || !right) return null;
    const [firmId] = await firmsOf(database, found.person_id);
    return firmId === undefined ? null : { personId: found.person_id, firmId };
  };
}
