import type { Project } from '#shared/contracts/projects.ts';

/** What a person can change of a project, as it stands in the form. */
export interface Particulars {
  title: string;
  site: string;
  client: string;
  state: Project['state'];
  stockListId: string | null;
  choices: Readonly<Record<string, string>>;
}
export type Field = keyof Particulars;

export const fieldTitles: Readonly<Record<Field, string>> = {
  title: 'Title',
  site: 'Site',
  client: 'Client',
  state: 'State',
  stockListId: 'Stock list',
  choices: 'Project choices',
};
const fields = Object.keys(fieldTitles) as Field[];

export function particularsOf({ title, site, client, state, stockListId, choices }: Project): Particulars {
  return { title, site, client, state, stockListId, choices };
}

const inOrder = (choices: Particulars['choices']) =>
  Object.entries(choices).sort(([a], [b]) => (a < b ? -1 : 1));
const plain = (value: Particulars[Field]) =>
  typeof value === 'object' && value !== null ? JSON.stringify(inOrder(value)) : value;

/** The fields in which two differ. */
export function differing(a: Particulars, b: Particulars): Field[] {
  return fields.filter((field) => plain(a[field]) !== plain(b[field]));
}

/** Only what was changed here, so that a colleague's other changes stay as they are. */
export function changesOf(base: Particulars, mine: Particulars): Partial<Particulars> {
  return Object.fromEntries(differing(base, mine).map((field) => [field, mine[field]]));
}

/** Both set the field since `base`, and not to the same: saving mine would undo theirs. */
export function clashing(base: Particulars, mine: Particulars, stored: Particulars): Field[] {
  const theirs = new Set(differing(base, stored));
  const apart = new Set(differing(mine, stored));
  return differing(base, mine).filter((field) => theirs.has(field) && apart.has(field));
}
