import { hashOf } from '#shared/basis/hash.ts';
import { withProjectChoices } from '#shared/basis/inherit.ts';
import { attest } from '#shared/engine/attest.ts';
import { check, ENGINE_VERSION, resultHash, runProofs, verify } from '#shared/engine/index.ts';
import type { Edition, Finding, Member, Result } from '#shared/engine/types.ts';
import { Plans } from './plans.ts';

/** An edition as it is stored. */
export interface StoredEdition {
  document: Edition;
  hash: string;
}

export interface Judgement {
  /** The member as it was checked, and its hash. */
  inputs: Member;
  memberHash: string;
  result: Result;
  resultHash: string;
}

export interface Comparison {
  same: boolean;
  storedHash: string;
  recomputedHash: string;
  storedEngine: string;
  engine: string;
  differences: string[];
}

/** The one place of the server that knows the engine. */
export class Judge {
  readonly #plans = new Plans();
  readonly engine = ENGINE_VERSION;

  /**
   * Checks a member against an edition, and lets json-rules-engine decide every decision of the ledger again.
   * Throws where the two differ or the edition does not compile: neither can come from a person's input.
   */
  async judge(
    edition: StoredEdition,
    projectChoices: Readonly<Record<string, string>>,
    member: Member,
  ): Promise<Judgement> {
    const { plan, findings } = this.#plans.of(edition.hash, edition.document);
    if (!plan) throw new Error(`Edition ${edition.hash} does not compile: ${findings[0]?.message ?? ''}`);
    const inputs = withProjectChoices(edition.document, projectChoices, member);
    const result = check(plan, inputs);
    const [different] = await attest(plan, result);
    if (different) throw new Error(`The rules engine decides otherwise: ${different.message}`);
    return { inputs, memberHash: hashOf(inputs), result, resultHash: resultHash(result) };
  }

  /** Recomputes a stored result from its stored inputs and compares byte for byte. */
  verify(edition: StoredEdition, inputs: Member, stored: Result, storedHash: string): Comparison {
    const { plan } = this.#plans.of(edition.hash, edition.document);
    const recomputedHash = plan ? resultHash(check(plan, inputs)) : '';
    const differences = [...verify(edition.document, inputs, stored).differences];
    if (hashOf(edition.document) !== edition.hash)
      differences.unshift('The stored edition does not have its hash.');
    if (resultHash(stored) !== storedHash) differences.unshift('The stored result does not have its hash.');
    return {
      same: differences.length === 0 && recomputedHash === storedHash,
      storedHash,
      recomputedHash,
      storedEngine: stored.engine,
      engine: ENGINE_VERSION,
      differences,
    };
  }

  /** Everything the compiler finds in an edition. */
  findings({ hash, document }: StoredEdition): readonly Finding[] {
    return this.#plans.of(hash, document).findings;
  }

  /** How many proofs of an edition hold, and how many don't; none can hold in one that does not compile. */
  proofs({ hash, document }: StoredEdition): { held: number; failed: number } {
    const { plan } = this.#plans.of(hash, document);
    if (!plan) return { held: 0, failed: document.proofs.length };
    const results = runProofs(plan);
    const held = results.filter(({ holds }) => holds).length;
    return { held, failed: results.length - held };
  }

  /** Whether members can be checked with an edition. */
  compiles({ hash, document }: StoredEdition): boolean {
    return this.#plans.of(hash, document).plan !== null;
  }
}
