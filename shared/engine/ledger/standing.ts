import type { Edition, Provenance } from '#shared/basis/schema/index.ts';
import type { Standing } from '../types.ts';

/** Source and state of verification of a stored value. */
export function standingOf(edition: Edition, provenance: Provenance): Standing {
  const { source, standing, place, note, verified } = provenance;
  return {
    source,
    sourceTitle: edition.sources.find(({ id }) => id === source)?.title ?? source,
    standing,
    ...(place === undefined ? {} : { place }),
    ...(note === undefined ? {} : { note }),
    ...(verified === undefined ? {} : { verified }),
  };
}
