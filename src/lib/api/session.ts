import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { Action } from '#shared/access/index.ts';
import {
  createSession,
  deleteSession,
  readSession,
  type Session,
  type SignedIn,
} from '#shared/contracts/session.ts';
import { call, keepSession } from './call.ts';

export const sessionKey = ['session'] as const;

async function fetchSession(): Promise<Session> {
  const session = await call(readSession);
  keepSession(session);
  return session;
}

/**
 * Who is signed in. Asked once: that a session has ended shows at the next call, which asks for the password
 * over the page. Asked again meanwhile, the page would be left with everything typed on it.
 */
export function useSession() {
  return useQuery({ queryKey: sessionKey, queryFn: fetchSession, staleTime: Infinity, gcTime: Infinity });
}

/** The person signed in; only within pages that need one. */
export function useSignedIn(): SignedIn {
  const { data } = useSession();
  if (!data?.signedIn) throw new Error('This page needs someone signed in.');
  return data.signedIn;
}

export const may = (record: { abilities: readonly Action[] } | undefined, action: Action): boolean =>
  record?.abilities.includes(action) ?? false;

export function useSignIn() {
  const client = useQueryClient();
  return async (email: string, password: string): Promise<Session> => {
    await fetchSession();
    const session = await call(createSession, { body: { email, password } });
    keepSession(session);
    client.setQueryData(sessionKey, session);
    return session;
  };
}

export function useSignOut() {
  const client = useQueryClient();
  return async (): Promise<void> => {
    await call(deleteSession);
    client.clear();
    await client.fetchQuery({ queryKey: sessionKey, queryFn: fetchSession });
  };
}
