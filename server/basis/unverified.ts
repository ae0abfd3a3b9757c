import { eachProvenance } from '#shared/basis/compile/checkReferences.ts';
import type { Edition } from '#shared/basis/schema/index.ts';

/** How many stored values or groups of values of an edition no second person verified. */
export function unverifiedIn(edition: Edition): number {
  let count = 0;
  eachProvenance(edition, ({ verified }) => {
    if (!verified) count += 1;
  });
  return count;
}
