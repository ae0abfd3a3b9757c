import { abilities, actions } from '#shared/access/index.ts';
import type { SignedIn } from '#shared/contracts/index.ts';
import { withFirm, type Door } from '#server/db/door.ts';
import type { Database } from '#server/db/connection.ts';
import { personOf } from '#server/http/person.ts';
import type { Account } from '#server/http/session.ts';

/** Who an account is, for the client; null when the person no longer belongs to the firm. */
export async function presentAccount(
  database: Database,
  account: Account,
  before: (door: Door, name: string) => Promise<void> = () => Promise.resolve(),
): Promise<SignedIn | null> {
  return withFirm(database, account, async (door) => {
    const person = await personOf(door);
    if (!person) return null;
    await before(door, person.name);
    const firm = await door.firm();
    const { id, name, email, roles } = person;
    return {
      person: { id, name, email },
      firm: {
        id: firm.id,
        name: firm.name,
        invented: firm.invented,
        solePractitioner: firm.solePractitioner,
      },
      roles: [...roles],
      abilities: abilities(person, actions),
    };
  });
}
