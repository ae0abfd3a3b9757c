/*
 * npm run bench:web: keystroke to painted verdict, in real Chromium on the built client, for a three-span
 * member with several combinations. Prints the median and the 95th percentile in milliseconds.
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, type Page } from 'playwright-core';
import { migrate } from '#server/db/migrate.ts';
import { demoPassword, seed } from '#server/db/seed.ts';
import { createLog } from '#server/http/log.ts';
import { serve } from '#server/index.ts';

const percentile = (sorted: readonly number[], share: number) =>
  sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? NaN;

/** Types into a field and measures, in the page, from each input event to the frame after it is painted. */
async function keystrokes(page: Page, label: string, texts: readonly string[]): Promise<number[]> {
  const field = page.getByLabel(label, { exact: true });
  await field.evaluate((element) => {
    const store: number[] = [];
    Object.assign(window, { keystrokes: store });
    element.addEventListener(
      'input',
      () => {
        const start = performance.now();
        requestAnimationFrame(() => {
          const channel = new MessageChannel();
          channel.port1.onmessage = () => store.push(performance.now() - start);
          channel.port2.postMessage(null);
        });
      },
      { capture: true },
    );
  });
  for (const text of texts) {
    await field.fill('');
    await field.pressSequentially(text, { delay: 120 });
  }
  return page.evaluate(() => (window as typeof window & { keystrokes: number[] }).keystrokes);
}

async function main(): Promise<void> {
  const { DATABASE_URL: app = '', DATABASE_OWNER_URL: owner = '' } = process.env;
  if (!app || !owner) throw new Error('Run it with npm run bench:web, which brings a database.');
  if (!existsSync('dist/index.html')) throw new Error('The client is not built: npm start builds it.');
  await migrate(owner, app);
  await seed(owner);
  const server = await serve({
    databaseUrl: app,
    sessionSecret: 'bench',
    client: join(process.cwd(), 'dist'),
    host: '127.0.0.1',
    port: 0,
    log: createLog('silent'),
  });
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
    ],
  });
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    const url = `http://127.0.0.1:${server.port}`;
    await page.goto(`${url}/sign-in`);
    await page.getByLabel('E-mail').fill('engineer@wrenlock.example');
    await page.getByLabel('Password').fill(demoPassword);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL((at) => !at.pathname.includes('sign-in'));
    await page.goto(`${url}/projects`);
    await page
      .getByRole('link', { name: /reading room/ })
      .first()
      .click();
    await page.getByRole('link', { name: /^B1 / }).click();
    await page.locator('svg.member-strip').waitFor();
    // Three spans, and loads of several actions for more combinations.
    await page.getByRole('button', { name: 'Add a span' }).click();
    for (let i = 0; i < 3; i += 1) await page.getByRole('button', { name: 'Add a load' }).click();
    const actions = page.getByLabel('Action', { exact: true });
    const count = await actions.count();
    for (let i = 2; i < count; i += 1) await actions.nth(i).selectOption({ index: i });
    await page.waitForTimeout(500);
    const words = await page.getByText(/envelope of \d+ combinations/).textContent();
    const times = (await keystrokes(page, 'Span 1', ['3600', '3450', '4120', '3875', '3333', '3600'])).sort(
      (a, b) => a - b,
    );
    console.log(`keystroke to painted verdict, three spans, ${words ?? ''}: ${times.length} keystrokes`);
    console.log(
      `  median ${percentile(times, 0.5).toFixed(1)} ms, 95th percentile ${percentile(times, 0.95).toFixed(1)} ms`,
    );
  } finally {
    await browser.close();
    await server.close();
  }
}

if (process.argv.includes('--run')) {
  await main();
} else {
  const { cluster } = (await import('../../server/bin/cluster.mjs' as string)) as {
    cluster: (
      purpose: string,
      options: { quick: boolean },
    ) => Promise<{ ownerUrl: string; appUrl: string; remove: () => void }>;
  };
  const own = await cluster(`bench-${process.pid}`, { quick: true });
  const env = {
    ...process.env,
    DATABASE_OWNER_URL: `${own.ownerUrl}bench`,
    DATABASE_URL: `${own.appUrl}bench`,
  };
  const result = spawnSync(process.execPath, ['--import', 'tsx', import.meta.filename, '--run'], {
    stdio: 'inherit',
    env,
  });
  own.remove();
  process.exit(result.status ?? 1);
}
