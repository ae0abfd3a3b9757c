// npm run dev: the server and Vite, both with reload; the client is at Vite's address.
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { PlainError, cluster, root } from './cluster.mjs';
import { ensureInstalled } from './install.mjs';

async function dev() {
  ensureInstalled();
  const database = process.env.DATABASE_URL ? null : await cluster('app');
  const env = { ...process.env };
  if (database) {
    env.DATABASE_OWNER_URL = `${database.ownerUrl}ledgerbeam`;
    env.DATABASE_URL = `${database.appUrl}ledgerbeam`;
    env.SESSION_SECRET ??= database.sessionSecret;
  }
  const run = (args) => spawn(process.execPath, args, { cwd: root, env, stdio: 'inherit' });
  const children = [
    run([
      join(root, 'node_modules', 'tsx', 'dist', 'cli.mjs'),
      'watch',
      join(root, 'server', 'bin', 'serve.ts'),
    ]),
    run([join(root, 'node_modules', 'vite', 'bin', 'vite.js')]),
  ];
  const stop = () => {
    for (const child of children) child.kill('SIGTERM');
    if (database?.started) database.stop();
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, stop);
}

dev().catch((error) => {
  console.error(error instanceof PlainError ? error.message : error);
  process.exit(1);
});
