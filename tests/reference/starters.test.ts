import { readdirSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import formats from 'ajv-formats';
import { describe, expect, it } from 'vitest';
import { Edition } from '#shared/basis/schema/index.ts';
import { compile } from '#shared/engine/index.ts';
import { starter } from './worked.ts';

/** What holds of every starter edition, whatever it starts. */

const folder = new URL('../../rules/', import.meta.url);
const slugs = readdirSync(folder).filter(
  (name) => name !== 'schema' && readdirSync(new URL(`${name}/`, folder)).includes('edition.json'),
);
const ajv = new Ajv2020({ strict: false });
formats.default(ajv);
const valid = ajv.compile(Edition);

interface Standing {
  source: string;
  standing: string;
}

/** Every provenance in a document, wherever it stands. */
function provenances(value: unknown): Standing[] {
  if (typeof value !== 'object' || value === null) return [];
  const own = 'standing' in value && 'source' in value ? [value as Standing] : [];
  return [...own, ...Object.values(value).flatMap(provenances)];
}

describe.each(slugs)('%s', (slug) => {
  const edition = starter(slug);

  it('has the shape of an edition', () => {
    valid(edition);
    expect(valid.errors ?? []).toEqual([]);
  });

  it('compiles without errors', () => {
    expect(compile(edition).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  });

  it('leaves verifying to the firm that takes it over', () => {
    expect(provenances(edition).filter((each) => 'verified' in each)).toEqual([]);
  });

  it('says a value was seen only where its source has an address', () => {
    const withAddress = new Set(edition.sources.filter((s) => s.address).map(({ id }) => id));
    const seen = provenances(edition).filter(({ standing }) => standing === 'seen');
    expect(seen.filter(({ source }) => !withAddress.has(source))).toEqual([]);
  });

  it('warns that it is to be verified, and defers to codes in force and to an engineer', () => {
    expect(edition.caution).toMatch(/verified|invented/);
    expect(edition.caution).toMatch(/code/);
    expect(edition.caution).toMatch(/engineer|licensed design professional/);
  });

  it('has proofs', () => {
    expect(edition.proofs.length).toBeGreaterThan(0);
  });
});
