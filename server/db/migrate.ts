import { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { grantsFor } from './grants.ts';
import { migrations } from './migrations/index.ts';
import { partsOf, prepareDatabase } from './prepare.ts';

/** Any number, the same in every process: only one migrates at a time. */
const LOCK = 7_246_019;

/**
 * Brings the database up to date: makes database and role where they are missing, runs the migrations that
 * have not run, each in a transaction of its own, and gives the application's role its rights.
 * Returns the names of the migrations that ran.
 */
export async function migrate(ownerUrl: string, appUrl: string): Promise<string[]> {
  await prepareDatabase(ownerUrl, appUrl);
  // One connection, so that the advisory lock is held by the session that migrates.
  const sequelize = new Sequelize(ownerUrl, { logging: false, pool: { max: 1 } });
  try {
    await sequelize.query(`SELECT pg_advisory_lock(${LOCK})`);
    const umzug = new Umzug({
      migrations: migrations.map(({ name, up }) => ({
        name,
        up: async () => {
          await sequelize.query(`BEGIN; ${up} COMMIT;`);
        },
      })),
      storage: new SequelizeStorage({ sequelize, tableName: 'migrations' }),
      logger: undefined,
    });
    const ran = await umzug.up();
    await sequelize.query(grantsFor(partsOf(appUrl).quoted));
    return ran.map(({ name }) => name);
  } finally {
    await sequelize.close();
  }
}
