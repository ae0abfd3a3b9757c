import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { expectAccessible, setStage, signIn, type Stage } from './browser.ts';

let stage: Stage;
beforeAll(async () => {
  stage = await setStage();
});
afterAll(async () => {
  await stage.close();
});

const engineer = 'engineer@wrenlock.example';
const reader = 'reader@wrenlock.example';
const verdict = (page: Page) => page.locator('p.font-serif.text-4xl');

/** Opens a member of the demo firm by project and mark. */
async function openMember(page: Page, project: string, mark: string): Promise<void> {
  await page.goto(`${stage.url}/projects`);
  await page.getByRole('link', { name: project }).first().click();
  await page.getByRole('link', { name: new RegExp(`^${mark} `) }).click();
  await page.locator('svg.member-strip').waitFor();
}

describe('an engineer reads a ledger', () => {
  it('signs in, changes a span, watches the verdict, saves, reloads', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'J1');
    await expect.poll(() => verdict(page).textContent()).toMatch(/Passes/);
    await page.getByText('edition 1').first().waitFor();

    const span = page.getByLabel('Span, centre to centre of bearings');
    const before = await span.inputValue();
    await span.fill('6.2 m');
    await expect.poll(() => verdict(page).textContent()).toMatch(/Fails/);
    await span.fill('3 m');
    await expect.poll(() => verdict(page).textContent()).toMatch(/Passes/);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText(/^Version 2, saved/).waitFor();
    await page.reload();
    await page.locator('svg.member-strip').waitFor();
    expect(await page.getByLabel('Span, centre to centre of bearings').inputValue()).toBe('3000');
    await page.getByLabel('Span, centre to centre of bearings').fill(before);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText(/^Version 3, saved/).waitFor();
  });

  it('reads why a factor was chosen, its clause and its source, down to raw inputs', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'J1');
    await page.getByRole('button', { name: 'Bending', exact: true }).click();
    const ledger = page.getByRole('group', { name: 'Ledger, table' });
    await ledger.getByText(/72 < h = .* ≤ 300/).waitFor();
    await ledger.getByRole('button', { name: 'Depth factor' }).click();
    await ledger.getByText('Exact value').waitFor();
    await ledger.getByText(/Cases tried/).waitFor();
    await ledger
      .getByText(/Not verified by a second person/)
      .first()
      .waitFor();
    await page.getByRole('button', { name: 'Open the whole ledger' }).click();
    await ledger
      .getByText(/Dead load|dead load/)
      .first()
      .waitFor();
  });

  it('asks for the depth by each check and takes the next section in stock', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'J1');
    await page.getByLabel('Depth', { exact: true }).fill('97');
    await expect.poll(() => verdict(page).textContent()).toMatch(/Fails/);
    const depth = page.getByRole('group', { name: 'Required depth, table' });
    for (const check of ['Bending', 'Shear', 'Deflection', 'All together']) {
      await depth.getByRole('rowheader', { name: check }).waitFor();
    }
    await page.getByRole('button', { name: /^Take \d+ × \d+/ }).click();
    await expect.poll(() => verdict(page).textContent()).toMatch(/Passes|Close/);
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect.poll(() => verdict(page).textContent()).toMatch(/Fails/);
  });

  it('keeps what is typed: unreadable text, and over a reload', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'J3');
    const span = page.getByLabel('Span, centre to centre of bearings');
    await span.fill('-200');
    await page.getByText(/has to be above 0 mm/).waitFor();
    await span.fill('tall');
    await page.getByText(/can’t be read as a number/).waitFor();
    await expect.poll(() => verdict(page).textContent()).toMatch(/No verdict/);
    await page.reload();
    await page.getByText(/was kept on this machine/).waitFor();
    expect(await page.getByLabel('Span, centre to centre of bearings').inputValue()).toBe('tall');
    await page.getByRole('button', { name: 'Go back to what is saved' }).click();
    await expect.poll(() => verdict(page).textContent()).toMatch(/Passes/);
  });

  it('asks for the password over the page when the session has ended, and loses nothing', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'R1');
    const depth = page.getByLabel('Depth', { exact: true });
    const before = await depth.inputValue();
    await depth.fill('195');
    await page.context().clearCookies();
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByRole('dialog', { name: 'Your session has ended' }).waitFor();
    expect(await depth.inputValue()).toBe('195');
    const { demoPassword } = await import('#server/db/seed.ts');
    await page.getByLabel('Password').fill(demoPassword);
    await page.getByRole('button', { name: 'Sign in and go on' }).click();
    await page.getByText(/^Version 2, saved/).waitFor();
    await depth.fill(before);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText(/^Version 3, saved/).waitFor();
  });

  it('shows both versions when a colleague saved first, and keeps what was typed', async () => {
    const [mine, theirs] = [await stage.open(), await stage.open()];
    for (const page of [mine, theirs]) {
      await signIn(page, stage.url, engineer);
      await openMember(page, 'Kestrel Row reading room', 'L1');
    }
    await theirs.getByLabel('Title').fill('Lintel, seen again');
    await theirs.getByRole('button', { name: 'Save', exact: true }).click();
    await theirs.getByText(/^Version 2, saved/).waitFor();
    await mine.getByLabel('Title').fill('Lintel, mine');
    await mine.getByRole('button', { name: 'Save', exact: true }).click();
    const dialog = mine.getByRole('dialog');
    await dialog.getByText('both changed it').waitFor();
    await dialog.getByText('Lintel, seen again').waitFor();
    await dialog.getByRole('button', { name: 'Take these onto the sheet' }).click();
    expect(await mine.getByLabel('Title').inputValue()).toBe('Lintel, mine');
    await mine.getByRole('button', { name: 'Save', exact: true }).click();
    await mine.getByText(/^Version 3, saved/).waitFor();
  });

  it('gives a Reader the same sheet, and nothing to change', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, reader);
    await openMember(page, 'Kestrel Row reading room', 'J1');
    await expect.poll(() => verdict(page).textContent()).toMatch(/Passes/);
    expect(await page.getByRole('button', { name: 'Save', exact: true }).count()).toBe(0);
    expect(await page.locator('#page input:not([type=search]), #page textarea').count()).toBe(0);
    await page.getByRole('button', { name: 'Verify the stored result' }).click();
    await page.getByText(/the same to the last byte/).waitFor();
  });
});

