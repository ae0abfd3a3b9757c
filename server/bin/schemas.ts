// npm run schemas: writes the published JSON Schemas and an example of each from their one source.
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { publishedSchemas } from './publishedSchemas.ts';

const folder = join(import.meta.dirname, '..', '..', 'rules', 'schema');
mkdirSync(folder, { recursive: true });
for (const { file, content } of publishedSchemas()) {
  writeFileSync(join(folder, file), `${JSON.stringify(content, null, 2)}\n`);
  console.log(`rules/schema/${file}`);
}
