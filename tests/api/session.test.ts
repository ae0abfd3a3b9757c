import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  createSession,
  deleteSession,
  readDesk,
  readSession,
  updateProject,
  type Problem,
  type Session,
} from '#shared/contracts/index.ts';
import type { App } from '#server/app.ts';
import { makeApp, signIn, signInAs, visitor } from '#tests/factories/client.ts';
import { asOwner } from '#tests/factories/database.ts';
import { makeFirm, makeProject, PASSWORD, type TestFirm } from '#tests/factories/firm.ts';

const owner = asOwner();
let app: App;
let firm: TestFirm;

beforeAll(async () => {
  app = makeApp();
  firm = await makeFirm(owner);
});
afterAll(async () => {
  await app.close();
  await owner.close();
});

const problem = (answer: { body: unknown }) => answer.body as Problem;

describe('signing in', () => {
  it('tells who is signed in, to which firm, with roles and abilities', async () => {
    const client = await signInAs(app, firm, 'engineer');
    const { signedIn, csrf } = (await client.call(readSession)).body as Session;
    expect(signedIn?.person.email).toBe(firm.people.engineer.email);
    expect(signedIn?.firm).toMatchObject({ id: firm.firmId, invented: true, solePractitioner: false });
    expect(signedIn?.roles).toEqual(['engineer']);
    expect(signedIn?.abilities).toContain('projects.create');
    expect(signedIn?.abilities).not.toContain('bases.create');
    expect(csrf).toBe(client.csrf);
  });

  it('does not mind capitals in the email, but in the password', async () => {
    const { email } = firm.people.checker;
    await expect(signIn(app, email.toUpperCase())).resolves.toBeDefined();
    await expect(signIn(app, email, PASSWORD.toUpperCase())).rejects.toThrow('wrong-sign-in');
  });

  it('says the same for a wrong password and for an unknown account', async () => {
    const try_ = (email: string) =>
      request(app.express).post('/api/session').send({ email, password: 'not the password' });
    const wrong = await try_(firm.people.reader.email);
    const unknown = await try_('nobody@test.example');
    expect(wrong.status).toBe(401);
    expect(wrong.get('Content-Type')).toContain('application/problem+json');
    expect(unknown.body).toEqual(wrong.body);
    expect(wrong.get('Set-Cookie')).toBeUndefined();
  });

  it('gives a cookie that scripts and other sites can’t use, and a new session each time', async () => {
    const { email } = firm.people.reader;
    const planted = await signIn(app, email);
    const answer = await request(app.express)
      .post('/api/session')
      .set('Cookie', planted.cookie)
      .set('X-CSRF-Token', planted.csrf)
      .send({ email, password: PASSWORD });
    const [line] = answer.get('Set-Cookie') ?? [];
    expect(line).toMatch(/HttpOnly/);
    expect(line).toMatch(/SameSite=Lax/);
    expect(line?.split(';')[0]).not.toBe(planted.cookie);
    expect((await planted.call(readDesk)).status).toBe(401);
  });

  it('keeps the session of someone who goes on working', async () => {
    const client = await signInAs(app, firm, 'checker');
    const { pool } = app.services.database;
    const sid = decodeURIComponent(client.cookie).match(/=s:([^.]+)/)?.[1];
    await pool.query(`UPDATE sessions SET expire = now() + interval '1 minute' WHERE sid = $1`, [sid]);
    const answer = await client.call(readDesk);
    expect(answer.get('Set-Cookie')?.[0]?.split(';')[0]).toBe(client.cookie);
    const { rows } = await pool.query(
      `SELECT expire > now() + interval '11 hours' AS later FROM sessions WHERE sid = $1`,
      [sid],
    );
    expect(rows).toEqual([{ later: true }]);
  });

  it('marks the cookie for https where the request came over https', async () => {
    const behind = makeApp({ trustProxy: 'loopback' });
    const answer = await request(behind.express)
      .post('/api/session')
      .set('X-Forwarded-Proto', 'https')
      .send({ email: firm.people.reader.email, password: PASSWORD });
    expect(answer.get('Set-Cookie')?.[0]).toMatch(/Secure/);
    await behind.close();
  });

  it('ends a session at sign-out, for good', async () => {
    const client = await signInAs(app, firm, 'engineer');
    expect((await client.call(deleteSession)).status).toBe(204);
    expect(problem(await client.call(readDesk)).code).toBe('session-expired');
  });

  it('says that a session has ended, as against never having been', async () => {
    const client = await signInAs(app, firm, 'engineer');
    const sid = decodeURIComponent(client.cookie).match(/=s:([^.]+)/)?.[1];
    const { pool } = app.services.database;
    await pool.query(`UPDATE sessions SET expire = now() - interval '1 minute' WHERE sid = $1`, [sid]);
    const answer = await client.call(readDesk);
    expect([answer.status, problem(answer).code]).toEqual([401, 'session-expired']);
    expect(problem(await visitor(app).call(readDesk)).code).toBe('signed-out');
  });

  it('lets a role go at once when it is taken away', async () => {
    const other = await makeFirm(owner);
    const client = await signInAs(app, other, 'keeper');
    expect((await client.call(readDesk)).status).toBe(200);
    await other.as('principal', async (door) => {
      const membership = await door.memberships.one({ personId: other.people.keeper.id });
      if (membership) await door.memberships.change(membership, { active: false });
      await door.record(
        { kind: 'person.roles-changed', v: 1, detail: { name: other.people.keeper.name, roles: [] } },
        { type: 'person', id: other.people.keeper.id, label: other.people.keeper.name },
      );
    });
    expect((await client.call(readDesk)).status).toBe(401);
    await expect(signIn(app, other.people.keeper.email)).rejects.toThrow('wrong-sign-in');
  });

  it('puts signing in and out on the trail', async () => {
    const client = await signInAs(app, firm, 'principal');
    await client.call(deleteSession);
    const kinds = await firm.as('principal', async (door) =>
      (await door.trail.all({ personId: firm.people.principal.id })).map(({ kind }) => kind),
    );
    expect(kinds).toEqual(expect.arrayContaining(['session.opened', 'session.closed']));
  });
});

