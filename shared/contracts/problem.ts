import { Type, type Static } from '@sinclair/typebox';
import { oneOf } from '#shared/basis/schema/index.ts';

/** Every way a request can be turned down. */
export const problemCodes = {
  'malformed-body': { status: 400, title: 'The body could not be read' },
  'signed-out': { status: 401, title: 'You are signed out' },
  'session-expired': { status: 401, title: 'Your session has ended' },
  'wrong-sign-in': { status: 401, title: 'Email or password is not right' },
  'not-allowed': { status: 403, title: 'Your role does not allow this' },
  'foreign-request': { status: 403, title: 'The request did not come from this application' },
  'not-found': { status: 404, title: 'Not found' },
  'wrong-method': { status: 405, title: 'This address does not take that' },
  'stale-version': { status: 409, title: 'Someone saved a newer version' },
  'mark-taken': { status: 409, title: 'The mark is taken' },
  'not-in-this-state': { status: 409, title: 'Not possible in this state' },
  'too-large': { status: 413, title: 'The request is too large' },
  'wrong-media-type': { status: 415, title: 'The body has to be JSON' },
  'invalid-input': { status: 422, title: 'Some of what was sent is not right' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  'server-fault': { status: 500, title: 'Something went wrong on our side' },
  'database-away': { status: 503, title: 'The database does not answer' },
} as const;
export type ProblemCode = keyof typeof problemCodes;

/** What is wrong with one place of an input. */
export const InputProblem = Type.Object({
  /** RFC 6901 pointer into the body, or `?name` for the query. */
  pointer: Type.String(),
  message: Type.String(),
});
export type InputProblem = Static<typeof InputProblem>;

/** Problem details (RFC 9457), the shape of every answer that is not a success. */
export const Problem = Type.Object({
  type: Type.String({ format: 'uri-reference' }),
  title: Type.String(),
  status: Type.Integer(),
  detail: Type.String(),
  code: oneOf<ProblemCode>(...(Object.keys(problemCodes) as ProblemCode[])),
  /** Every problem of the input at once. */
  errors: Type.Optional(Type.Array(InputProblem)),
  /** Finds the event in the server's log. */
  reference: Type.Optional(Type.String()),
  /** Seconds after which it is worth trying again. */
  retryAfter: Type.Optional(Type.Integer()),
  /** On a stale version: what is stored, with its version and who saved it; and what was sent. */
  stored: Type.Optional(Type.Unknown()),
  sent: Type.Optional(Type.Unknown()),
});
export type Problem = Static<typeof Problem>;
