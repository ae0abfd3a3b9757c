import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { documentBounds, validateEdition, validateMember } from './validate.ts';

const starters = readdirSync('rules', { withFileTypes: true })
  .filter((entry) => entry.isDirectory() && entry.name !== 'schema')
  .map(({ name }) => name);
const read = (slug: string) =>
  JSON.parse(readFileSync(`rules/${slug}/edition.json`, 'utf8')) as Record<string, unknown>;
const [first = ''] = starters;
const pointers = (value: unknown) => {
  const outcome = validateEdition(value);
  return outcome.ok ? [] : outcome.findings.map(({ pointer }) => pointer);
};

describe('the shape of documents', () => {
  it.each(starters)('takes the starter edition %s', (slug) => {
    expect(validateEdition(read(slug))).toMatchObject({ ok: true });
  });

  it('says unknown keys, another schema version and a text for a number at their places', () => {
    const edition = { ...read(first), schema: 'edition/9', extra: 1, title: 5 };
    expect(pointers(edition)).toEqual(expect.arrayContaining(['/schema', '/extra', '/title']));
  });

  it('refuses names that reach into prototypes, whatever the schema says', () => {
    const hostile = JSON.parse('{"schema":"edition/1","__proto__":{"x":1}}') as unknown;
    expect(pointers(hostile)).toContain('/__proto__');
  });

  it('refuses what is no document at all, and what is too large', () => {
    expect(validateEdition(null).ok).toBe(false);
    expect(validateMember([]).ok).toBe(false);
    const huge = { note: 'x'.repeat(documentBounds.member + 1) };
    const outcome = validateMember(huge);
    expect(outcome.ok ? '' : outcome.findings[0]?.message).toMatch(/larger than/);
  });

  it('finds every problem of a member at once', () => {
    const outcome = validateMember({ schema: 'member/1', mark: '', spans: [{ length: -1 }], grade: 'A' });
    const found = outcome.ok ? [] : outcome.findings.map(({ pointer }) => pointer);
    expect(found).toEqual(expect.arrayContaining(['/mark', '/spans/0/length', '/section', '/loads']));
  });
});
