import { migrate } from '#server/db/migrate.ts';

/** Brings the test database up to date, once before all tests that need it. */
export default async function prepare(): Promise<void> {
  const { DATABASE_OWNER_URL: owner, DATABASE_URL: app } = process.env;
  if (!owner || !app) throw new Error('There is no test database. Run the tests with npm test.');
  await migrate(owner, app);
}
