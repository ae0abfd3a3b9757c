import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { PlainError, root } from './cluster.mjs';

const stamp = join(root, 'node_modules', '.ledgerbeam-lock');

/** Installs the packages of the lock file when they are missing or of another lock. */
export function ensureInstalled() {
  const lock = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
  console.log('Installing packages …');
  const result = spawnSync('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], {
    cwd: root,
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  if (result.status !== 0) {
    throw new PlainError(
      'The packages could not be installed. Check the connection to the npm registry and try again.',
    );
  }
  writeFileSync(stamp, lock);
}
