import type { ErrorRequestHandler, Response } from 'express';
import { BaseError, ConnectionError, DatabaseError } from 'sequelize';
import { problemCodes, type InputProblem, type Problem, type ProblemCode } from '#shared/contracts/index.ts';

type Extra = Pick<Problem, 'errors' | 'retryAfter' | 'stored' | 'sent'>;

/** A request turned down for a reason that the person is told: thrown anywhere, answered in one place. */
export class Refusal extends Error {
  readonly code: ProblemCode;
  readonly extra: Extra;

  constructor(code: ProblemCode, detail: string, extra: Extra = {}) {
    super(detail);
    this.code = code;
    this.extra = extra;
  }
}

/** Input refused, with every problem in its place. */
export function invalid(errors: InputProblem[]): Refusal {
  const count = errors.length === 1 ? 'One thing has' : `${errors.length} things have`;
  return new Refusal('invalid-input', `${count} to be put right; nothing was saved.`, { errors });
}

/** Not there, or not for this person to see: the same words for both. */
export function notFound(): Refusal {
  return new Refusal(
    'not-found',
    'There is nothing here for you. Check the address, or go back to the desk.',
  );
}

/** The problem document (RFC 9457) of an error, without anything of the server's inside. */
export function problemOf(error: unknown, reference: string): Problem {
  const refusal = refusalOf(error);
  const code = refusal?.code ?? 'server-fault';
  const { status, title } = problemCodes[code];
  const detail =
    refusal?.message ??
    `Something failed on the server and nothing was saved. Try again; if it stays, tell your administrator the reference ${reference}.`;
  return {
    type: `/api/docs#${code}`,
    title,
    status,
    detail,
    code,
    ...refusal?.extra,
    ...(status >= 500 ? { reference } : {}),
  };
}

export function refusalOf(error: unknown): Refusal | null {
  if (error instanceof Refusal) return error;
  if (isAway(error)) {
    return new Refusal(
      'database-away',
      'The database does not answer; nothing was saved. Try again in a moment.',
    );
  }
  return refusalOfBody(error);
}

/** What Express' reader of bodies and addresses throws. */
function refusalOfBody(error: unknown): Refusal | null {
  if (typeof error !== 'object' || error === null || !('type' in error)) {
    return error instanceof URIError
      ? new Refusal('malformed-body', 'The address could not be read. Check its percent signs.')
      : null;
  }
  switch (error.type) {
    case 'entity.too.large':
      return new Refusal('too-large', 'The body is larger than this address takes. Send less at once.');
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new Refusal('wrong-media-type', 'Send the body as JSON in UTF-8.');
    case 'entity.parse.failed':
    case 'request.size.invalid':
    case 'request.aborted':
      return new Refusal('malformed-body', 'The body is not JSON that can be read. Check commas and quotes.');
    default:
      return null;
  }
}

const awayCodes = new Set(['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'ENOTFOUND', 'EAI_AGAIN', 'EPIPE']);
/** SQLSTATE: shut down, starting up, too many connections; class 08: connection. */
const awayStates = /^(08...|57P0[123]|53300)$/;

/** Whether an error means that the database can't be reached, as against something wrong with a query. */
export function isAway(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  if (error instanceof DatabaseError || error instanceof BaseError) {
    return 'original' in error && isAway(error.original);
  }
  if (!(error instanceof Error)) return false;
  if (/^(Connection terminated|timeout exceeded when trying to connect)/.test(error.message)) return true;
  const code = 'code' in error && typeof error.code === 'string' ? error.code : '';
  return awayCodes.has(code) || awayStates.test(code);
}

export function sendProblem(response: Response, problem: Problem): void {
  if (problem.retryAfter !== undefined) response.set('Retry-After', String(problem.retryAfter));
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
}

/** Turns every error into a problem document; what is the server's own fault is logged with a reference. */
export const answerErrors: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const problem = problemOf(error, String(request.id));
  if (problem.status >= 500)
    request.log.error({ err: error, reference: problem.reference }, 'request failed');
  sendProblem(response, problem);
};
