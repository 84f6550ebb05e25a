import { expect, type Page } from '@playwright/test';
import { isPhone, openAccountActs } from './flowPeople';

/** What reviewers, contributors and curators do after a submission, by the words of the screens. */

export async function openFromQueue(page: Page, title: string, revision: number): Promise<void> {
  await page.getByRole('link', { name: `${title}, revision ${revision}`, exact: true }).click();
  await expect(page.getByText(`· revision ${revision}, submitted`)).toBeVisible();
}

export async function commentAt(page: Page, button: string, text: string): Promise<void> {
  await page.getByRole('button', { name: button, exact: true }).click();
  const sheet = page.getByRole('dialog');
  await sheet.getByLabel('Comment', { exact: true }).fill(text);
  await sheet.getByRole('button', { name: 'Add the comment' }).click();
  await expect(sheet).toBeHidden();
  await expect(page.getByText(text)).toBeVisible();
}

/** Opens the sheet of a decision, ticks the whole checklist and sends it with its reason. */
export async function decide(page: Page, decision: 'Approve' | 'Ask for changes', confirm: string, reason: string): Promise<void> {
  await page.getByRole('button', { name: decision, exact: true }).click();
  const sheet = page.getByRole('dialog');
  for (const point of await sheet.getByRole('checkbox').all()) await point.click();
  await sheet.getByLabel('Reason', { exact: true }).fill(reason);
  await sheet.getByRole('button', { name: confirm, exact: true }).click();
  await expect(sheet).toBeHidden();
}

/** Follows the newest notice that begins so: rail or register, account, notices. */
export async function followNotice(page: Page, begins: string): Promise<void> {
  await openAccountActs(page);
  await page.getByRole('link', { name: /, your account$/ }).click();
  await page.getByRole('link', { name: /^\d+ new$/ }).click();
  await page.getByRole('link', { name: new RegExp(`^${begins}`) }).first().click();
}

/** Opens the row of a table by words that stand in it. */
export async function openRow(page: Page, table: string, ...words: string[]): Promise<void> {
  let row = page.getByRole('table', { name: table }).getByRole('row');
  for (const word of words) row = row.filter({ hasText: word });
  await row.getByRole('link').first().click();
}

/** Species of the table below a figure; on a phone it is folded away. */
export async function openPoints(page: Page): Promise<void> {
  if (isPhone(page)) await page.getByRole('button', { name: /^The figure’s numbers/ }).click();
  await expect(page.getByRole('table', { name: 'Points of the figure' })).toBeVisible();
}