describe('too many attempts', () => {
  it('are refused with the time to wait, for this account and address only', async () => {
    const limited = makeApp({ limits: { signIns: 3, signInsOfAddress: 100_000 } });
    const { email } = (await makeFirm(owner)).people.engineer;
    const attempt = (password: string) =>
      request(limited.express).post('/api/session').send({ email, password });
    for (let i = 0; i < 3; i += 1) expect((await attempt('wrong')).status).toBe(401);
    const refused = await attempt(PASSWORD);
    expect([refused.status, problem(refused).code]).toEqual([429, 'too-many-requests']);
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(60);
    expect(problem(refused).retryAfter).toBe(Number(refused.get('Retry-After')));
    await expect(signIn(limited, firm.people.engineer.email)).resolves.toBeDefined();
    await limited.close();
  });

  it('hold over another process of the server, since they are counted in the database', async () => {
    const limits = { signIns: 1, signInsOfAddress: 100_000 };
    const [one, two] = [makeApp({ limits }), makeApp({ limits })];
    const { email } = (await makeFirm(owner)).people.engineer;
    const attempt = (at: App) => request(at.express).post('/api/session').send({ email, password: 'wrong' });
    expect((await attempt(one)).status).toBe(401);
    expect((await attempt(two)).status).toBe(429);
    await Promise.all([one.close(), two.close()]);
  });

  it('do not add up for someone who signs in rightly', async () => {
    const limited = makeApp({ limits: { signIns: 2, signInsOfAddress: 100_000 } });
    const { email } = (await makeFirm(owner)).people.engineer;
    for (let i = 0; i < 5; i += 1) await expect(signIn(limited, email)).resolves.toBeDefined();
    await limited.close();
  });

  it('of anything are refused in the same way', async () => {
    const limited = makeApp({ limits: { requestsAMinute: 2 } });
    const call = () => request(limited.express).get('/api/health');
    expect((await call()).status).toBe(200);
    expect((await call()).status).toBe(200);
    expect((await call()).status).toBe(429);
    await limited.close();
  });
});

describe('requests from elsewhere', () => {
  const body = { version: 1, title: 'Changed' };
  const patch = async (headers: Record<string, string>) => {
    const client = await signInAs(app, firm, 'engineer');
    const { id } = await makeProject(firm, { edition: null });
    return request(app.express)
      .patch(updateProject.path.replace('/projects/:id', `/api/projects/${id}`))
      .set({ Cookie: client.cookie, 'X-CSRF-Token': client.csrf, ...headers })
      .send(body);
  };

  it('are taken with the token of the session and from the same origin', async () => {
    expect((await patch({})).status).toBe(200);
    expect((await patch({ 'Sec-Fetch-Site': 'same-origin' })).status).toBe(200);
  });

  it.each([
    ['without a token', { 'X-CSRF-Token': '' }],
    ['with another token', { 'X-CSRF-Token': 'x'.repeat(32) }],
    ['from another site', { 'Sec-Fetch-Site': 'cross-site' }],
    ['from a sister of the site', { 'Sec-Fetch-Site': 'same-site' }],
    ['from another origin', { Origin: 'https://elsewhere.example' }],
    ['from an origin that is none', { Origin: 'null' }],
  ])('are refused %s', async (_how, headers) => {
    const answer = await patch(headers);
    expect([answer.status, problem(answer).code]).toEqual([403, 'foreign-request']);
  });

  it('can’t sign anyone in either', async () => {
    const answer = await request(app.express)
      .post('/api/session')
      .set('Sec-Fetch-Site', 'cross-site')
      .send({ email: firm.people.reader.email, password: PASSWORD });
    expect(answer.status).toBe(403);
    expect(createSession.action).toBe('session.create');
  });
});
