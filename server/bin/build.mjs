import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { brotliCompressSync, constants, gzipSync } from 'node:zlib';
import { PlainError, root } from './cluster.mjs';

/** Everything the client is built from. */
const sources = [
  'src',
  'shared',
  'rules',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
];

function digest() {
  const hash = createHash('sha256');
  const visit = (path) => {
    if (!existsSync(path)) return;
    const entries = readdirSync(path, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1));
    for (const entry of entries) {
      const inner = join(path, entry.name);
      if (entry.isDirectory()) visit(inner);
      else hash.update(inner.slice(root.length)).update(readFileSync(inner));
    }
  };
  for (const source of sources) {
    const path = join(root, source);
    if (source.includes('.') && existsSync(path)) hash.update(source).update(readFileSync(path));
    else visit(path);
  }
  return hash.digest('hex');
}

/** Lays a compressed copy beside each file that gains by it; they never change, so it is done once. */
function compress(folder) {
  for (const name of readdirSync(folder)) {
    if (!/\.(js|css|svg)$/.test(name)) continue;
    const content = readFileSync(join(folder, name));
    const size = { [constants.BROTLI_PARAM_SIZE_HINT]: content.length };
    writeFileSync(join(folder, `${name}.br`), brotliCompressSync(content, { params: size }));
    writeFileSync(join(folder, `${name}.gz`), gzipSync(content, { level: 9 }));
  }
}

/** Builds the client when what it is built from has changed since. */
export function ensureBuilt() {
  const stamp = join(root, 'dist', '.built-from');
  const now = digest();
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === now) return;
  console.log('Building …');
  const result = spawnSync(
    process.execPath,
    [join(root, 'node_modules', 'vite', 'bin', 'vite.js'), 'build', '--logLevel', 'warn'],
    { cwd: root, encoding: 'utf8' },
  );
  if (result.status !== 0)
    throw new PlainError(`The client could not be built:\n${result.stderr}${result.stdout}`);
  compress(join(root, 'dist', 'assets'));
  writeFileSync(stamp, now);
}
