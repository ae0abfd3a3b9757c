import type { Edition, Provenance } from '#shared/basis/schema/index.ts';
import type { Standing } from '../types.ts';

/** Source and state of verification of stored values; each is written once and shared. */
export class Standings {
  readonly #edition: Edition;
  readonly #known = new WeakMap<Provenance, Standing>();

  constructor(edition: Edition) {
    this.#edition = edition;
  }

  of(provenance: Provenance): Standing {
    const known = this.#known.get(provenance);
    if (known) return known;
    const made = this.#write(provenance);
    this.#known.set(provenance, made);
    return made;
  }

  #write({ source, standing, place, note, verified }: Provenance): Standing {
    return {
      source,
      sourceTitle: this.#edition.sources.find(({ id }) => id === source)?.title ?? source,
      standing,
      ...(place === undefined ? {} : { place }),
      ...(note === undefined ? {} : { note }),
      ...(verified === undefined ? {} : { verified }),
    };
  }
}
