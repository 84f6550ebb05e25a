import { expect, test, type Page } from '@playwright/test';
import { fillSignIn, isPhone, openPlace, signInAs, signOut } from './support/flowPeople';

/** An account from sign-up to its first draft, and a forgotten password. Mail is read where the administrator reads it. */
test.describe.configure({ mode: 'serial', timeout: 180_000 });

const name = 'Wren Abara';
const email = 'wren.abara@demo.example';
const password = 'a first password';
const newPassword = 'another password';

/** The address in the newest mail of that subject to the person, as the outbox shows it. */
async function addressInMail(page: Page, subject: string): Promise<string> {
  await signInAs(page, 'administrator', '/outbox');
  const mail = page.getByRole('button', { name: new RegExp(`^Allokarya: ${subject}.* to ${email}`) }).first();
  await expect(async () => {
    await page.getByRole('button', { name: 'Look again' }).click();
    await expect(mail).toBeVisible({ timeout: 2_000 });
  }).toPass();
  await mail.click();
  const text = await page.getByText(/https?:\/\/\S+/).first().innerText();
  await signOut(page);
  const address = /https?:\/\/\S+/.exec(text)?.[0];
  if (address === undefined) throw new Error(`No address stands in the mail "${subject}".`);
  return address;
}

test('signing up sends a link; before it is opened nobody gets in', async ({ page }) => {
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Sign up' }).click();
  await page.getByRole('button', { name: 'Sign up' }).click();
  await expect(page.getByText('Enter your mail address.')).toBeVisible();
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill('short');
  await page.getByRole('button', { name: 'Sign up' }).click();
  await expect(page.getByText('At least 10 characters.').first()).toBeVisible();
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign up' }).click();
  await expect(page.getByRole('heading', { name: 'Confirm your address' })).toBeVisible();

  await page.goto('/sign-in');
  await fillSignIn(page, email, password);
  await expect(page.getByRole('alert')).toHaveText('This address is not confirmed yet. A new mail with the link is on its way.');
});

test('the link of the mail confirms the address; without a role the pages of work say for whom they are', async ({ page }) => {
  await page.goto(await addressInMail(page, 'confirm your mail address'));
  await expect(page.getByRole('heading', { name: 'Your address is confirmed' })).toBeVisible();
  await expect(page.getByText('An administrator of the register now gives you your roles and your laboratory; a notice tells you.')).toBeVisible();
  await page.goto('/submissions');
  await expect(page.getByText('This page is for contributor.')).toBeVisible();
  await expect(page.getByRole('link', { name: 'New submission' })).toBeHidden();
  await page.goto('/people');
  await expect(page.getByText('This page is for administrator.')).toBeVisible();
});

test('the administrator gives a role and a laboratory, and the person begins a draft', async ({ page }) => {
  await signInAs(page, 'administrator');
  await openPlace(page, 'People');
  await page.getByLabel('Search people by name or mail address').fill(email);
  await page.getByRole('button', { name: `Change roles and laboratory of ${name}` }).click();
  const sheet = page.getByRole('dialog');
  await sheet.getByRole('checkbox', { name: /^contributor:/ }).click();
  await sheet.getByRole('button', { name: 'Save roles' }).click();
  await expect(sheet.getByRole('button', { name: 'Save roles' })).toBeDisabled();
  await sheet.getByLabel('New laboratory').selectOption({ label: 'Quince Laboratory of Comparative Anatomy (invented)' });
  await sheet.getByRole('button', { name: 'Add the membership' }).click();
  await expect(sheet.getByText(/^Quince Laboratory of Comparative Anatomy \(invented\), from \d{4}-\d\d-\d\d$/)).toBeVisible();
  await sheet.getByRole('button', { name: 'Done' }).click();
  await signOut(page);

  await page.goto('/sign-in');
  await fillSignIn(page, email, password);
  await openPlace(page, 'Submissions');
  await page.getByRole('link', { name: 'New submission' }).click();
  await page.getByRole('button', { name: 'Enter literature values' }).click();
  await expect(page.getByRole('region', { name: 'Source', exact: true })).toBeVisible();
});

test('a forgotten password is replaced by the link of a mail, and the old one ends', async ({ page }) => {
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Choose a new password' }).click();
  await page.getByLabel('Mail address').fill(email);
  await page.getByRole('button', { name: 'Send the link' }).click();
  await expect(page.getByRole('status').filter({ hasText: 'If this address has an account, a mail with a link is on its way.' })).toBeVisible();

  await page.goto(await addressInMail(page, 'choose a new password'));
  await page.getByLabel('New password', { exact: true }).fill(newPassword);
  await page.getByLabel('New password once more').fill('not the same');
  await page.getByRole('button', { name: 'Keep this password' }).click();
  await expect(page.getByText('The two are not the same.')).toBeVisible();
  await page.getByLabel('New password once more').fill(newPassword);
  await page.getByRole('button', { name: 'Keep this password' }).click();
  await expect(page.getByRole('heading', { name: 'The new password holds' })).toBeVisible();

  await page.getByRole('link', { name: 'Sign in', exact: true }).last().click();
  await fillSignIn(page, email, password);
  await expect(page.getByRole('alert')).toHaveText('Address or password is wrong.');
  await fillSignIn(page, email, newPassword);
  await expect(page).not.toHaveURL(/\/sign-in/);
  await signOut(page);
  await page.goto('/account');
  await expect(page.getByText('This page needs an account.')).toBeVisible();
});

test('an unknown address and a wrong password are refused in the same words', async ({ page }) => {
  await page.goto('/sign-in');
  for (const address of ['nobody@demo.example', email]) {
    await fillSignIn(page, address, 'not the password');
    await expect(page.getByRole('alert')).toHaveText('Address or password is wrong.');
    await page.reload();
  }
  if (!isPhone(page)) await expect(page.getByText('not signed in')).toBeVisible();
});
