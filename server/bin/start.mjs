// npm start: from a clean clone to a served application, and everything stopped again with Ctrl-C.
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { ensureBuilt } from './build.mjs';
import { PlainError, cluster, root } from './cluster.mjs';
import { ensureInstalled } from './install.mjs';

let database = null;

function stopDatabase() {
  try {
    if (database?.started) database.stop();
  } catch (error) {
    console.error(error.message);
  }
}

async function start() {
  ensureInstalled();
  const env = { ...process.env };
  if (!env.DATABASE_URL) {
    database = await cluster('app');
    env.DATABASE_OWNER_URL = `${database.ownerUrl}ledgerbeam`;
    env.DATABASE_URL = `${database.appUrl}ledgerbeam`;
    env.SESSION_SECRET ??= database.sessionSecret;
  }
  ensureBuilt();
  const server = spawn(process.execPath, ['--import', 'tsx', join(root, 'server', 'bin', 'serve.ts')], {
    cwd: root,
    env,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => server.kill('SIGTERM'));
  server.on('exit', (code) => {
    stopDatabase();
    process.exit(code ?? 0);
  });
}

start().catch((error) => {
  console.error(error instanceof PlainError ? error.message : error);
  stopDatabase();
  process.exit(1);
});
