import { expect, type Page } from '@playwright/test';
import { demoPassword, people, type PersonKey } from './flowPeople';

/** Who opens a page: nobody signed in, or one of the demonstration's people. */
export type Visitor = PersonKey | 'anyone';

/** Signs in through the API, for tests whose subject is another page than that of signing in. */
export async function signIn(page: Page, who: Visitor): Promise<void> {
  await page.context().clearCookies();
  if (who === 'anyone') return;
  const answer = await page.request.post('/api/auth/sign-in/email', { data: { email: people[who].email, password: demoPassword } });
  expect(answer.status(), await answer.text()).toBe(200);
}

/** Waits until a page has its heading and nothing on it is still on the way. */
export async function waitForData(page: Page): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible({ timeout: 20_000 });
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0, { timeout: 20_000 });
}

/** Asks for a theme as the visitor's system does; an open page follows at once. */
export async function askForTheme(page: Page, theme: 'brightfield' | 'darkfield'): Promise<void> {
  await page.emulateMedia({ colorScheme: theme === 'darkfield' ? 'dark' : 'light' });
}

/** Waits until the page stands in a theme. */
export async function expectTheme(page: Page, theme: 'brightfield' | 'darkfield'): Promise<void> {
  await expect(page.locator(`html[data-theme="${theme}"]`)).toBeAttached();
}

/** A list of the API as the signed-in visitor sees it. */
export async function listOf<Item>(page: Page, path: string): Promise<Item[]> {
  const answer = await page.request.get(`/api/v1${path}`);
  expect(answer.status(), `${path}: ${await answer.text()}`).toBe(200);
  const body = (await answer.json()) as { items: Item[] };
  return body.items;
}
