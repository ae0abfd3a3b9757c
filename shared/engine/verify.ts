import { canonical, hashOf } from '#shared/basis/hash.ts';
import { check } from './check.ts';
import { compile } from './compile.ts';
import type { Edition, Member, Result } from './types.ts';

/** SHA-256 over the RFC 8785 form of a result, in hexadecimal. */
export const resultHash = (result: Result): string => hashOf(result);

/** Most differences named. */
const MOST = 20;

/**
 * Recomputes a stored result from its stored inputs and compares the two byte for byte, in their RFC 8785
 * form. `differences` names where they part, by JSON pointer.
 */
export function verify(
  edition: Edition,
  member: Member,
  stored: Result,
): { same: boolean; differences: string[] } {
  const outcome = compile(edition);
  if (!outcome.ok) {
    return { same: false, differences: ['The stored edition no longer compiles with this engine.'] };
  }
  const again = check(outcome.plan, member);
  if (canonical(again) === canonical(stored)) return { same: true, differences: [] };
  const differences: string[] = [];
  compare(stored, again, '', differences);
  return { same: false, differences };
}

function compare(a: unknown, b: unknown, pointer: string, into: string[]): void {
  if (into.length >= MOST || Object.is(a, b)) return;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) {
    into.push(`${pointer || '/'}: ${short(a)} is stored, ${short(b)} is computed.`);
    return;
  }
  const left = a as Record<string, unknown>;
  const right = b as Record<string, unknown>;
  for (const key of new Set([...Object.keys(left), ...Object.keys(right)])) {
    compare(left[key], right[key], `${pointer}/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`, into);
  }
}

function short(value: unknown): string {
  const text = value === undefined ? 'nothing' : JSON.stringify(value);
  return text.length > 80 ? `${text.slice(0, 77)}…` : text;
}
