import { expect, test, type Page } from '@playwright/test';
import { expectAccessible } from './support/axe';
import { isPhone } from './support/flowPeople';
import { listOf, signIn, waitForData, type Visitor } from './support/pages';

interface DialogVisit {
  as: Visitor;
  /** Opens the page and then the dialog. */
  open: (page: Page) => Promise<void>;
  title: string | RegExp;
  /** Word of the act that closes it. */
  close: string;
}

async function openPage(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await waitForData(page);
}

async function openReview(page: Page): Promise<void> {
  const [first] = await listOf<{ id: string }>(page, '/review/queue');
  await openPage(page, `/review/${first?.id ?? ''}`);
}

const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name }).first().click();

const visits: Record<string, DialogVisit> = {
  'the sheet that cites a species': {
    as: 'anyone',
    open: async (page) => {
      await openPage(page, '/species/homo-sapiens');
      await press(page, /^Cite the records of/);
    },
    title: /^Cite the records of/,
    close: 'Done',
  },
  'the sheet that cites a fit': {
    as: 'anyone',
    open: async (page) => {
      await openPage(page, '/scaling');
      await press(page, 'Cite this fit');
    },
    title: 'Cite this fit',
    close: 'Close',
  },
  'the sheet that saves a figure': {
    as: 'anyone',
    open: async (page) => {
      await openPage(page, '/scaling');
      await press(page, isPhone(page) ? 'Save' : 'Save figure');
    },
    title: 'Save',
    close: 'Close',
  },
  'the sheet that asks for a re-check': {
    as: 'reviewer',
    open: async (page) => {
      await openPage(page, '/records/AK-000001');
      await press(page, 'Ask for a re-check');
    },
    title: 'Ask for a re-check of AK-000001',
    close: 'Close',
  },
  'the sheet that sets a record aside': {
    as: 'curator',
    open: async (page) => {
      await openPage(page, '/records/AK-000001');
      await press(page, 'Set aside');
    },
    title: 'Set AK-000001 aside',
    close: 'Close',
  },
  'the sheet of a decision': {
    as: 'reviewer',
    open: async (page) => {
      await openReview(page);
      await press(page, 'Approve');
    },
    title: /^Approve/,
    close: 'Keep reviewing',
  },
  'the confirmation of a freeze': {
    as: 'curator',
    open: async (page) => {
      await openPage(page, '/curate/freeze');
      await page.getByLabel('Number of the version').fill('2');
      await press(page, 'Freeze version 2');
    },
    title: 'Freeze version 2?',
    close: 'Not yet',
  },
  'the sheet of a person': {
    as: 'administrator',
    open: async (page) => {
      await openPage(page, '/people');
      await press(page, /^Change roles and laboratory of Rafael Lindqvist/);
    },
    title: 'Rafael Lindqvist',
    close: 'Done',
  },
};

for (const [name, { as, open, title, close }] of Object.entries(visits)) {
  test(`${name} has a name, is free of grave faults and gives the focus back`, async ({ page }) => {
    await signIn(page, as);
    await open(page);
    const dialog = page.getByRole('dialog', { name: title });
    await expect(dialog).toBeVisible();
    await expectAccessible(page, name);
    await dialog.getByRole('button', { name: close, exact: true }).click();
    await expect(dialog).toBeHidden();
    await expect(page.locator(':focus')).toHaveCount(1);
  });
}

test('the choices of Scaling are at hand: in a sheet on a phone, beside the figure where there is room', async ({ page }) => {
  await openPage(page, '/scaling');
  if (isPhone(page)) {
    await press(page, 'Axes and clades');
    await expect(page.getByRole('dialog', { name: 'Axes and clades' })).toBeVisible();
  }
  await expect(page.getByRole('radiogroup', { name: /method/i })).toBeVisible();
  await expectAccessible(page, 'choices of Scaling');
});
