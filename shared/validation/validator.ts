import type { ValidateFunction } from 'ajv';
import { Ajv2020 } from 'ajv/dist/2020.js';
import formats from 'ajv-formats';
import type { InputProblem } from '#shared/contracts/problem.ts';
import { narrowAlternatives } from './alternatives.ts';
import { sentenceOf } from './sentences.ts';

/*
 * The one validator. It generates code, which the browser's content-security policy forbids: only the
 * server and the tools import this file.
 */

/** A validator of JSON Schema 2020-12 that finds every problem at once. */
export function validator(coerceTypes: boolean): Ajv2020 {
  const ajv = new Ajv2020({ allErrors: true, useDefaults: true, coerceTypes, strict: true, verbose: true });
  return formats.default(ajv, ['uuid', 'date-time', 'uri-reference']);
}

/** Every problem of a value in plain sentences, each at its place. */
export function problemsOf(validate: ValidateFunction, value: unknown): InputProblem[] {
  if (validate(value)) return [];
  const problems = narrowAlternatives(validate.errors ?? []).map(sentenceOf);
  const seen = new Set<string>();
  return problems.filter(({ pointer, message }) => {
    const key = `${pointer} ${message}`;
    return seen.has(key) ? false : seen.add(key);
  });
}
