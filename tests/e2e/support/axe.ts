import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

interface Scope {
  /** All rules, or those alone that the colours of a theme can break. */
  rules?: 'all' | 'colours';
}

/** Nothing that axe-core calls serious or critical; what it found is named with its place. */
export async function expectAccessible(page: Page, where: string, { rules = 'all' }: Scope = {}): Promise<void> {
  const axe = new AxeBuilder({ page });
  if (rules === 'colours') axe.withRules(['color-contrast', 'link-in-text-block']);
  const { violations } = await axe.analyze();
  const grave = violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(' ')} ${node.any[0]?.message ?? node.all[0]?.message ?? node.none[0]?.message ?? ''}`));
  expect(grave, where).toEqual([]);
}
