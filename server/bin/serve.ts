// Migrates, seeds the demo firm once, and serves. Started by start.mjs, which brings the database.
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { migrate } from '#server/db/migrate.ts';
import { SetUpError } from '#server/db/prepare.ts';
import { demoPassword, seed } from '#server/db/seed.ts';
import { BadSetting, readEnv } from '#server/env.ts';
import { PortProblem, serve } from '#server/index.ts';

async function main(): Promise<void> {
  const env = readEnv(process.env);
  if (env.ownerUrl) {
    await migrate(env.ownerUrl, env.databaseUrl);
  }
  const people = env.ownerUrl ? await seed(env.ownerUrl) : [];
  const listening = await serve({
    databaseUrl: env.databaseUrl,
    // Without a secret of the cluster's, sessions end with the process.
    sessionSecret: env.sessionSecret ?? randomBytes(32).toString('hex'),
    client: join(import.meta.dirname, '..', '..', 'dist'),
    host: env.host,
    port: env.port,
  });
  console.log(`\nLedgerbeam is at http://${env.host}:${listening.port}/\n`);
  if (people.length) {
    console.log('Sign-ins of the invented demo firm, all with the password');
    console.log(`  ${demoPassword}\n`);
    for (const { email, role } of people) console.log(`  ${email.padEnd(40)} ${role}`);
    console.log('\nCtrl-C stops it.');
  }
  let stopping = false;
  for (const signal of ['SIGINT', 'SIGTERM'] as const) {
    process.on(signal, () => {
      if (stopping) return;
      stopping = true;
      void listening.close().finally(() => process.exit(0));
    });
  }
}

main().catch((error: unknown) => {
  const plain = error instanceof BadSetting || error instanceof PortProblem || error instanceof SetUpError;
  console.error(plain ? error.message : error);
  process.exit(1);
});
