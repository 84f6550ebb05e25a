import { expect, type Page } from '@playwright/test';

/** Accounts of a register in demo mode; contributor and reviewer are of different laboratories. */
export const people = {
  contributor: { email: 'contributor@demo.example', name: 'Tamsin Arkwright' },
  reviewer: { email: 'reviewer@demo.example', name: 'Rafael Lindqvist' },
  curator: { email: 'curator@demo.example', name: 'Ilse Varga' },
  administrator: { email: 'administrator@demo.example', name: 'Noor Haddad' },
} as const;
export type PersonKey = keyof typeof people;

export const demoPassword = 'karya-demo-2026';

export const isPhone = (page: Page): boolean => (page.viewportSize()?.width ?? 0) < 900;

/** Fills the form of the sign-in page that is open and sends it. */
export async function fillSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('Mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

/** From a page of the register to being signed in, on to `next`. */
export async function signInAs(page: Page, who: PersonKey, next = '/'): Promise<void> {
  await page.goto(`/sign-in?next=${encodeURIComponent(next)}`);
  await fillSignIn(page, people[who].email, demoPassword);
  await expect(page).not.toHaveURL(/\/sign-in/);
}

/** The acts of the account: in the rail, or on a phone behind the name at the top of the register. */
export async function openAccountActs(page: Page): Promise<void> {
  if (!isPhone(page)) return;
  await page.goto('/');
  await page.getByRole('button', { name: /account and theme$|^Sign in and theme$/ }).click();
}

export async function signOut(page: Page): Promise<void> {
  await openAccountActs(page);
  await page.getByRole('button', { name: 'sign out' }).click();
  await expect(page.getByRole('link', { name: 'sign in', exact: true })).toBeVisible();
}

/** Goes to a place of the rail or bar by its word. */
export async function openPlace(page: Page, label: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Places' }).getByRole('link', { name: new RegExp(`^${label}`) }).click();
}
