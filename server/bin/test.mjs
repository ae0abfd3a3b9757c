// npm test: everything, with PostgreSQL and Chromium, from a clean clone. The last line counts.
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureBuilt } from './build.mjs';
import { PlainError, cluster, ensurePackages, root } from './cluster.mjs';
import { ensureInstalled } from './install.mjs';

const bin = (...path) => join(root, 'node_modules', ...path);

/** Runs a program of the project with Node and gives its exit code. */
function node(args, env = process.env) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] });
    child.on('exit', (code) => resolve(code ?? 1));
  });
}

/** Checks that are one test each: what they look at, and how. */
const checks = [
  ['types', [bin('typescript', 'bin', 'tsc'), '-b']],
  ['lint', [bin('eslint', 'bin', 'eslint.js'), '.', '--max-warnings', '0']],
  ['format', [bin('prettier', 'bin', 'prettier.cjs'), '--check', '--log-level', 'warn', '.']],
  [
    'directions of import',
    [
      bin('dependency-cruiser', 'bin', 'dependency-cruise.mjs'),
      'shared',
      'server',
      'src',
      '--config',
      '.dependency-cruiser.cjs',
    ],
  ],
];

async function runChecks(count) {
  for (const [name, args] of checks) {
    const code = await node(args);
    console.log(code === 0 ? `✓ ${name}` : `✗ ${name}`);
    count(code === 0);
  }
}

async function runTests(env, count) {
  const folder = mkdtempSync(join(tmpdir(), 'ledgerbeam-test-'));
  const report = join(folder, 'report.json');
  const code = await node(
    [
      bin('vitest', 'vitest.mjs'),
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    env,
  );
  if (!existsSync(report)) {
    count(false);
  } else {
    const { numPassedTests, numFailedTests, success } = JSON.parse(readFileSync(report, 'utf8'));
    count(true, numPassedTests);
    count(false, numFailedTests);
    // A file that could not even be read has no failed test of its own.
    if ((!success || code !== 0) && numFailedTests === 0) count(false);
  }
  rmSync(folder, { recursive: true, force: true });
}

async function main() {
  ensureInstalled();
  if (!existsSync('/usr/bin/chromium')) ensurePackages(['chromium'], 'Chromium');
  const own = process.env.DATABASE_URL ? null : await cluster(`test-${process.pid}`, { quick: true });
  const env = { ...process.env, NODE_ENV: 'test', LEDGERBEAM_QUICK_PASSWORDS: 'yes' };
  if (own) {
    env.DATABASE_OWNER_URL = `${own.ownerUrl}ledgerbeam_test`;
    env.DATABASE_URL = `${own.appUrl}ledgerbeam_test`;
  }
  let passed = 0;
  let failed = 0;
  const count = (good, by = 1) => {
    if (good) passed += by;
    else failed += by;
  };
  try {
    ensureBuilt();
    await runChecks(count);
    await runTests(env, count);
  } finally {
    own?.remove();
  }
  console.log(`${passed} passed, ${failed} failed`);
  process.exitCode = failed === 0 ? 0 : 1;
}

main().catch((error) => {
  console.error(error instanceof PlainError ? error.message : error);
  console.log('0 passed, 1 failed');
  process.exitCode = 1;
});
