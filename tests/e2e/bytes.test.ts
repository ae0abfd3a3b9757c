import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import type { Page } from 'playwright-core';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { members } from '#tests/factories/members.ts';
import { setStage, signIn, type Stage } from './browser.ts';
import { hashesOf } from './browserEngine.ts';

/** The engine as the browser runs it: bundled by Vite like the client, under one global name. */
async function bundled(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'silent',
    resolve: { conditions: ['browser', 'import', 'module', 'default'] },
    build: {
      write: false,
      lib: { entry: join(import.meta.dirname, 'browserEngine.ts'), formats: ['iife'], name: 'engine' },
    },
  });
  const [output] = Array.isArray(built) ? built : [built];
  if (!output || !('output' in output)) throw new Error('The engine was not bundled.');
  return output.output[0].code;
}

type InPage = typeof window & { engine: { hashesOf: typeof hashesOf } };
const inPage = (
  page: Page,
  edition: Edition,
  list: readonly Member[],
  choices: Record<string, string> = {},
) =>
  page.evaluate(([e, m, c]) => (window as InPage).engine.hashesOf(e, m, c), [
    edition,
    list,
    choices,
  ] as const);

let stage: Stage;
let script: string;
beforeAll(async () => {
  [stage, script] = await Promise.all([setStage(), bundled()]);
});
afterAll(async () => {
  await stage.close();
});

/** A page with the engine in it. The page's own policy forbids such scripts; the test sets it aside. */
async function pageWithEngine(): Promise<Page> {
  const page = await stage.open();
  await signIn(page, stage.url, 'engineer@wrenlock.example');
  const cdp = await page.context().newCDPSession(page);
  await cdp.send('Page.setBypassCSP', { enabled: true });
  await page.evaluate(`${script}; window.engine = engine;`);
  return page;
}

const starters = readdirSync('rules', { withFileTypes: true })
  .filter((entry) => entry.isDirectory() && entry.name !== 'schema')
  .map(({ name }) => name);

describe('result bytes, by their SHA-256 over RFC 8785', () => {
  it.each(starters)('are equal in Node and in Chromium for random members and proofs of %s', async (slug) => {
    const edition = JSON.parse(readFileSync(`rules/${slug}/edition.json`, 'utf8')) as Edition;
    const random = fc.sample(members(edition), { numRuns: 100, seed: 20261201 });
    const all = [...edition.proofs.map(({ member }) => member), ...random];
    const page = await pageWithEngine();
    expect(await inPage(page, edition, all)).toEqual(hashesOf(edition, all));
  });

  it('are equal in the browser and as stored by the server for every demo member', async () => {
    const page = await pageWithEngine();
    const records = await page.evaluate(async () => {
      const get = async <T>(path: string) => (await (await fetch(`/api${path}`)).json()) as T;
      const { items: projects } = await get<{ items: { id: string }[] }>('/projects?size=100');
      const rows = await Promise.all(
        projects.map(({ id }) => get<{ items: { id: string }[] }>(`/projects/${id}/members`)),
      );
      return Promise.all(
        rows
          .flatMap(({ items }) => items)
          .map(async ({ id }) => {
            const member = await get<{
              mark: string;
              document: Member;
              edition: { id: string };
              project: { choices: Record<string, string> };
              result: { hash: string };
            }>(`/members/${id}`);
            const { document: edition } = await get<{ document: Edition }>(`/editions/${member.edition.id}`);
            return { ...member, editionDocument: edition };
          }),
      );
    });
    expect(records.length).toBeGreaterThanOrEqual(6);
    for (const { mark, document, editionDocument, project, result } of records) {
      const [hash] = await inPage(page, editionDocument, [document], project.choices);
      expect(hash, mark).toBe(result.hash);
    }
  });
});
