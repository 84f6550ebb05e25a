import { expect, test, type Page } from '@playwright/test';
import { field, waitUntilKept } from './support/flowDraft';
import { demoPassword, fillSignIn, people } from './support/flowPeople';
import { signIn } from './support/pages';

/** What a page shows while its data are on the way, absent, refused or lost, and what typing survives. */

const problem = (status: number) => ({
  status,
  contentType: 'application/problem+json',
  body: JSON.stringify({ type: 'about:blank', title: 'The register has failed', status, detail: 'Nothing was changed.', code: 'internal', errors: [], requestId: 'test-request' }),
});

async function newDraft(page: Page): Promise<void> {
  await page.goto('/submissions/new');
  await page.getByRole('button', { name: 'Enter a specimen' }).click();
  await expect(page.getByRole('region', { name: 'Specimen', exact: true })).toBeVisible();
}

test('a page whose data are slow shows its heading and its shape until they come', async ({ page }) => {
  let release = () => {};
  const held = new Promise<void>((resolve) => (release = resolve));
  await page.route('**/api/v1/versions', async (route) => {
    await held;
    await route.continue();
  });
  await page.goto('/versions');
  await expect(page.getByRole('heading', { name: 'Versions', level: 1 })).toBeVisible();
  await expect(page.getByRole('status').filter({ hasText: 'Loading' })).toBeVisible();
  await expect(page.getByRole('table', { name: 'Versions' })).toBeHidden();
  release();
  await expect(page.getByRole('table', { name: 'Versions' })).toBeVisible();
  await expect(page.getByRole('status').filter({ hasText: 'Loading' })).toBeHidden();
});

test('a page whose data do not come says so and has them at the next try', async ({ page }) => {
  await page.route('**/api/v1/versions', (route) => route.abort());
  await page.goto('/versions');
  await expect(page.getByRole('alert')).toContainText('No answer came. The network or the register is not reachable', { timeout: 20_000 });
  await page.unroute('**/api/v1/versions');
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('table', { name: 'Versions' })).toBeVisible();
});

test('a failure of the register is shown in its words with the number to quote', async ({ page }) => {
  await page.route('**/api/v1/species?*', (route) => route.fulfill(problem(500)));
  await page.goto('/species');
  await expect(page.getByRole('alert')).toContainText('The register has failed. Nothing was changed. Request test-request.', { timeout: 20_000 });
  await page.unroute('**/api/v1/species?*');
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('link', { name: /Callithrix jacchus|Alouatta|Agouti|Aotus/ }).first()).toBeVisible();
});

test('lists without an entry say what comes there and what to do next', async ({ page }) => {
  const nothing = { status: 200, contentType: 'application/json', body: JSON.stringify({ items: [], nextCursor: null }) };
  for (const path of ['submissions', 'rechecks', 'notices']) await page.route(`**/api/v1/${path}?*`, (route) => route.fulfill(nothing));
  await signIn(page, 'contributor');
  await page.goto('/submissions');
  await expect(page.getByText('No submissions yet.')).toBeVisible();
  await page.goto('/rechecks');
  await expect(page.getByText('No re-checks yet.')).toBeVisible();
  await page.goto('/notices');
  await expect(page.getByText('Nothing yet.')).toBeVisible();
  await page.goto('/submissions');
  await page.getByRole('main').getByRole('link', { name: 'New submission' }).last().click();
  await expect(page.getByRole('heading', { name: 'New submission', level: 1 })).toBeVisible();
});

test('a page of work leads a visitor to sign in and back, and tells a wrong role for whom it is', async ({ page }) => {
  await page.goto('/submissions');
  await expect(page.getByText('This page needs an account. It is for contributor.')).toBeVisible();
  await page.getByRole('main').getByRole('link', { name: 'Sign in' }).click();
  await fillSignIn(page, people.contributor.email, demoPassword);
  await expect(page).toHaveURL(/\/submissions$/);
  await expect(page.getByRole('table')).toBeVisible();
  await page.goto('/curate');
  await expect(page.getByText('This page is for curator.')).toBeVisible();
});

