import { Type, type Static } from '@sinclair/typebox';
import { closed } from '#shared/basis/schema/index.ts';
import { Abilities, nullable, PersonName, Role, Uuid } from './common.ts';
import { contract } from './contract.ts';

/** Who is signed in to which firm. */
export const SignedIn = closed({
  person: closed({ ...PersonName.properties, email: Type.String() }),
  firm: closed({
    id: Uuid,
    name: Type.String(),
    /** The firm is made up for a demonstration. */
    invented: Type.Boolean(),
    /** The firm has openly switched off the second person; every sheet then says so. */
    solePractitioner: Type.Boolean(),
  }),
  roles: Type.Array(Role),
  /** What the person may do in the firm whatever the record, such as `projects.create`. */
  abilities: Abilities,
});
export type SignedIn = Static<typeof SignedIn>;

/** `csrf` goes into the `X-CSRF-Token` header of every request that changes something. */
export const Session = closed({ signedIn: nullable(SignedIn), csrf: nullable(Type.String()) });
export type Session = Static<typeof Session>;

export const readSession = contract({
  name: 'readSession',
  method: 'GET',
  path: '/session',
  action: 'session.read',
  summary: 'Who is signed in, or that nobody is',
  output: Session,
});

export const createSession = contract({
  name: 'createSession',
  method: 'POST',
  path: '/session',
  action: 'session.create',
  summary: 'Sign in',
  body: closed({
    email: Type.String({ minLength: 3, maxLength: 254 }),
    password: Type.String({ minLength: 1, maxLength: 200 }),
  }),
  example: { email: 'someone@firm.example', password: 'a long sentence' },
  output: Session,
});

export const deleteSession = contract({
  name: 'deleteSession',
  method: 'DELETE',
  path: '/session',
  action: 'session.delete',
  summary: 'Sign out',
  output: null,
});
