import { createSession, deleteSession, readSession } from '#shared/contracts/index.ts';
import { Refusal } from '#server/http/problem.ts';
import { openRoute, type Route } from '#server/http/route.ts';
import { accountOf, closeSession, openSession, sessionCookie } from '#server/http/session.ts';
import { presentAccount } from './present.ts';

export const sessionRoutes: readonly Route[] = [
  openRoute(readSession, async ({ request, services: { database } }) => {
    const account = accountOf(request);
    const signedIn = account && (await presentAccount(database, account));
    return { signedIn, csrf: signedIn ? (request.session.csrf ?? null) : null };
  }),

  openRoute(createSession, async ({ request, body, services: { database, limits, sessions } }) => {
    const address = request.ip ?? '';
    await limits.signIn(body.email, address);
    const account = await sessions.authenticate(request);
    const signedIn =
      account &&
      (await presentAccount(database, account, (door, label) =>
        door.record(
          { kind: 'session.opened', v: 1, detail: {} },
          { type: 'person', id: door.personId, label },
        ),
      ));
    if (!account || !signedIn) {
      throw new Refusal('wrong-sign-in', 'Check the email and the password. Capitals count in the password.');
    }
    await limits.signedIn(body.email, address);
    return { signedIn, csrf: await openSession(request, account) };
  }),

  openRoute(deleteSession, async ({ request, services: { database } }) => {
    const account = accountOf(request);
    if (account) {
      await presentAccount(database, account, (door, label) =>
        door.record(
          { kind: 'session.closed', v: 1, detail: {} },
          { type: 'person', id: door.personId, label },
        ),
      );
    }
    await closeSession(request);
    request.res?.clearCookie(sessionCookie);
    return undefined;
  }),
];
