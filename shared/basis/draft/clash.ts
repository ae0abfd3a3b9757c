import type { Operation } from 'fast-json-patch';
import { patchBetween, type Patch } from './patch.ts';

/** A place that two people changed to different values, by JSON pointer. */
export interface Clash {
  pointer: string;
  mine: unknown;
  theirs: unknown;
}

type Json = unknown;

const parentOf = (pointer: string) => pointer.slice(0, pointer.lastIndexOf('/'));
const within = (pointer: string, ancestor: string) =>
  pointer === ancestor || pointer.startsWith(`${ancestor}/`);

function valueAt(document: Json, pointer: string): Json {
  return pointer
    .split('/')
    .slice(1)
    .map((key) => key.replaceAll('~1', '/').replaceAll('~0', '~'))
    .reduce<Json>(
      (node, key) =>
        typeof node === 'object' && node !== null ? (node as Record<string, Json>)[key] : undefined,
      document,
    );
}

/**
 * The area an operation touches. Adding to or removing from a list shifts the places behind it, so the whole
 * list is touched.
 */
function areaOf(operation: Operation, document: Json): string[] {
  const places = 'from' in operation ? [operation.path, operation.from] : [operation.path];
  return places.map((pointer) => {
    const parent = parentOf(pointer);
    const shifts = operation.op !== 'replace' && Array.isArray(valueAt(document, parent));
    return shifts ? parent : pointer;
  });
}

/**
 * Where my patch and the changes made since (from `base`, which I had, to `current`) touch the same place with
 * different outcomes. Empty: my patch can be applied to `current` as it is.
 */
export function clashesOf(base: object, current: object, mine: Patch, mineDocument: object): Clash[] {
  const theirs = patchBetween(base, current).flatMap((operation) => areaOf(operation, base));
  const found = new Map<string, Clash>();
  for (const pointer of mine.flatMap((operation) => areaOf(operation, base))) {
    for (const other of theirs) {
      const shared = within(pointer, other) ? other : within(other, pointer) ? pointer : null;
      if (shared === null || found.has(shared)) continue;
      const clash = {
        pointer: shared,
        mine: valueAt(mineDocument, shared),
        theirs: valueAt(current, shared),
      };
      if (JSON.stringify(clash.mine) !== JSON.stringify(clash.theirs)) found.set(shared, clash);
    }
  }
  return [...found.values()];
}
