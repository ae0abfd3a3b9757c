import { readHealth } from '#shared/contracts/index.ts';
import { openRoute, type Route } from '#server/http/route.ts';

export const healthRoutes: readonly Route[] = [
  openRoute(readHealth, async ({ services: { database, judge } }) => {
    await database.sequelize.query('SELECT 1');
    return { status: 'well' as const, database: 'answers' as const, engine: judge.engine };
  }),
];
