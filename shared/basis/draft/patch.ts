import jsonPatch, { type Operation } from 'fast-json-patch';

/** A change to a draft, as RFC 6902 operations. */
export type Patch = readonly Operation[];

export type PatchOutcome<T> = { ok: true; document: T } | { ok: false; message: string };

/** Bounds on one change: more belongs in an upload of the whole document. */
export const patchBounds = { operations: 20_000, path: 400 };

const forbidden = /(^|\/)(__proto__|constructor|prototype)(\/|$)/;

function refusal(patch: Patch): string | null {
  if (patch.length > patchBounds.operations) {
    return `The change has ${patch.length} operations; at most ${patchBounds.operations} are taken at once.`;
  }
  for (const operation of patch) {
    if (!['add', 'remove', 'replace', 'test', 'move', 'copy'].includes(operation.op)) {
      return `"${operation.op}" is not an operation of RFC 6902.`;
    }
    const paths = 'from' in operation ? [operation.path, operation.from] : [operation.path];
    for (const path of paths) {
      if (path.length > patchBounds.path || forbidden.test(path))
        return `"${path.slice(0, 60)}" is not a place.`;
    }
  }
  return null;
}

/** The document after a patch; the document given stays as it was. All operations apply, or none. */
export function patched<T>(document: T, patch: Patch): PatchOutcome<T> {
  const refused = refusal(patch);
  if (refused) return { ok: false, message: refused };
  try {
    const copy = jsonPatch.deepClone(document) as T;
    const result = jsonPatch.applyPatch(copy, jsonPatch.deepClone(patch) as Operation[], true, true, true);
    return { ok: true, document: result.newDocument };
  } catch (error) {
    const place =
      error instanceof jsonPatch.JsonPatchError
        ? (error.operation as Operation | undefined)?.path
        : undefined;
    return { ok: false, message: `The change doesn't fit the draft${place ? ` at ${place}` : ''}.` };
  }
}

/** The patch that leads from one document to another. */
export function patchBetween(before: object, after: object): Operation[] {
  return jsonPatch.compare(before, after);
}
