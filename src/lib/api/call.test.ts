import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createProject, listProjects, readProject } from '#shared/contracts/projects.ts';
import type { ProblemCode } from '#shared/contracts/problem.ts';
import { createSession, type Session } from '#shared/contracts/session.ts';
import { ApiProblem, call, keepSession, onSessionEnd } from './call.ts';

/** A session as the server tells it; made up. */
const session = (person: string, csrf: string): Session => ({
  csrf,
  signedIn: {
    person: { id: person, name: 'A. Person', email: 'a@firm.example' },
    firm: { id: 'firm', name: 'A firm', invented: true, solePractitioner: false },
    roles: ['engineer'],
    abilities: [],
  },
});
const answer = (body: unknown, status = 200) => new Response(JSON.stringify(body), { status });
const problem = (code: ProblemCode, status: number) =>
  answer({ type: 'about:blank', title: code, status, code, detail: `It is ${code}.` }, status);

const server = vi.fn<(address: string, init: RequestInit) => Promise<Response>>();
const sent = (index: number) => new Headers(server.mock.calls[index]?.[1].headers);
const addresses = () => server.mock.calls.map(([address]) => address);
/** The problem a call ends in. */
const refusal = async (of: Promise<unknown>): Promise<ApiProblem> => {
  const error = await of.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  if (error instanceof ApiProblem) return error;
  throw new Error('It was not turned down.');
};

beforeEach(() => {
  server.mockReset();
  vi.stubGlobal('fetch', server);
  keepSession(session('p', 'first'));
});
afterEach(() => {
  onSessionEnd(null);
  vi.unstubAllGlobals();
});

describe('calling an endpoint', () => {
  it('fills path and query, and sends the token only with what changes something', async () => {
    server.mockImplementation(() => Promise.resolve(answer({})));
    await call(readProject, { params: { id: 'a/b' } });
    await call(listProjects, { query: { search: 'barn & yard', size: 20 } });
    await call(createProject, { body: { title: 'Barn' } });
    expect(addresses()).toEqual([
      '/api/projects/a%2Fb',
      '/api/projects?search=barn+%26+yard&size=20',
      '/api/projects',
    ]);
    expect(sent(0).has('X-CSRF-Token')).toBe(false);
    expect(sent(2).get('X-CSRF-Token')).toBe('first');
    expect(server.mock.calls[2]?.[1].body).toBe('{"title":"Barn"}');
  });

  it('throws what the server turned down, with its words and places', async () => {
    server.mockResolvedValue(
      answer(
        {
          type: 'about:blank',
          title: 'Some of what was sent is not right',
          status: 422,
          code: 'invalid-input',
          detail: 'One place.',
          errors: [{ pointer: '/title', message: 'The title is missing.' }],
        },
        422,
      ),
    );
    const { code, problem: said } = await refusal(call(createProject, { body: { title: '' } }));
    expect(code).toBe('invalid-input');
    expect(said.errors).toEqual([{ pointer: '/title', message: 'The title is missing.' }]);
  });

  it('says in a sentence that the server can’t be reached, or can’t be understood', async () => {
    server.mockRejectedValueOnce(new TypeError('Failed to fetch'));
    const away = await refusal(call(listProjects));
    expect(away.code).toBe('offline');
    expect(away.message).toMatch(/can’t be reached/);
    server.mockResolvedValueOnce(new Response('<h1>Bad gateway</h1>', { status: 502 }));
    const unread = await refusal(call(listProjects));
    expect(unread.code).not.toBe('offline');
    expect(unread.problem.status).toBe(502);
  });

  it('passes on that it was called off', async () => {
    server.mockRejectedValue(new DOMException('called off', 'AbortError'));
    await expect(call(listProjects)).rejects.toThrow('called off');
  });
});

describe('a session that has ended', () => {
  it('asks for the password and repeats the call with the new token', async () => {
    server
      .mockResolvedValueOnce(problem('session-expired', 401))
      .mockResolvedValueOnce(answer({ title: 'Barn' }));
    const ask = vi.fn(() => {
      keepSession(session('p', 'second'));
      return Promise.resolve(true);
    });
    onSessionEnd(ask);
    expect(await call(createProject, { body: { title: 'Barn' } })).toEqual({ title: 'Barn' });
    expect(ask).toHaveBeenCalledOnce();
    expect(server.mock.calls[1]?.[1].body).toBe('{"title":"Barn"}');
    expect(sent(1).get('X-CSRF-Token')).toBe('second');
  });

  it('gives up when the person does', async () => {
    server.mockResolvedValue(problem('signed-out', 401));
    onSessionEnd(() => Promise.resolve(false));
    expect((await refusal(call(listProjects))).code).toBe('signed-out');
    expect(server).toHaveBeenCalledOnce();
  });

  it('does not ask while signing in', async () => {
    server.mockResolvedValue(problem('signed-out', 401));
    const ask = vi.fn(() => Promise.resolve(true));
    onSessionEnd(ask);
    await refusal(call(createSession, { body: { email: 'a@firm.example', password: 'not it' } }));
    expect(ask).not.toHaveBeenCalled();
  });
});

describe('a token that another window changed', () => {
  const save = () => call(createProject, { body: { title: 'Barn' } });

  it('is taken when it is the same person’s', async () => {
    server
      .mockResolvedValueOnce(problem('foreign-request', 403))
      .mockResolvedValueOnce(answer(session('p', 'second')))
      .mockResolvedValueOnce(answer({ title: 'Barn' }));
    expect(await save()).toEqual({ title: 'Barn' });
    expect(addresses()).toEqual(['/api/projects', '/api/session', '/api/projects']);
    expect(sent(2).get('X-CSRF-Token')).toBe('second');
  });

  it('is not taken when a colleague has signed in there', async () => {
    server
      .mockResolvedValueOnce(problem('foreign-request', 403))
      .mockResolvedValueOnce(answer(session('q', 'second')));
    expect((await refusal(save())).code).toBe('foreign-request');
    expect(server).toHaveBeenCalledTimes(2);
  });

  it('is asked for once only', async () => {
    let turn = 0;
    server.mockImplementation((address) =>
      Promise.resolve(
        address === '/api/session'
          ? answer(session('p', `token ${(turn += 1)}`))
          : problem('foreign-request', 403),
      ),
    );
    expect((await refusal(save())).code).toBe('foreign-request');
    expect(server).toHaveBeenCalledTimes(3);
  });
});
