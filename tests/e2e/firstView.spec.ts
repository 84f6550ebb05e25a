import { gzipSync } from 'node:zlib';
import { expect, test } from '@playwright/test';
import { waitForData } from './support/pages';

const LIMIT_KB = 450;

test('the first view of the register loads less than 450 kB of compressed script', async ({ page }) => {
  const scripts: { url: string; kilobytes: number; encoding: string | undefined; cached: string | undefined }[] = [];
  const readings: Promise<void>[] = [];
  page.on('response', (response) => {
    const { pathname } = new URL(response.url());
    if (!pathname.endsWith('.js')) return;
    const read = async () => {
      const headers = response.headers();
      scripts.push({ url: pathname, kilobytes: gzipSync(await response.body()).length / 1000, encoding: headers['content-encoding'], cached: headers['cache-control'] });
    };
    readings.push(read());
  });
  await page.goto('/');
  await waitForData(page);
  await page.waitForLoadState('networkidle');
  await Promise.all(readings);
  const total = scripts.reduce((sum, { kilobytes }) => sum + kilobytes, 0);
  test.info().annotations.push({ type: 'first view', description: `${total.toFixed(0)} kB` });
  expect(scripts.length).toBeGreaterThan(2);
  expect(total).toBeLessThan(LIMIT_KB);
  for (const script of scripts) {
    expect(script.encoding, script.url).toMatch(/^(br|gzip)$/);
    expect(script.cached, script.url).toContain('immutable');
  }
});

test('charts, forms and the arithmetic are loaded when a page needs them', async ({ page }) => {
  const loaded: string[] = [];
  page.on('response', (response) => loaded.push(new URL(response.url()).pathname));
  await page.goto('/');
  await waitForData(page);
  expect(loaded.filter((path) => /countingScreens|accountForms|scaling/.test(path) && path.endsWith('.js'))).toEqual([]);
  await page.goto('/bench');
  await waitForData(page);
  expect(loaded.some((path) => path.includes('countingScreens'))).toBe(true);
});

test('a part of the client that does not arrive says so and can be loaded again', async ({ page }) => {
  await page.route(/countingScreens.*\.js/, (route) => route.abort());
  await page.goto('/bench');
  await expect(page.getByRole('alert')).toContainText('A part of this page could not be loaded.');
  await page.unroute(/countingScreens.*\.js/);
  await page.getByRole('button', { name: 'Load the page again' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(/bench|sample/i);
});
