import request, { type Response } from 'supertest';
import type { Role } from '#shared/access/index.ts';
import type { Contract } from '#shared/contracts/index.ts';
import { buildApp, type App, type AppOptions } from '#server/app.ts';
import { createLog } from '#server/http/log.ts';
import { address } from './database.ts';
import { PASSWORD, type TestFirm } from './firm.ts';

/** The application against the test database, with answers held to their contracts. */
export function makeApp(options: Partial<AppOptions> = {}): App {
  return buildApp({
    databaseUrl: address('DATABASE_URL'),
    sessionSecret: 'for tests only',
    log: createLog('silent'),
    limits: { requestsAMinute: 100_000, signInsOfAddress: 100_000 },
    testing: true,
    ...options,
  });
}

export interface Sent {
  params?: Record<string, string>;
  query?: Record<string, string | number>;
  body?: unknown;
}

export interface Client {
  cookie: string;
  csrf: string;
  /** Calls an endpoint with the session's cookie and token. */
  call(contract: Contract, sent?: Sent): Promise<Response>;
}

function pathOf({ path }: Contract, params: Record<string, string>): string {
  return `/api${path.replaceAll(/:(\w+)/g, (_all, name: string) => params[name] ?? name)}`;
}

function send(app: App, headers: Record<string, string>) {
  return async (contract: Contract, { params = {}, query = {}, body }: Sent = {}) => {
    const method = contract.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    const call = request(app.express)[method](pathOf(contract, params)).set(headers).query(query);
    return body === undefined ? call : call.send(body as object);
  };
}

/** Someone who is not signed in. */
export function visitor(app: App): Client {
  return { cookie: '', csrf: '', call: send(app, {}) };
}

/** Signs in with email and password. */
export async function signIn(app: App, email: string, password = PASSWORD): Promise<Client> {
  const answer = await request(app.express).post('/api/session').send({ email, password });
  if (answer.status !== 200) throw new Error(`Sign-in was refused: ${answer.text}`);
  const cookie = (answer.get('Set-Cookie') ?? []).map((line) => line.split(';')[0]).join('; ');
  const { csrf } = answer.body as { csrf: string };
  return { cookie, csrf, call: send(app, { Cookie: cookie, 'X-CSRF-Token': csrf }) };
}

/** Signs in as the person of a firm who holds a role. */
export const signInAs = (app: App, firm: TestFirm, role: Role): Promise<Client> =>
  signIn(app, firm.people[role].email);
