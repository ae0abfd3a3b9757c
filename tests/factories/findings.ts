import { compileEdition } from '#shared/basis/compile/compile.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { Finding } from '#shared/engine/types.ts';
import { testEdition } from './edition.ts';

/** The test edition after a change, which may break it. */
export function changed(change: (edition: Edition) => void): Edition {
  const edition = testEdition();
  change(edition);
  return edition;
}

/** What compiling says of the test edition after a change, beyond what it says of it unchanged. */
export function newFindings(change: (edition: Edition) => void): Finding[] {
  const before = new Set(compileEdition(testEdition()).findings.map(({ message }) => message));
  return compileEdition(changed(change)).findings.filter(({ message }) => !before.has(message));
}

/** Severity, code and place of findings, for tests. */
export const brief = (findings: readonly Finding[]) =>
  findings.map(({ severity, code, pointer }) => `${severity} ${code} ${pointer}`);

/** Index of a clause of an edition by its symbol. */
export function clauseAt(edition: Edition, symbol: string): number {
  const index = edition.clauses.findIndex((clause) => clause.symbol === symbol);
  if (index < 0) throw new Error(`The test edition has no clause ${symbol}.`);
  return index;
}

/** A clause of an edition by its symbol. */
export function clauseOf(edition: Edition, symbol: string): Edition['clauses'][number] {
  return edition.clauses[clauseAt(edition, symbol)] as Edition['clauses'][number];
}
