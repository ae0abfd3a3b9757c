import type { Basis } from '#shared/contracts/bases.ts';
import type { Ring } from '#src/drawings/Rings.tsx';

/** The rings of a basis: one for each edition. */
export function ringsOf({ editions }: Basis): Ring[] {
  return editions.map(({ number, state, releasedAt, projects }) => ({
    number,
    state,
    note: releasedAt ? String(new Date(releasedAt).getFullYear()) : '',
    pinned: projects > 0,
  }));
}
