import { mkdirSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { chromium } from '@playwright/test';
import { root } from './paths.mjs';

/**
 * `npm run screenshots`: the four pictures of README.md, taken of a running demonstration register
 * (`npm start`; APP_URL names another address). Kept as JPEG, so that the repository stays small.
 */
const address = (process.env.APP_URL || 'http://127.0.0.1:4680').replace(/\/+$/, '');
const password = process.env.DEMO_PASSWORD || 'karya-demo-2026';
const folder = join(root, 'assets', 'readme');
const wide = { width: 1280, height: 860 };
const phone = { width: 390, height: 844 };

async function firstToReview(request) {
  const answer = await request.get(`${address}/api/v1/review/queue`);
  const { items } = await answer.json();
  if (items.length === 0) throw new Error('Nothing waits for review; take the pictures of a new demonstration register.');
  return `/review/${items[0].id}`;
}

const pictures = [
  { name: 'register', path: '/', viewport: wide, theme: 'brightfield' },
  { name: 'scaling', path: '/scaling', viewport: wide, theme: 'brightfield' },
  { name: 'review', path: firstToReview, viewport: wide, theme: 'darkfield', as: 'reviewer@demo.example' },
  { name: 'bench', path: '/bench', viewport: phone, theme: 'brightfield' },
];

async function take(browser, { name, path, viewport, theme, as }) {
  const context = await browser.newContext({ viewport, locale: 'en-GB', timezoneId: 'UTC' });
  if (as) {
    const answer = await context.request.post(`${address}/api/auth/sign-in/email`, { data: { email: as, password } });
    if (!answer.ok()) throw new Error(`${as} could not sign in (${answer.status()}).`);
  }
  const page = await context.newPage();
  await page.addInitScript((chosen) => localStorage.setItem('allokarya.theme', chosen), theme);
  const place = typeof path === 'string' ? path : await path(context.request);
  await page.goto(`${address}${place}`, { waitUntil: 'networkidle' });
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.locator('[aria-busy="true"]').waitFor({ state: 'detached' });
  await page.evaluate(() => document.fonts.ready.then(() => undefined));
  await page.screenshot({ path: join(folder, `${name}.jpg`), type: 'jpeg', quality: 72 });
  await context.close();
}

mkdirSync(folder, { recursive: true });
const browser = await chromium.launch({ executablePath: process.env.CHROMIUM || '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'] });
try {
  for (const picture of pictures) await take(browser, picture);
} finally {
  await browser.close();
}
for (const file of readdirSync(folder)) console.log(`assets/readme/${file}  ${Math.round(statSync(join(folder, file)).size / 1000)} kB`);
