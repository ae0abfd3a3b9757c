import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { attest } from '#shared/engine/attest.ts';
import { check, runProofs, verdict } from '#shared/engine/index.ts';
import { members } from '#tests/factories/members.ts';
import { planOf } from '#tests/factories/plan.ts';
import { expectReproducible } from '#tests/factories/reproduce.ts';

const rules = join(import.meta.dirname, '..', '..', 'rules');
const editions = readdirSync(rules, { withFileTypes: true })
  .filter((entry) => entry.isDirectory() && entry.name !== 'schema')
  .map(({ name }) => {
    const edition = JSON.parse(readFileSync(join(rules, name, 'edition.json'), 'utf8')) as Edition;
    return [name, edition] as const;
  });

describe.each(editions)('starter edition %s', (_, edition) => {
  const plan = planOf(edition);

  it('holds its proofs', () => {
    const proofs = runProofs(plan);
    expect(proofs.length).toBeGreaterThan(0);
    expect(proofs.filter(({ holds }) => !holds)).toEqual([]);
  });

  it('gives ledgers that reproduce every value, for random members', () => {
    fc.assert(
      fc.property(members(edition), (member) => {
        const result = check(plan, member);
        expectReproducible(result);
        expect(verdict(plan, member).utilisation).toBe(result.verdict.utilisation);
      }),
      { numRuns: 100 },
    );
  });

  it('decides as json-rules-engine does, for random members', async () => {
    await fc.assert(
      fc.asyncProperty(members(edition), async (member) => {
        expect(await attest(plan, check(plan, member))).toEqual([]);
      }),
      { numRuns: 20 },
    );
  });
});
