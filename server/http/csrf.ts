import { timingSafeEqual } from 'node:crypto';
import type { Request } from 'express';
import { accountOf } from './session.ts';
import { Refusal } from './problem.ts';

/**
 * Refuses a request that changes something unless it came from this application. Two defences: browsers say
 * where a request comes from (`Sec-Fetch-Site`, or else `Origin`), and a signed-in request carries the
 * token of its session in `X-CSRF-Token`. Bodies are JSON only, which no form can send. A program that is
 * not a browser sends neither header, and has no cookie that someone could borrow.
 */
export function refuseForeign(request: Request): void {
  if (request.method === 'GET' || request.method === 'HEAD') return;
  if (!sameOrigin(request)) throw foreign('It was sent from another site.');
  if (accountOf(request) && !hasToken(request)) {
    throw foreign('Its token is missing or old. Reload the page; what you typed is kept there.');
  }
}

function sameOrigin(request: Request): boolean {
  const site = request.get('Sec-Fetch-Site');
  if (site !== undefined) return site === 'same-origin' || site === 'none';
  const origin = request.get('Origin');
  if (origin === undefined) return true;
  return URL.canParse(origin) && new URL(origin).host === request.get('Host');
}

function hasToken(request: Request): boolean {
  const expected = Buffer.from(request.session.csrf ?? '');
  const given = Buffer.from(request.get('X-CSRF-Token') ?? '');
  return expected.length > 0 && expected.length === given.length && timingSafeEqual(expected, given);
}

function foreign(why: string): Refusal {
  return new Refusal('foreign-request', `The request was refused. ${why}`);
}
