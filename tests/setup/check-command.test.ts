import { execFile } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { testEdition, testMember } from '#tests/factories/edition.ts';

const root = join(import.meta.dirname, '..', '..');
const folder = mkdtempSync(join(tmpdir(), 'ledgerbeam-check-'));

function file(name: string, content: unknown): string {
  const path = join(folder, name);
  writeFileSync(path, typeof content === 'string' ? content : JSON.stringify(content));
  return path;
}

function run(...args: string[]): Promise<{ code: number; out: string }> {
  return new Promise((resolve) => {
    const command = ['--import', 'tsx', join(root, 'server', 'bin', 'check.ts'), ...args];
    execFile(process.execPath, command, { cwd: root }, (error, out) => {
      resolve({ code: typeof error?.code === 'number' ? error.code : 0, out });
    });
  });
}

const edition = file('edition.json', testEdition());
const good = file('good.json', testMember());

describe('the check command', () => {
  it('prints the result and exits 0 for a member that passes', async () => {
    const { code, out } = await run('--edition', edition, '--member', good);
    expect(code).toBe(0);
    expect(JSON.parse(out)).toMatchObject({ schema: 'result/1', verdict: { word: 'passes', check: 'sag' } });
  });

  it('exits 1 for a member that fails, with the verdict only where asked', async () => {
    const weak = file('weak.json', testMember({ section: { b: 38, h: 97, pieces: 1 } }));
    const { code, out } = await run('--edition', edition, '--member', weak, '--verdict-only');
    expect(code).toBe(1);
    expect(JSON.parse(out)).toMatchObject({ mark: 'J1', word: 'fails' });
    expect(out).not.toContain('ledger');
  });

  it('exits 2 for bad input, with findings at their places', async () => {
    const bad = file('bad.json', testMember({ grade: 'oak' }));
    const { code, out } = await run('--edition', edition, '--member', bad);
    expect(code).toBe(2);
    expect(JSON.parse(out)).toMatchObject({ findings: [{ code: 'unknown-grade', pointer: '/grade' }] });
    expect((await run('--edition', edition, '--member', join(folder, 'nowhere.json'))).code).toBe(2);
    expect((await run('--member', good)).code).toBe(2);
  });

  it('gives one line for each of several members', async () => {
    const lines = [JSON.stringify(testMember()), '', 'not json', JSON.stringify(testMember({ mark: 'J2' }))];
    const many = file('many.ndjson', lines.join('\n'));
    const { code, out } = await run('--edition', edition, '--member', many, '--verdict-only');
    const documents = out
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Record<string, unknown>);
    expect(code).toBe(2);
    expect(
      documents.map(({ source, mark, problem }) => [source, mark ?? (problem ? 'problem' : '')]),
    ).toEqual([
      ['line 1', 'J1'],
      ['line 3', 'problem'],
      ['line 4', 'J2'],
    ]);
  });
});
