import { connect, type Database } from '#server/db/connection.ts';

/** An address that the test commands give; without it there is nothing to test against. */
export function address(name: 'DATABASE_URL' | 'DATABASE_OWNER_URL'): string {
  const url = process.env[name];
  if (!url) throw new Error(`${name} is not set. Run the tests with npm test.`);
  return url;
}

/** A connection as the application's role. */
export const asApp = (): Database => connect(address('DATABASE_URL'), { most: 4 });

/** A connection as the owner. */
export const asOwner = (): Database => connect(address('DATABASE_OWNER_URL'), { most: 2 });
