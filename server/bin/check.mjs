// npm run check: with --edition, checks members without a browser or a database; without, what CI runs.
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { root } from './cluster.mjs';

const args = process.argv.slice(2);
const headless = args.some((arg) => arg.startsWith('--'));
const command = headless
  ? ['--import', 'tsx', join(root, 'server', 'bin', 'check.ts'), ...args]
  : [join(root, 'server', 'bin', 'test.mjs')];
const result = spawnSync(process.execPath, command, { stdio: 'inherit', cwd: process.env.INIT_CWD ?? root });
process.exit(result.status ?? 1);