describe('every page, in both themes', () => {
  it.each(['light', 'dark'] as const)('has no violation of WCAG 2.2 AA (%s)', async (theme) => {
    const page = await stage.open({ theme });
    await page.goto(`${stage.url}/sign-in`);
    await page.getByLabel('E-mail').waitFor();
    await expectAccessible(page, 'sign-in');
    await signIn(page, stage.url, engineer);
    const visit = async (path: string, ready: string) => {
      await page.goto(`${stage.url}${path}`);
      await page.locator(ready).first().waitFor();
      await page.waitForTimeout(200);
      await expectAccessible(page, `${path} (${theme})`);
    };
    for (const path of ['/', '/projects', '/bases', '/stock', '/trail', '/firm'])
      await visit(path, 'main h1');
    await openMember(page, 'Kestrel Row reading room', 'B1');
    await expectAccessible(page, `member (${theme})`);
    await page.getByRole('button', { name: 'Find a section' }).click();
    await page.getByText(/of \d+ pass/).waitFor();
    await expectAccessible(page, `find a section (${theme})`);
    await page.keyboard.press('Escape');
    await page.getByRole('link', { name: 'Kestrel Row reading room (invented)' }).click();
    await page.getByRole('table', { name: 'Members' }).waitFor();
    await expectAccessible(page, `project (${theme})`);
    await page.goto(`${stage.url}/bases`);
    await page
      .getByRole('link', { name: /House basis/ })
      .first()
      .click();
    await page.getByRole('table', { name: 'Editions' }).waitFor();
    await expectAccessible(page, `basis (${theme})`);
    await page.getByRole('link', { name: 'Edition 1', exact: true }).click();
    await page.locator('details').first().waitFor();
    await expectAccessible(page, `edition (${theme})`);
  });
});

describe('first load of the member page', () => {
  it('brings at most 250 kB of compressed script', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, engineer);
    await openMember(page, 'Kestrel Row reading room', 'J1');
    const address = page.url();
    const fresh = await page.context().newPage();
    const cdp = await fresh.context().newCDPSession(fresh);
    await cdp.send('Network.enable');
    await cdp.send('Network.setCacheDisabled', { cacheDisabled: true });
    const scripts = new Set<string>();
    let bytes = 0;
    cdp.on('Network.responseReceived', ({ requestId, type }) => {
      if (type === 'Script') scripts.add(requestId);
    });
    cdp.on('Network.loadingFinished', ({ requestId, encodedDataLength }) => {
      if (scripts.has(requestId)) bytes += encodedDataLength;
    });
    await fresh.goto(address);
    await fresh.locator('svg.member-strip').waitFor();
    expect(scripts.size).toBeGreaterThan(1);
    expect(bytes).toBeGreaterThan(50_000);
    expect(bytes).toBeLessThanOrEqual(250_000);
  });
});
