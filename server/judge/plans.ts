import type { Edition, Finding, Plan } from '#shared/engine/types.ts';
import { compile } from '#shared/engine/index.ts';

/** Compiled editions kept, the least recently used dropped first. */
const KEPT = 24;

export type Compiled = { plan: Plan | null; findings: readonly Finding[] };

/** Compiles editions once; what an edition's hash names never changes, so neither does its plan. */
export class Plans {
  readonly #kept = new Map<string, Compiled>();

  of(hash: string, edition: Edition): Compiled {
    const known = this.#kept.get(hash);
    if (known) {
      this.#kept.delete(hash);
      this.#kept.set(hash, known);
      return known;
    }
    const outcome = compile(edition);
    const made = { plan: outcome.ok ? outcome.plan : null, findings: outcome.findings };
    this.#kept.set(hash, made);
    const [oldest] = this.#kept.keys();
    if (this.#kept.size > KEPT && oldest !== undefined) this.#kept.delete(oldest);
    return made;
  }
}
