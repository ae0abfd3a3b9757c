import { describe, expect, it } from 'vitest';
import { canonical, hashOf } from '#shared/basis/hash.ts';
import { starters } from '#server/basis/starters.ts';
import { barn, barnMembers } from '#server/db/demo/barn.ts';
import { houseEdition, houseFirst } from '#server/db/demo/houseEdition.ts';
import { readingRoom, readingRoomMembers } from '#server/db/demo/readingRoom.ts';
import { testEdition } from '#tests/factories/edition.ts';
import { testMember } from '#tests/factories/member.ts';
import { Judge } from './judge.ts';

const judge = new Judge();
const stored = (document: ReturnType<typeof testEdition>) => ({ document, hash: hashOf(document) });

/** The same document with the names of every object in another order, as a database may give it back. */
function reordered<T>(value: T): T {
  if (Array.isArray(value)) return value.map(reordered) as T;
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).reverse();
  return Object.fromEntries(entries.map(([key, inner]) => [key, reordered(inner)])) as T;
}

const starter = starters().find(({ slug }) => slug === 'permissible-stress-softwood')?.document;
if (!starter) throw new Error('The starter of the demo is missing.');
const house = houseEdition(starter, houseFirst);
const cases = [
  ...readingRoomMembers.map((member) => [starter, readingRoom.choices, member] as const),
  ...barnMembers.map((member) => [house, barn.choices, member] as const),
];

describe('judging', () => {
  it.each(cases)(
    'gives the same bytes in whatever order names are stored: %#',
    async (edition, choices, member) => {
      const one = await judge.judge(stored(edition), choices, member);
      const other = await new Judge().judge(
        stored(reordered(edition)),
        reordered(choices),
        reordered(member),
      );
      expect(canonical(other.result)).toBe(canonical(one.result));
      expect([other.resultHash, other.memberHash]).toEqual([one.resultHash, one.memberHash]);
    },
  );

  it('gives the same bytes for a member with several things wrong, too', async () => {
    const wrong = testMember({ choices: { sharing: 'x', b: 'y', a: 'z' }, inputs: { q: 1, p: 2 } });
    const one = await judge.judge(stored(testEdition()), {}, wrong);
    const other = await judge.judge(stored(testEdition()), {}, reordered(wrong));
    expect(one.result.verdict.word).toBe('none');
    expect(canonical(other.result)).toBe(canonical(one.result));
  });

  it('refuses an edition that does not compile', async () => {
    const edition = testEdition({ checks: [] });
    const broken = { ...edition, clauses: [] };
    expect(judge.compiles(stored(broken))).toBe(false);
    await expect(judge.judge(stored(broken), {}, testMember())).rejects.toThrow(/does not compile/);
  });
});

describe('verifying', () => {
  it('holds for what was judged, and names the place of whatever was changed', async () => {
    const edition = stored(testEdition());
    const { inputs, result, resultHash } = await judge.judge(edition, {}, testMember());
    expect(judge.verify(edition, inputs, result, resultHash)).toMatchObject({ same: true, differences: [] });

    const [first, ...rest] = result.checks;
    const forged = { ...result, checks: [{ ...first, utilisation: 0.1 }, ...rest] } as typeof result;
    const { same, differences } = judge.verify(edition, inputs, forged, resultHash);
    expect(same).toBe(false);
    expect(differences[0]).toMatch(/stored result does not have its hash/);
    expect(differences[1]).toMatch(/^\/checks\/0\/utilisation/);

    const wider = { ...inputs, section: { ...inputs.section, b: 48 } };
    expect(judge.verify(edition, wider, result, resultHash).same).toBe(false);
    const swapped = { ...edition, document: testEdition({ title: 'Swapped' }) };
    expect(judge.verify(swapped, inputs, result, resultHash).differences[0]).toMatch(
      /edition does not have its hash/,
    );
  });
});
