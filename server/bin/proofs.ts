import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Edition } from '#shared/basis/schema/index.ts';
import { compile, type ProofLine, runProofs } from '#shared/engine/index.ts';

/*
 * npm run proofs: compiles each edition in rules/ (or those named) and runs its proofs. Exit 0 when every
 * edition compiles and every proof holds.
 */

const rules = new URL('../../rules/', import.meta.url).pathname;

const named = process.argv.slice(2);
const files = named.length
  ? named
  : readdirSync(rules, { withFileTypes: true })
      .filter((entry) => entry.isDirectory() && entry.name !== 'schema')
      .map(({ name }) => join(rules, name, 'edition.json'));

const number = (value: number | null) => (value === null ? 'nothing' : String(Number(value.toPrecision(7))));

function lineText({ check, of, expected, found, unit, tolerance, holds }: ProofLine): string {
  const suffix = unit === '1' ? '' : ` ${unit}`;
  return `      ${holds ? 'ok  ' : 'FAIL'} ${check} ${of}: expected ${number(expected)}${suffix} ± ${number(tolerance)}, found ${number(found)}${suffix}`;
}

let failed = 0;
for (const file of files) {
  const edition = JSON.parse(readFileSync(file, 'utf8')) as Edition;
  const outcome = compile(edition);
  const errors = outcome.findings.filter(({ severity }) => severity === 'error');
  process.stdout.write(`${edition.title}\n`);
  for (const { pointer, message } of errors) process.stdout.write(`  error at ${pointer}: ${message}\n`);
  if (!outcome.ok) {
    failed += 1;
    continue;
  }
  const results = runProofs(outcome.plan);
  for (const { title, holds, lines, problems } of results) {
    process.stdout.write(`  ${holds ? 'ok  ' : 'FAIL'} ${title}\n`);
    for (const problem of problems) process.stdout.write(`      ${problem}\n`);
    for (const line of lines) if (!line.holds || !holds) process.stdout.write(`${lineText(line)}\n`);
    if (!holds) failed += 1;
  }
  process.stdout.write(`  ${results.filter(({ holds }) => holds).length} of ${results.length} proofs hold\n`);
}
process.exitCode = failed === 0 ? 0 : 1;
