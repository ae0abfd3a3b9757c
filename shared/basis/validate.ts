import type { ValidateFunction } from 'ajv';
import type { Finding } from '#shared/engine/types.ts';
import { plainJsonProblems } from '#shared/validation/plainJson.ts';
import { problemsOf, validator } from '#shared/validation/validator.ts';
import { Edition, Member } from './schema/index.ts';

/** Largest document taken from outside, in characters of its JSON. */
export const documentBounds = { edition: 4_000_000, member: 200_000 };

const ajv = validator(false);
const editionShape = ajv.compile(Edition);
const memberShape = ajv.compile(Member);

function findings(shape: ValidateFunction, value: unknown, where: Finding['in'], most: number): Finding[] {
  const reserved = plainJsonProblems(value);
  const size = JSON.stringify(value).length;
  const problems =
    size > most
      ? [{ pointer: '', message: `The document is larger than ${most} characters.` }]
      : reserved.length > 0
        ? reserved
        : problemsOf(shape, value);
  return problems.map(({ pointer, message }) => ({
    severity: 'error',
    code: 'wrong-shape',
    message,
    pointer,
    in: where,
  }));
}

export type EditionShape = { ok: true; edition: Edition } | { ok: false; findings: Finding[] };
export type MemberShape = { ok: true; member: Member } | { ok: false; findings: Finding[] };

/** Whether a JSON value has the shape of an edition; every problem with its place. What it says is for compile. */
export function validateEdition(value: unknown): EditionShape {
  const found = findings(editionShape, value ?? null, 'edition', documentBounds.edition);
  return found.length ? { ok: false, findings: found } : { ok: true, edition: value as Edition };
}

/** Whether a JSON value has the shape of a member; every problem with its place. */
export function validateMember(value: unknown): MemberShape {
  const found = findings(memberShape, value ?? null, 'member', documentBounds.member);
  return found.length ? { ok: false, findings: found } : { ok: true, member: value as Member };
}
