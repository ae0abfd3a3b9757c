import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import canonicalize from 'canonicalize';
import type { Edition, Member } from './schema/index.ts';

/** The canonical text of a JSON value (RFC 8785). */
export function canonical(value: unknown): string {
  return canonicalize(value) ?? 'null';
}

/** SHA-256 over the RFC 8785 form of a JSON value, in hexadecimal. */
export function hashOf(value: unknown): string {
  return bytesToHex(sha256(utf8ToBytes(canonical(value))));
}

export const editionHash = (edition: Edition): string => hashOf(edition);
export const memberHash = (member: Member): string => hashOf(member);
