type Json = unknown;

const keysOf = (pointer: string): string[] =>
  pointer === ''
    ? []
    : pointer
        .slice(1)
        .split('/')
        .map((key) => key.replaceAll('~1', '/').replaceAll('~0', '~'));

/** The value at a JSON pointer (RFC 6901), undefined where there is none. */
export function valueAt(document: Json, pointer: string): Json {
  return keysOf(pointer).reduce<Json>((value, key) => {
    if (Array.isArray(value)) return value[Number(key)];
    if (typeof value === 'object' && value !== null) return (value as Record<string, Json>)[key];
    return undefined;
  }, document);
}

/**
 * A copy of the document with another value at a pointer; undefined removes the key. Unchanged branches are
 * shared with the original, so that comparisons by identity stay cheap.
 */
export function withValue<T>(document: T, pointer: string, value: Json): T {
  return replaced(document, keysOf(pointer), value) as T;
}

function replaced(node: Json, keys: readonly string[], value: Json): Json {
  const [key, ...rest] = keys;
  if (key === undefined) return value;
  if (Array.isArray(node)) {
    const copy: Json[] = [...(node as Json[])];
    if (rest.length === 0 && value === undefined) copy.splice(Number(key), 1);
    else copy[Number(key)] = replaced(copy[Number(key)], rest, value);
    return copy;
  }
  const source = typeof node === 'object' && node !== null ? (node as Record<string, Json>) : {};
  const next = replaced(source[key], rest, value);
  if (next === undefined) {
    return Object.fromEntries(Object.entries(source).filter(([name]) => name !== key));
  }
  return { ...source, [key]: next };
}
