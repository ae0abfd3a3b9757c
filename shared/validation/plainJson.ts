import type { InputProblem } from '#shared/contracts/problem.ts';

const DEEPEST = 60;
const reserved = new Set(['__proto__', 'constructor', 'prototype']);

/**
 * What no JSON from outside may hold, whatever its schema says: names that reach into prototypes, text that
 * the database can't store (the null character, halves of a surrogate pair), nesting without end.
 */
export function plainJsonProblems(value: unknown): InputProblem[] {
  const problems: InputProblem[] = [];
  walk(value, '', 0, problems);
  return problems;
}

function walk(value: unknown, pointer: string, depth: number, problems: InputProblem[]): void {
  if (problems.length >= 20) return;
  if (typeof value === 'string') {
    if (!isStorable(value)) problems.push({ pointer, message: 'Holds a character that can’t be stored.' });
    return;
  }
  if (typeof value !== 'object' || value === null) return;
  if (depth >= DEEPEST) {
    problems.push({ pointer, message: 'Is nested too deeply.' });
    return;
  }
  for (const [key, inner] of Object.entries(value)) {
    const at = `${pointer}/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`;
    if (reserved.has(key) || !isStorable(key))
      problems.push({ pointer: at, message: 'This name can’t be used.' });
    else walk(inner, at, depth + 1, problems);
  }
}

function isStorable(text: string): boolean {
  return !text.includes('\u0000') && !/\p{Surrogate}/u.test(text);
}
