import type { Body, Contract, Output, Params, Query } from '#shared/contracts/contract.ts';
import type { Problem } from '#shared/contracts/problem.ts';

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

let csrf = '';
let signInAgain: (() => Promise<boolean>) | null = null;

/** The token that goes with everything that changes something. */
export function keepToken(token: string | null): void {
  csrf = token ?? '';
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
        ...(contract.method === 'GET' ? {} : { 'X-CSRF-Token': csrf }),
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
 * Calls an endpoint. Everything that is not a success is thrown as an `ApiProblem`. When the session has
 * ended the person is asked to sign in again over the page, and the call is repeated.
 */
export async function call<C extends Contract>(contract: C, input: Input<C> = {}): Promise<Output<C>> {
  const response = await send(contract, input as Input<Contract>);
  if (response.ok) return (response.status === 204 ? undefined : await response.json()) as Output<C>;
  const problem = await problemOf(response);
  const ended = problem.code === 'session-expired' || problem.code === 'signed-out';
  if (ended && signInAgain && !contract.path.startsWith('/session') && (await signInAgain())) {
    return call(contract, input);
  }
  throw new ApiProblem(problem);
}
