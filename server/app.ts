import express, { type Express } from 'express';
import type { Logger } from 'pino';
import { connect } from '#server/db/connection.ts';
import { basisRoutes } from '#server/features/bases/routes.ts';
import { deskRoutes } from '#server/features/desk/routes.ts';
import { draftRoutes } from '#server/features/drafts/routes.ts';
import { firmRoutes } from '#server/features/firm/routes.ts';
import { healthRoutes } from '#server/features/health/routes.ts';
import { memberRoutes } from '#server/features/members/routes.ts';
import { docsPages, openApiRoutes } from '#server/features/openapi/routes.ts';
import { projectRoutes } from '#server/features/projects/routes.ts';
import { sessionRoutes } from '#server/features/session/routes.ts';
import { stockRoutes } from '#server/features/stock/routes.ts';
import { trailRoutes } from '#server/features/trail/routes.ts';
import { accountsOf } from '#server/http/accounts.ts';
import { serveClient } from '#server/http/client.ts';
import { createLimits, type LimitOptions } from '#server/http/limits.ts';
import { createLog, logRequests } from '#server/http/log.ts';
import { createPasswords } from '#server/http/passwords.ts';
import { answerErrors, notFound } from '#server/http/problem.ts';
import { register } from '#server/http/register.ts';
import { securityHeaders } from '#server/http/security.ts';
import type { Services } from '#server/http/services.ts';
import { createSessions } from '#server/http/session.ts';
import { Judge } from '#server/judge/judge.ts';

export interface AppOptions {
  /** PostgreSQL as the application's role, which owns nothing. */
  databaseUrl: string;
  /** Signs the session cookie. */
  sessionSecret: string;
  /** Folder of the built client; left out: the API alone. */
  client?: string;
  log?: Logger;
  /** Express' `trust proxy`, when one stands in front; left out: none. */
  trustProxy?: string | number;
  limits?: LimitOptions;
  /** Cheap password hashing and answers held to their contracts: for the tests only. */
  testing?: boolean;
}

export interface App {
  express: Express;
  services: Services;
  close(): Promise<void>;
}

const routes = [
  ...healthRoutes,
  ...openApiRoutes,
  ...sessionRoutes,
  ...deskRoutes,
  ...projectRoutes,
  ...memberRoutes,
  ...basisRoutes,
  ...draftRoutes,
  ...stockRoutes,
  ...trailRoutes,
  ...firmRoutes,
];

/** Builds the application without listening. `close` ends its connections. */
export function buildApp(options: AppOptions): App {
  const { databaseUrl, sessionSecret, client, trustProxy, limits, testing = false } = options;
  const log = options.log ?? createLog('info');
  const database = connect(databaseUrl, {
    onPoolError: (error) => log.warn({ err: error }, 'a database connection broke'),
  });
  const passwords = createPasswords({ fast: testing });
  const sessions = createSessions(database, { secret: sessionSecret, find: accountsOf(database, passwords) });
  const services: Services = {
    database,
    sessions,
    judge: new Judge(),
    limits: createLimits(database, limits),
    log,
  };

  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  if (trustProxy !== undefined) app.set('trust proxy', trustProxy);
  app.use(logRequests(log), securityHeaders);
  app.use('/api', docsPages(), ...sessions.handlers, register(routes, services, { checkAnswers: testing }));
  if (client !== undefined) app.use(serveClient(client));
  app.use(() => {
    throw notFound();
  });
  app.use(answerErrors);
  return {
    express: app,
    services,
    close: async () => {
      sessions.close();
      await database.close();
    },
  };
}
