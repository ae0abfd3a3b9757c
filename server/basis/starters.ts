import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { Edition } from '#shared/basis/schema/index.ts';

export interface StarterEdition {
  /** Name of its folder in `rules/`. */
  slug: string;
  document: Edition;
}

const folder = fileURLToPath(new URL('../../rules/', import.meta.url));
let known: readonly StarterEdition[] | undefined;

/** The starter editions of `rules/`, read once. Their shape and content are held by the tests. */
export function starters(): readonly StarterEdition[] {
  known ??= readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isDirectory() && readdirSync(`${folder}${entry.name}`).includes('edition.json'))
    .map(({ name }) => ({ slug: name, document: read(name) }))
    .sort((a, b) => a.slug.localeCompare(b.slug));
  return known;
}

/** The starter's document, or null when there is no such starter. */
export function starterNamed(slug: string): Edition | null {
  return starters().find((starter) => starter.slug === slug)?.document ?? null;
}

function read(slug: string): Edition {
  return JSON.parse(readFileSync(`${folder}${slug}/edition.json`, 'utf8')) as Edition;
}
