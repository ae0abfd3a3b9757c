import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { validateEdition, validateMember } from '#shared/basis/validate.ts';
import { check, compile, verdict } from '#shared/engine/index.ts';
import type { Finding, Plan, VerdictWord } from '#shared/engine/index.ts';

/*
 * npm run -s check -- --edition FILE --member FILE [--verdict-only]
 *
 * Prints the result document as JSON. FILE of --member is one member, a folder of them, or a file with one
 * member a line (.ndjson): these give one line each. Exit 0: passes (also close), 1: fails or no verdict,
 * 2: bad input, with the findings.
 */

const PASSED = 0;
const FAILED = 1;
const BAD_INPUT = 2;

class BadInput extends Error {
  readonly findings: readonly Finding[];
  constructor(message: string, findings: readonly Finding[] = []) {
    super(message);
    this.findings = findings;
  }
}

interface Source {
  name: string;
  text: string;
}

function read(file: string): string {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    throw new BadInput(`The file ${file} can’t be read. Check its name.`);
  }
}

function parse({ name, text }: Source): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch (error) {
    throw new BadInput(`${name} is not JSON: ${error instanceof Error ? error.message : ''}`);
  }
}

function planFrom(file: string): Plan {
  const valid = validateEdition(parse({ name: file, text: read(file) }));
  if (!valid.ok) throw new BadInput('The edition does not have the right shape.', valid.findings);
  const outcome = compile(valid.edition);
  const errors = outcome.findings.filter(({ severity }) => severity === 'error');
  if (!outcome.ok) throw new BadInput('The edition has errors.', errors);
  return outcome.plan;
}

function sourcesIn(path: string): { many: boolean; sources: Source[] } {
  if (statSync(path, { throwIfNoEntry: false })?.isDirectory()) {
    const names = readdirSync(path).filter((name) => name.endsWith('.json'));
    return { many: true, sources: names.sort().map((name) => ({ name, text: read(join(path, name)) })) };
  }
  if (!path.endsWith('.ndjson')) return { many: false, sources: [{ name: path, text: read(path) }] };
  const lines = read(path).split('\n');
  return {
    many: true,
    sources: lines.flatMap((text, i) => (text.trim() ? [{ name: `line ${String(i + 1)}`, text }] : [])),
  };
}

interface Outcome {
  code: number;
  document: unknown;
}

const codeOf = (word: VerdictWord) => (word === 'passes' || word === 'close' ? PASSED : FAILED);

function checkOne(plan: Plan, source: Source, verdictOnly: boolean): Outcome {
  const valid = validateMember(parse(source));
  if (!valid.ok) throw new BadInput('The member does not have the right shape.', valid.findings);
  const found = verdictOnly ? verdict(plan, valid.member) : check(plan, valid.member);
  const errors = found.findings.filter(({ severity }) => severity === 'error');
  if (errors.length) throw new BadInput('The member can’t be checked.', errors);
  const word = 'verdict' in found ? found.verdict.word : found.word;
  return { code: codeOf(word), document: verdictOnly ? { mark: valid.member.mark, ...found } : found };
}

function problemOf(error: unknown): Outcome {
  if (!(error instanceof BadInput)) throw error;
  return { code: BAD_INPUT, document: { problem: error.message, findings: error.findings } };
}

function run(): number {
  const { values } = parseArgs({
    options: {
      edition: { type: 'string' },
      member: { type: 'string' },
      'verdict-only': { type: 'boolean', default: false },
    },
  });
  const { edition, member } = values;
  if (edition === undefined || member === undefined) {
    process.stderr.write('Usage: npm run -s check -- --edition FILE --member FILE [--verdict-only]\n');
    return BAD_INPUT;
  }
  try {
    const plan = planFrom(edition);
    const { many, sources } = sourcesIn(member);
    let worst = PASSED;
    for (const source of sources) {
      let outcome: Outcome;
      try {
        outcome = checkOne(plan, source, values['verdict-only']);
      } catch (error) {
        outcome = problemOf(error);
      }
      const { document } = outcome;
      const named = many ? { source: source.name, ...(document as object) } : document;
      process.stdout.write(`${many ? JSON.stringify(named) : JSON.stringify(named, null, 2)}\n`);
      worst = Math.max(worst, outcome.code);
    }
    return worst;
  } catch (error) {
    const { code, document } = problemOf(error);
    process.stdout.write(`${JSON.stringify(document, null, 2)}\n`);
    return code;
  }
}

try {
  process.exitCode = run();
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = BAD_INPUT;
}
