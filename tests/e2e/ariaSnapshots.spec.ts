import { expect, test, type Page } from '@playwright/test';
import { isPhone } from './support/flowPeople';
import { signIn, waitForData } from './support/pages';

/**
 * What a screen reader is told on the main screens. `npx playwright test ariaSnapshots --update-snapshots` keeps
 * a change that is meant; afterwards checksums and ids, which differ from register to register, are made patterns by hand.
 * Runs before the flow, which freezes a second version.
 */
async function opened(page: Page, path: string) {
  await page.goto(path);
  await waitForData(page);
  return page.getByRole('main');
}

test('the Register tells version, coverage and standing exponents', async ({ page }) => {
  await expect(await opened(page, '/')).toMatchAriaSnapshot({ name: 'register.aria.yml' });
});

test('Scaling tells figure, exponents and sentences', async ({ page }) => {
  await expect(await opened(page, '/scaling')).toMatchAriaSnapshot({ name: 'scaling.aria.yml' });
});

test('a species tells its structures and records', async ({ page }) => {
  await expect(await opened(page, '/species/homo-sapiens')).toMatchAriaSnapshot({ name: 'species.aria.yml' });
});

test('the queue tells what waits', async ({ page }) => {
  await signIn(page, 'reviewer');
  await opened(page, '/review');
  await expect(page.getByRole(isPhone(page) ? 'main' : 'complementary')).toMatchAriaSnapshot({ name: 'review-queue.aria.yml' });
});

test('a version tells stamp, files and checksums', async ({ page }) => {
  await expect(await opened(page, '/versions/1')).toMatchAriaSnapshot({ name: 'version.aria.yml' });
});
