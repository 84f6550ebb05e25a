import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe';
import { askForTheme, expectTheme, signIn, waitForData } from './support/pages';
import { routeTable, routesOfApp } from './support/routeTable';

test('every route of app/ is visited below', () => {
  expect(Object.keys(routeTable).sort()).toEqual(routesOfApp());
});

/** Only colours differ between the themes. */
const themes = [
  { theme: 'brightfield', rules: 'all' },
  { theme: 'darkfield', rules: 'colours' },
] as const;

for (const [route, visits] of Object.entries(routeTable)) {
  for (const [at, { as, address }] of visits.entries()) {
    const which = typeof address === 'string' ? address : `${route}, ${at + 1}`;
    test(`axe finds nothing grave at ${which} for ${as}`, async ({ page }) => {
      await signIn(page, as);
      const path = typeof address === 'string' ? address : await address(page);
      await askForTheme(page, 'brightfield');
      await page.goto(path);
      await waitForData(page);
      // A page that failed would pass the rest without showing anything.
      await expect(page.getByRole('button', { name: /^(Try again|Load the page again)$/ })).toHaveCount(0);
      for (const { theme, rules } of themes) {
        await askForTheme(page, theme);
        await expectTheme(page, theme);
        await expectAccessible(page, `${path} in ${theme}`, { rules });
      }
    });
  }
}
