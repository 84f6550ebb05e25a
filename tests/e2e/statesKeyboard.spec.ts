import { expect, test, type Locator, type Page } from '@playwright/test';
import { demoPassword, openAccountActs, people } from './support/flowPeople';
import { signIn } from './support/pages';

/** Keyboard alone, the remembered theme, and a session that ends while a page is open. */

/** Presses Tab until the element has the focus; fails where it cannot be reached. */
async function tabTo(page: Page, target: Locator, most = 60): Promise<void> {
  for (let pressed = 0; pressed < most; pressed += 1) {
    await page.keyboard.press('Tab');
    if (await target.evaluate((element) => element === document.activeElement)) return;
  }
  throw new Error('Tab does not reach it.');
}

test('the places are reached and opened by keyboard alone, past the skip link', async ({ page }) => {
  await page.goto('/');
  const scaling = page.getByRole('navigation', { name: 'Places' }).getByRole('link', { name: 'Scaling' });
  await expect(scaling).toBeVisible();
  await page.keyboard.press('Tab');
  await expect(page.getByRole('link', { name: 'Go to the content' })).toBeFocused();
  await tabTo(page, scaling, 120);
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/scaling/);
  await expect(page.getByRole('heading', { level: 1 })).toBeFocused();
});

test('Enter in the password field signs in', async ({ page }) => {
  await page.goto('/sign-in?next=/submissions');
  const address = page.getByLabel('Mail address');
  await expect(address).toBeVisible();
  await tabTo(page, address);
  await page.keyboard.type(people.contributor.email);
  await page.keyboard.press('Tab');
  await expect(page.getByLabel('Password', { exact: true })).toBeFocused();
  await page.keyboard.type(demoPassword);
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/submissions$/);
});

test('a dialog opened by Enter holds the focus, closes by Esc and gives the focus back', async ({ page }) => {
  await signIn(page, 'curator');
  await page.goto('/records/AK-000001');
  const ask = page.getByRole('button', { name: 'Ask for a re-check' });
  await ask.focus();
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog');
  await expect(dialog).toBeVisible();
  for (let pressed = 0; pressed < 8; pressed += 1) {
    await page.keyboard.press('Tab');
    expect(await dialog.evaluate((element) => element.contains(document.activeElement))).toBe(true);
  }
  await page.keyboard.press('Escape');
  await expect(dialog).toBeHidden();
  await expect(ask).toBeFocused();
});

test('the theme is switched and remembered', async ({ page }) => {
  await page.goto('/');
  const ground = () => page.getByRole('main').evaluate((element) => getComputedStyle(element).backgroundColor);
  await expect(page.getByRole('main')).toBeVisible();
  const before = await ground();
  await openAccountActs(page);
  await page.getByRole('switch', { name: /^Darkfield/ }).click();
  await expect(page.getByRole('switch', { name: /^Darkfield/ })).toBeChecked();
  await page.reload();
  await expect(page.getByRole('main')).toBeVisible();
  expect(await ground()).not.toBe(before);
  await openAccountActs(page);
  await expect(page.getByRole('switch', { name: /^Darkfield/ })).toBeChecked();
});

test('a session that ended while a page was open is told, and signing in leads back', async ({ page, context }) => {
  await signIn(page, 'contributor');
  await page.goto('/submissions/new');
  const enter = page.getByRole('button', { name: 'Enter a specimen' });
  await expect(enter).toBeVisible();
  await context.clearCookies();
  await enter.click();
  await expect(page.getByText('Sign in first.')).toBeVisible();
  await page.reload();
  await page.getByRole('main').getByRole('link', { name: 'Sign in' }).click();
  await page.getByLabel('Mail address').fill(people.contributor.email);
  await page.getByLabel('Password', { exact: true }).fill(demoPassword);
  await page.keyboard.press('Enter');
  await expect(enter).toBeVisible();
});