test('what may not be known looks as what does not exist', async ({ page }) => {
  await signIn(page, 'reviewer');
  await page.goto('/submissions/00000000-0000-4000-8000-000000000000');
  await expect(page.getByRole('alert')).toContainText('There is nothing at this address.');
  await page.goto('/records/AK-999999');
  await expect(page.getByRole('alert')).toContainText('There is nothing at this address.');
  await page.goto('/nowhere/at-all');
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(page.getByRole('main').getByRole('link').first()).toBeVisible();
});

test('typing without network is kept here and sent when the network is back', async ({ page, context }) => {
  await signIn(page, 'contributor');
  await newDraft(page);
  await context.setOffline(true);
  await field(page, 'Specimen code').fill('QL-OFF-1');
  await expect(page.getByText('kept here, not yet sent', { exact: true })).toBeVisible();
  await field(page, 'Locality').fill('Quince valley');
  await context.setOffline(false);
  await waitUntilKept(page);
  await page.evaluate(() => localStorage.clear());
  await page.reload();
  await expect(field(page, 'Specimen code')).toHaveValue('QL-OFF-1');
  await expect(field(page, 'Locality')).toHaveValue('Quince valley');
});

test('typing while the register is away survives closing the page', async ({ page }) => {
  await signIn(page, 'contributor');
  await newDraft(page);
  await page.route('**/api/v1/submissions/*', (route) => (route.request().method() === 'PATCH' ? route.abort() : route.continue()));
  await field(page, 'Specimen code').fill('QL-OFF-2');
  await expect(page.getByText('kept here, not yet sent', { exact: true })).toBeVisible();
  const address = page.url();
  await page.goto('/');
  await page.unroute('**/api/v1/submissions/*');
  await page.goto(address);
  await expect(field(page, 'Specimen code')).toHaveValue('QL-OFF-2');
  await waitUntilKept(page);
});

test('a draft changed in two windows keeps both states until the person chooses', async ({ page, context }) => {
  await signIn(page, 'contributor');
  await newDraft(page);
  const other = await context.newPage();
  await other.goto(page.url());
  await field(other, 'Voucher').fill('from the other window');
  await waitUntilKept(other);
  await field(page, 'Voucher').fill('from this window');
  const alert = page.getByRole('alert').filter({ hasText: 'This draft was changed elsewhere' });
  await expect(alert).toBeVisible();
  await expect(field(page, 'Voucher')).toHaveValue('from this window');
  await page.getByRole('button', { name: 'Use the newer state' }).click();
  await expect(field(page, 'Voucher')).toHaveValue('from the other window');

  await field(page, 'Voucher').fill('from this window, again');
  await waitUntilKept(page);
  await field(other, 'Locality').fill('Larkmoor');
  await expect(other.getByRole('alert').filter({ hasText: 'This draft was changed elsewhere' })).toBeVisible();
  await other.getByRole('button', { name: 'Keep mine (send it)' }).click();
  await waitUntilKept(other);
  await other.reload();
  await expect(field(other, 'Locality')).toHaveValue('Larkmoor');
  await expect(field(other, 'Voucher')).toHaveValue('from the other window');
});

test('a draft is withdrawn after one question, with its reason, and stays listed', async ({ page }) => {
  await signIn(page, 'contributor');
  await newDraft(page);
  await field(page, 'Specimen code').fill('QL-GONE-1');
  await waitUntilKept(page);
  await page.getByRole('navigation', { name: 'Steps' }).getByRole('link', { name: /^Check and submit/ }).click();
  await page.getByRole('button', { name: 'Withdraw revision 1' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByRole('button', { name: 'Withdraw revision 1' }).click();
  await expect(dialog.getByText('Give the reason in a sentence.')).toBeVisible();
  await dialog.getByLabel('Reason').fill('Entered twice.');
  await dialog.getByRole('button', { name: 'Withdraw revision 1' }).click();
  await expect(page.getByText(/^Revision 1 of .* is withdrawn\.$/)).toBeVisible();
  await expect(dialog).toBeHidden();
  await expect(page.getByText('Withdrawn: it stays listed.')).toBeVisible();
  await page.goto('/submissions?state=withdrawn');
  await expect(page.getByRole('table').getByRole('row').filter({ hasText: 'QL-GONE-1' })).toBeVisible();
});
