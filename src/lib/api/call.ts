import type { Body, Contract, Output, Params, Query } from '#shared/contracts/contract.ts';
import type { Problem } from '#shared/contracts/problem.ts';
import { readSession, type Session } from '#shared/contracts/session.ts';

/** What the server turned down, as it said it; or that it could not be reached. */
export class ApiProblem extends Error {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail);
    this.problem = problem;
  }

  get code(): Problem['code'] | 'offline' {
    return this.problem.status === 0 ? 'offline' : this.problem.code;
  }
}

const offline: Problem = {
  type: 'about:blank',
  title: 'The server can’t be reached',
  status: 0,
  code: 'database-away',
  detail:
    'The server can’t be reached. What you typed is kept on this machine; try again when the connection is back.',
};

let held: { csrf: string; person: string | null } = { csrf: '', person: null };
let signInAgain: (() => Promise<boolean>) | null = null;

/** Keeps the token that goes with everything that changes something, and whose it is. */
export function keepSession({ csrf, signedIn }: Session): void {
  held = { csrf: csrf ?? '', person: signedIn?.person.id ?? null };
}

/** What to do when the session has ended in the middle of work: asks, and says whether it was renewed. */
export function onSessionEnd(ask: (() => Promise<boolean>) | null): void {
  signInAgain = ask;
}

type Input<C extends Contract> = {
  params?: Params<C>;
  query?: Query<C>;
  body?: Body<C>;
  signal?: AbortSignal;
};

function addressOf(contract: Contract, params: object | undefined, query: object | undefined): string {
  const given = (params ?? {}) as Record<string, string>;
  const path = contract.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(given[name] ?? ''));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined) search.set(name, String(value));
  }
  const text = search.toString();
  return `/api${path}${text === '' ? '' : `?${text}`}`;
}

async function send(contract: Contract, input: Input<Contract>): Promise<Response> {
  try {
    return await fetch(addressOf(contract, input.params, input.query), {
      method: contract.method,
      credentials: 'same-origin',
      headers: {
        Accept: 'application/json',
        ...(contract.method === 'GET' ? {} : { 'X-CSRF-Token': held.csrf }),
        ...(input.body === undefined ? {} : { 'Content-Type': 'application/json' }),
      },
      ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
      ...(input.signal ? { signal: input.signal } : {}),
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiProblem(offline);
  }
}

async function problemOf(response: Response): Promise<Problem> {
  try {
    return (await response.json()) as Problem;
  } catch {
    return { ...offline, status: response.status, title: 'The server answered in a way that can’t be read' };
  }
}

/**
 * Whoever signs in anew in another window changes the token of this one. The new token is taken, as long as
 * it is the same person's: nobody acts in a colleague's name without seeing it.
 */
async function takeNewToken(): Promise<boolean> {
  const before = held;
  const response = await send(readSession, {});
  if (!response.ok) return false;
  const session = (await response.json()) as Session;
  if (session.csrf === before.csrf || (session.signedIn?.person.id ?? null) !== before.person) return false;
  keepSession(session);
  return true;
}

/**
 * Calls an endpoint. Everything that is not a success is thrown as an `ApiProblem`. When the session has
 * ended the person is asked to sign in again over the page, and the call is repeated.
 */
export async function call<C extends Contract>(contract: C, input: Input<C> = {}): Promise<Output<C>> {
  let tokenTaken = false;
  for (;;) {
    const response = await send(contract, input as Input<Contract>);
    if (response.ok) return (response.status === 204 ? undefined : await response.json()) as Output<C>;
    const problem = await problemOf(response);
    const ended = problem.code === 'session-expired' || problem.code === 'signed-out';
    if (ended && signInAgain && !contract.path.startsWith('/session') && (await signInAgain())) continue;
    if (problem.code === 'foreign-request' && !tokenTaken && (await takeNewToken())) {
      tokenTaken = true;
      continue;
    }
    throw new ApiProblem(problem);
  }
}
