import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Edition, Member, type Edition as EditionDocument } from '#shared/basis/schema/index.ts';
import { check, compile } from '#shared/engine/index.ts';
import { ResultSchema } from '#shared/engine/schema.ts';

export interface Published {
  file: string;
  content: unknown;
}

const dialect = 'https://json-schema.org/draft/2020-12/schema';
const plain = (schema: object): Record<string, unknown> =>
  JSON.parse(JSON.stringify(schema)) as Record<string, unknown>;

/** The schemas of the documents that firms exchange, with an example member and its result. */
export function publishedSchemas(): Published[] {
  const file = join(import.meta.dirname, '..', '..', 'rules', 'permissible-stress-softwood', 'edition.json');
  const edition = JSON.parse(readFileSync(file, 'utf8')) as EditionDocument;
  const member = edition.proofs[0]?.member;
  const outcome = compile(edition);
  if (!member || !outcome.ok) throw new Error('The example edition does not compile or has no proof.');
  return [
    { file: 'edition.schema.json', content: plain(Edition) },
    {
      file: 'member.schema.json',
      content: { $schema: dialect, title: 'Ledgerbeam member', ...plain(Member) },
    },
    {
      file: 'result.schema.json',
      content: { $schema: dialect, title: 'Ledgerbeam result', ...plain(ResultSchema) },
    },
    { file: 'member.example.json', content: member },
    { file: 'result.example.json', content: check(outcome.plan, member) },
  ];
}
