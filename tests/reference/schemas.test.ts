import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { publishedSchemas } from '#server/bin/publishedSchemas.ts';

// The published schemas and examples are generated; this holds them to their source. JSON Schema 2020-12.
describe('published JSON Schemas (npm run schemas writes them)', () => {
  it.each(publishedSchemas().map(({ file, content }) => [file, content] as const))(
    '%s is up to date',
    (file, content) => {
      const published = JSON.parse(readFileSync(`rules/schema/${file}`, 'utf8')) as unknown;
      expect(published).toEqual(JSON.parse(JSON.stringify(content)));
    },
  );
});
