import { RateLimiterMemory, RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { Database } from '#server/db/connection.ts';
import { Refusal } from './problem.ts';

export interface LimitOptions {
  /** Requests of one account or address in a minute. */
  requestsAMinute?: number;
  /** Sign-ins for one account from one address in 15 minutes. */
  signIns?: number;
  /** Sign-ins from one address in 15 minutes, whatever the account. */
  signInsOfAddress?: number;
}

export interface Limits {
  /** Counts a request; refuses when there were too many. */
  request(key: string): Promise<void>;
  /** Counts an attempt to sign in before the password is looked at. */
  signIn(email: string, address: string): Promise<void>;
  /** The attempt was right: the account's count starts again. */
  signedIn(email: string, address: string): Promise<void>;
}

const MINUTES_15 = 15 * 60;

/**
 * Sign-in is limited in PostgreSQL, so that it holds over several processes and restarts. The general limit
 * only keeps one client from taking the server for itself; it lives in the process, since a write for each
 * request would cost more than it guards.
 */
export function createLimits(database: Database, options: LimitOptions = {}): Limits {
  const { requestsAMinute = 1200, signIns = 10, signInsOfAddress = 100 } = options;
  const requests = new RateLimiterMemory({ points: requestsAMinute, duration: 60 });
  const inDatabase = (keyPrefix: string, points: number) =>
    new RateLimiterPostgres({
      storeClient: database.pool,
      storeType: 'pool',
      tableName: 'rate_limits',
      tableCreated: true,
      keyPrefix,
      points,
      duration: MINUTES_15,
    });
  const ofAccount = inDatabase('account', signIns);
  const ofAddress = inDatabase('address', signInsOfAddress);
  const account = (email: string, address: string) =>
    `${email.trim().toLowerCase().slice(0, 120)} ${address}`;
  return {
    request: (key) => consume(requests, key, 'Too much was asked for at once.'),
    async signIn(email, address) {
      const sentence = 'There were too many attempts to sign in.';
      await consume(ofAddress, address, sentence);
      await consume(ofAccount, account(email, address), sentence);
    },
    async signedIn(email, address) {
      await ofAccount.delete(account(email, address));
      await ofAddress.reward(address, 1);
    },
  };
}

async function consume(
  limiter: RateLimiterMemory | RateLimiterPostgres,
  key: string,
  sentence: string,
): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const retryAfter = Math.max(1, Math.ceil(error.msBeforeNext / 1000));
    throw new Refusal('too-many-requests', `${sentence} Wait ${wait(retryAfter)} and try again.`, {
      retryAfter,
    });
  }
}

function wait(seconds: number): string {
  if (seconds < 90) return seconds === 1 ? '1 second' : `${seconds} seconds`;
  return `${Math.ceil(seconds / 60)} minutes`;
}
