import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { patched, type Patch } from '#shared/basis/draft/patch.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import { proofsOf, starter } from './worked.ts';

const edition = starter('limit-state-en');

describe('the invented overlay', () => {
  it('is the starter with the patch beside it', async () => {
    const patch = JSON.parse(
      readFileSync(new URL('../../rules/overlay-example/patch.json', import.meta.url), 'utf8'),
    ) as Patch;
    const outcome = patched<Edition>(edition, patch);
    if (!outcome.ok) throw new Error(outcome.message);
    await expect(`${JSON.stringify(outcome.document, null, 2)}\n`).toMatchFileSnapshot(
      '../../rules/overlay-example/edition.json',
    );
  });

  it('says of every changed value that it is invented', () => {
    const overlay = starter('overlay-example');
    const invented = JSON.stringify(overlay).match(/"standing":"invented"/g) ?? [];
    const own = JSON.stringify(overlay).match(/"source":"invented-annex"/g) ?? [];
    expect(invented.length).toBeGreaterThan(5);
    expect(invented.length).toBe(own.length);
  });

  it.each(proofsOf(starter('overlay-example')))('reproduces: $title', ({ problems, lines }) => {
    expect(problems).toEqual([]);
    expect(lines.filter(({ holds }) => !holds)).toEqual([]);
  });
});
