import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createRequire } from 'node:module';
import type axe from 'axe-core';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { expect } from 'vitest';
import { seed, demoPassword } from '#server/db/seed.ts';
import { serve, type Listening } from '#server/index.ts';
import { createLog } from '#server/http/log.ts';
import { address } from '#tests/factories/database.ts';

const executablePath = ['/usr/bin/chromium', '/usr/bin/chromium-browser'].find(existsSync);
const axeSource = createRequire(import.meta.url).resolve('axe-core/axe.min.js');

/** The application with its built client and the demo firm, and a browser on it. */
export interface Stage {
  url: string;
  browser: Browser;
  /** A fresh context: nobody signed in, this theme and size. */
  open: (options?: {
    theme?: 'light' | 'dark';
    width?: number;
    height?: number;
    locale?: string;
  }) => Promise<Page>;
  close: () => Promise<void>;
}

export async function setStage(): Promise<Stage> {
  if (!existsSync('dist/index.html'))
    throw new Error('The client is not built. Run the tests with npm test.');
  await seed(address('DATABASE_OWNER_URL'));
  const server: Listening = await serve({
    databaseUrl: address('DATABASE_URL'),
    sessionSecret: 'for tests only',
    client: join(process.cwd(), 'dist'),
    host: '127.0.0.1',
    port: 0,
    log: createLog('silent'),
    limits: { requestsAMinute: 100_000, signInsOfAddress: 100_000 },
  });
  const browser = await chromium.launch({
    ...(executablePath ? { executablePath } : {}),
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
  const contexts: BrowserContext[] = [];
  return {
    url: `http://127.0.0.1:${server.port}`,
    browser,
    open: async ({ theme = 'light', width = 1440, height = 900, locale = 'en-GB' } = {}) => {
      const context = await browser.newContext({ colorScheme: theme, viewport: { width, height }, locale });
      contexts.push(context);
      const page = await context.newPage();
      page.setDefaultTimeout(15_000);
      return page;
    },
    close: async () => {
      for (const context of contexts) await context.close();
      await browser.close();
      await server.close();
    },
  };
}

/** Signs a person of the demo firm in. */
export async function signIn(page: Page, url: string, email: string): Promise<void> {
  await page.goto(`${url}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(demoPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((at) => !at.pathname.includes('sign-in'));
}

/** Holds a page to axe: WCAG 2.2 A and AA, no violation. The test bypasses the page's policy, not the page. */
export async function expectAccessible(page: Page, what: string): Promise<void> {
  const cdp = await page.context().newCDPSession(page);
  await cdp.send('Page.setBypassCSP', { enabled: true });
  await page.evaluate(readFileSync(axeSource, 'utf8'));
  const found = await page.evaluate(async () => {
    const { axe: tool } = window as typeof window & { axe: typeof axe };
    const result = await tool.run(document, {
      runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'],
    });
    return result.violations.map(
      ({ id, help, nodes }) =>
        `${id}: ${help} — ${nodes
          .slice(0, 3)
          .map(({ html }) => html.slice(0, 160))
          .join(' | ')}`,
    );
  });
  expect(found, what).toEqual([]);
}
