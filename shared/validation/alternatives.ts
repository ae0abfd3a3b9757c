import type { ErrorObject } from 'ajv';

/**
 * Where a value may have one of several forms, the validator complains about every form. This keeps the
 * complaints about the form that was meant: the one with the right word in its `kind`, or the right type.
 */
export function narrowAlternatives(errors: readonly ErrorObject[]): ErrorObject[] {
  let left = [...errors];
  const unions = errors
    .filter(({ keyword }) => keyword === 'anyOf')
    .sort((a, b) => a.schemaPath.length - b.schemaPath.length);
  for (const union of unions) {
    if (left.includes(union)) left = narrowOne(union, left);
  }
  return left;
}

function narrowOne(union: ErrorObject, errors: readonly ErrorObject[]): ErrorObject[] {
  const branches = new Map<string, ErrorObject[]>();
  const others: ErrorObject[] = [];
  for (const error of errors) {
    const branch = branchOf(union, error);
    if (branch === null) others.push(error);
    else branches.set(branch, [...(branches.get(branch) ?? []), error]);
  }
  const rest = others.filter((error) => error !== union);
  const meant = [...branches.values()].filter((branch) => !branch.some((error) => isOtherForm(union, error)));
  if (meant.length === 1 && meant[0]) return [...rest, ...meant[0]];
  return [...rest, wordsInstead(union, [...branches.values()].flat()) ?? union];
}

/** Name of the alternative an error belongs to, or null when it belongs to none of this union. */
function branchOf(union: ErrorObject, error: ErrorObject): string | null {
  const under = `${union.schemaPath}/`;
  if (!error.schemaPath.startsWith(under) || !error.instancePath.startsWith(union.instancePath)) return null;
  return error.schemaPath.slice(under.length).split('/')[0] ?? null;
}

/** Whether an error says that another alternative was meant. */
function isOtherForm(union: ErrorObject, error: ErrorObject): boolean {
  if (error.instancePath === union.instancePath) return error.keyword === 'type';
  const inner = error.instancePath.slice(union.instancePath.length + 1);
  return error.keyword === 'const' && !inner.includes('/');
}

/** When no alternative has the word that was given: one error that lists the words. */
function wordsInstead(union: ErrorObject, errors: readonly ErrorObject[]): ErrorObject | null {
  const wrong = errors.filter((error) => error.keyword === 'const' && isOtherForm(union, error));
  const [first] = wrong;
  if (!first || wrong.some(({ instancePath }) => instancePath !== first.instancePath)) return null;
  const allowedValues = [...new Set(wrong.map(({ params }) => String(params['allowedValue'])))];
  return { ...first, keyword: 'enum', params: { allowedValues } };
}
