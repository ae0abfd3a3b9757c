import { randomBytes } from 'node:crypto';
import connectPgSimple from 'connect-pg-simple';
import type { Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Database } from '#server/db/connection.ts';

const COOKIE = 'ledgerbeam';
const HOURS_12 = 12 * 60 * 60 * 1000;

/** Who a session belongs to. Roles are read afresh with each request, so that a change holds at once. */
export interface Account {
  personId: string;
  firmId: string;
}

declare module 'express-session' {
  interface SessionData {
    csrf: string;
  }
}

export interface Sessions {
  handlers: RequestHandler[];
  /** The account that the email and password in the body belong to, or null. */
  authenticate(request: Request): Promise<Account | null>;
  close(): void;
}

export interface SessionOptions {
  secret: string;
  find: (email: string, password: string) => Promise<Account | null>;
}

/** Sessions in PostgreSQL behind an HttpOnly, SameSite=Lax cookie, ended by 12 hours without a request. */
export function createSessions({ pool }: Database, { secret, find }: SessionOptions): Sessions {
  const Store = connectPgSimple(session);
  const store = new Store({
    pool,
    tableName: 'sessions',
    createTableIfMissing: false,
    pruneSessionInterval: 15 * 60,
  });
  const keeper = new passport.Passport();
  keeper.serializeUser((user, done) => done(null, user));
  keeper.deserializeUser((stored: unknown, done) => done(null, isAccount(stored) ? stored : false));
  keeper.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      find(email, password).then(
        (account) => done(null, account ?? false),
        (error: unknown) => done(error),
      );
    }),
  );
  return {
    handlers: [
      session({
        store,
        name: COOKIE,
        secret,
        resave: false,
        // The cookie is given anew with each answer, so that the 12 hours begin again.
        rolling: true,
        saveUninitialized: false,
        cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: HOURS_12 },
      }),
      keeper.session(),
    ],
    authenticate: (request) =>
      new Promise((resolve, reject) => {
        const answer = (error: unknown, user: unknown) => {
          if (error) reject(error instanceof Error ? error : new Error('Sign-in failed.'));
          else resolve(isAccount(user) ? user : null);
        };
        const check = keeper.authenticate('local', { session: false }, answer) as RequestHandler;
        void check(request, request.res as Response, reject);
      }),
    close: () => store.close(),
  };
}

/** The account a request is signed in to, or null. */
export function accountOf(request: Request): Account | null {
  return isAccount(request.user) ? request.user : null;
}

/** Whether a request without an account came with the cookie of a session that has ended. */
export function hadSession(request: Request): boolean {
  return new RegExp(`(?:^|;\\s*)${COOKIE}=`).test(request.headers.cookie ?? '');
}

/** Signs in: passport gives the session a new id, so that one planted before is worth nothing. */
export function openSession(request: Request, account: Account): Promise<string> {
  return new Promise((resolve, reject) => {
    request.logIn(account, (error: unknown) => {
      if (error) {
        reject(error instanceof Error ? error : new Error('The session could not be opened.'));
        return;
      }
      request.session.csrf = randomBytes(24).toString('base64url');
      resolve(request.session.csrf);
    });
  });
}

/** Signs out: the session is gone from the database, and the cookie from the browser. */
export function closeSession(request: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    request.session.destroy((error: unknown) => {
      if (error) reject(error instanceof Error ? error : new Error('The session could not be closed.'));
      else resolve();
    });
  });
}

export const sessionCookie = COOKIE;

function isAccount(value: unknown): value is Account {
  return (
    typeof value === 'object' &&
    value !== null &&
    'personId' in value &&
    'firmId' in value &&
    typeof value.personId === 'string' &&
    typeof value.firmId === 'string'
  );
}
