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

const keeper = 'keeper@wrenlock.example';
const checker = 'checker@wrenlock.example';
const basis = `Floors of test ${process.pid}`;

/** Puts text on the clipboard and pastes it where the focus is. */
async function paste(page: Page, text: string): Promise<void> {
  await page.evaluate((content) => {
    const data = new DataTransfer();
    data.setData('text/plain', content);
    document.activeElement?.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
    );
  }, text);
}

describe('a basis keeper drafts and a second person releases', () => {
  it('starts from a starter, pastes and uploads grades, adds a factor, is returned and released', async () => {
    const page = await stage.open();
    await signIn(page, stage.url, keeper);
    await page.goto(`${stage.url}/bases`);
    await page.getByRole('button', { name: 'Set up a basis' }).click();
    await page.getByLabel('Title').fill(basis);
    await page.getByRole('radio', { name: /Starter: permissible stress/ }).check();
    await page.getByRole('button', { name: 'Set it up' }).click();
    await page.getByRole('table', { name: 'Editions' }).getByRole('link', { name: 'Edition 1' }).click();
    await page.getByRole('link', { name: 'Work on the draft' }).click();
    await page.waitForURL(/\/draft$/);
    const grid = page.getByRole('grid', { name: 'Grades' });
    await grid.waitFor();
    const draft = page.url();

    // A block of 10 grades by 8 values, from a spreadsheet.
    await page.getByRole('button', { name: 'Add a grade' }).click();
    const added = grid.getByRole('rowheader', { name: /New grade/ });
    await added.click();
    const block = Array.from({ length: 10 }, (_, i) =>
      [`Test grade ${i + 1}`, 'Softwood', ...Array.from({ length: 6 }, (_, j) => `${i + j + 1}.5`)].join(
        '\t',
      ),
    ).join('\n');
    await paste(page, block);
    await grid.getByRole('rowheader', { name: 'Test grade 10' }).waitFor();

    // Typing into a cell, undo and redo.
    await grid.getByRole('rowheader', { name: /^Test grade 1$/ }).click();
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('ArrowRight');
    await page.keyboard.type('9.25');
    await page.keyboard.press('Enter');
    await grid.getByText('9.25', { exact: true }).waitFor();
    await page.keyboard.press('Control+z');
    await expect.poll(() => grid.getByText('9.25', { exact: true }).count()).toBe(0);
    await page.keyboard.press('Control+Shift+z');
    await grid.getByText('9.25', { exact: true }).waitFor();

    // A CSV with three bad rows.
    await page.getByRole('button', { name: 'Upload CSV' }).click();
    await page.getByLabel('CSV file').setInputFiles({
      name: 'grades.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(
        'Grade;f_m\nTest grade 2;7,75\nTest grade 3;eight\n;5\nTest grade 2;6\nTest grade 4;6,5\n',
      ),
    });
    await page.getByText('2 of 5 rows will be taken; 3 can’t be read.').waitFor();
    await page.getByRole('button', { name: 'Take 2 rows' }).click();
    await grid.getByText('7.75', { exact: true }).first().waitFor();

    // A factor with two cases and a formula.
    await page.getByRole('tab', { name: 'Clauses' }).click();
    await page.getByRole('button', { name: 'Add a factor' }).click();
    await page.getByLabel('Symbol').fill('K_house');
    await page.getByLabel('Title').fill('House factor');
    await page.getByRole('button', { name: 'Add a case' }).click();
    await page.getByLabel('Kind of outcome').first().selectOption('formula');
    await page.getByLabel('Formula').fill('min(1, (300 / h');
    await page
      .getByText(/can’t be read/)
      .first()
      .waitFor();
    await page.getByLabel('Formula').fill('0.9 + 0.1 / 2');
    await page.getByText('is used by no check').first().waitFor();
    await expect.poll(() => page.getByText('Saved.').count()).toBe(1);

    // What was typed survives a reload.
    await page.reload();
    await page.getByRole('tab', { name: 'Clauses' }).click();
    await page.getByRole('button', { name: /House factor/ }).waitFor();

    await page.getByRole('button', { name: 'Submit for check' }).click();
    await page.getByLabel('What it changes, and why').fill('Grades of the test yard, and a house factor.');
    await page.getByRole('dialog').getByRole('button', { name: 'Submit for check' }).click();
    await page.getByRole('heading', { level: 1, name: /In check/ }).waitFor();
    expect(await page.getByRole('button', { name: 'Release this edition' }).isDisabled()).toBe(true);

    const second = await stage.open();
    await signIn(second, stage.url, checker);
    await second.goto(draft);
    await second.getByRole('button', { name: 'Return with remarks' }).click();
    await second.getByLabel('Why it is returned').fill('One remark.');
    await second.getByLabel('Remark', { exact: true }).fill('Compare grade 2 with its declaration.');
    await second.getByLabel('Place of the remark').fill('/grades/rows/0');
    await second.getByRole('dialog').getByRole('button', { name: 'Return with remarks' }).click();
    await second.getByRole('heading', { level: 1, name: /Draft/ }).waitFor();

    await page.goto(draft);
    await page.getByText('Compare grade 2 with its declaration.').waitFor();
    await page.getByRole('tab', { name: 'Clauses' }).click();
    await page.getByRole('button', { name: /House factor/ }).click();
    await page.getByRole('button', { name: 'Remove the clause' }).click();
    await expect.poll(() => page.getByText('Saved.').count()).toBe(1);
    await page.getByRole('button', { name: 'Submit for check' }).click();
    await page.getByLabel('What it changes, and why').fill('Without the house factor.');
    await page.getByRole('dialog').getByRole('button', { name: 'Submit for check' }).click();
    await page.getByRole('heading', { level: 1, name: /In check/ }).waitFor();

    await second.goto(draft);
    await second.getByRole('button', { name: 'Release this edition' }).click();
    await second.getByRole('dialog').getByRole('button', { name: 'Release this edition' }).click();
    await second.getByRole('heading', { level: 1, name: /Released/ }).waitFor();
    expect(await second.getByRole('button', { name: 'Add a grade' }).count()).toBe(0);
  });

  it.each(['light', 'dark'] as const)('has no violation of WCAG 2.2 AA on its parts (%s)', async (theme) => {
    const page = await stage.open({ theme });
    await signIn(page, stage.url, keeper);
    await page.goto(`${stage.url}/bases`);
    await page.getByRole('button', { name: 'Set up a basis' }).click();
    await page.getByLabel('Title').fill(`${basis} ${theme}`);
    await page.getByRole('radio', { name: /Starter: permissible stress/ }).check();
    await page.getByRole('button', { name: 'Set it up' }).click();
    await page.getByRole('table', { name: 'Editions' }).getByRole('link', { name: 'Edition 1' }).click();
    await page.getByRole('link', { name: 'Work on the draft' }).click();
    await page.waitForURL(/\/draft$/);
    await page.getByRole('grid', { name: 'Grades' }).waitFor();
    for (const tab of ['Grades', 'Clauses', 'Tables', 'Differences']) {
      await page.getByRole('tab', { name: tab }).click();
      if (tab === 'Clauses') await page.getByRole('button', { name: /Depth factor/ }).click();
      await page.waitForTimeout(400);
      await expectAccessible(page, `${tab} (${theme})`);
    }
  });
});
