import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { listOf, type Visitor } from './pages';

/** An address of a route, and who may see it. */
export interface RouteVisit {
  as: Visitor;
  address: string | ((page: Page) => Promise<string>);
}

interface Listed {
  id: string;
  status: string;
}

const firstOf = (path: string, prefix: string, status?: string) => async (page: Page) => {
  const items = await listOf<Listed>(page, path);
  const found = items.find((item) => status === undefined || item.status === status);
  if (found === undefined) throw new Error(`The demonstration has nothing for ${prefix} (${status ?? 'any state'}).`);
  return `${prefix}/${found.id}`;
};

/** Every route of app/, by its file; one entry for each state that has a screen of its own. */
export const routeTable: Record<string, readonly RouteVisit[]> = {
  '(browse)/index': [{ as: 'anyone', address: '/' }, { as: 'contributor', address: '/' }],
  '(browse)/scaling': [{ as: 'anyone', address: '/scaling' }],
  '(browse)/species/index': [{ as: 'anyone', address: '/species' }],
  '(browse)/species/[slug]': [{ as: 'anyone', address: '/species/homo-sapiens' }],
  '(browse)/records/[number]': [{ as: 'anyone', address: '/records/AK-000001' }, { as: 'curator', address: '/records/AK-000001' }],
  '(browse)/versions/index': [{ as: 'anyone', address: '/versions' }],
  '(browse)/versions/[label]': [{ as: 'anyone', address: '/versions/1' }],
  '(contribute)/bench': [{ as: 'anyone', address: '/bench' }],
  '(contribute)/submissions/index': [{ as: 'contributor', address: '/submissions' }],
  '(contribute)/submissions/new': [{ as: 'contributor', address: '/submissions/new' }],
  '(contribute)/submissions/[id]': [
    { as: 'contributor', address: firstOf('/submissions', '/submissions', 'draft') },
    { as: 'contributor', address: firstOf('/submissions', '/submissions', 'changes-requested') },
  ],
  '(review)/review/index': [{ as: 'reviewer', address: '/review' }],
  '(review)/review/[id]': [{ as: 'reviewer', address: firstOf('/review/queue', '/review') }],
  '(review)/rechecks/index': [{ as: 'contributor', address: '/rechecks' }],
  '(review)/rechecks/[id]': [{ as: 'contributor', address: firstOf('/rechecks', '/rechecks') }],
  '(curate)/curate/index': [{ as: 'curator', address: '/curate' }],
  '(curate)/curate/freeze': [{ as: 'curator', address: '/curate/freeze' }],
  '(curate)/curate/taxa': [{ as: 'curator', address: '/curate/taxa' }],
  '(curate)/audit': [{ as: 'curator', address: '/audit' }],
  '(curate)/desk': [{ as: 'curator', address: '/desk' }],
  '(curate)/people': [{ as: 'administrator', address: '/people' }, { as: 'reviewer', address: '/people' }],
  '(curate)/labs': [{ as: 'administrator', address: '/labs' }],
  '(curate)/outbox': [{ as: 'administrator', address: '/outbox' }],
  '(account)/account': [{ as: 'reviewer', address: '/account' }],
  '(account)/notices': [{ as: 'contributor', address: '/notices' }],
  '(account)/sign-in': [{ as: 'anyone', address: '/sign-in' }],
  '(account)/sign-up': [{ as: 'anyone', address: '/sign-up' }],
  '(account)/forgot-password': [{ as: 'anyone', address: '/forgot-password' }],
  '(account)/reset-password': [{ as: 'anyone', address: '/reset-password?token=none' }, { as: 'anyone', address: '/reset-password' }],
  '(account)/verified': [{ as: 'anyone', address: '/verified' }],
  '(account)/first-account': [{ as: 'anyone', address: '/first-account?token=none' }, { as: 'anyone', address: '/first-account' }],
  '+not-found': [{ as: 'anyone', address: '/no-such-page' }],
};

/** The routes that the folder app/ holds, without its layouts. */
export function routesOfApp(): string[] {
  return readdirSync(join(import.meta.dirname, '..', '..', '..', 'app'), { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.tsx') && !name.endsWith('_layout.tsx'))
    .map((name) => name.replaceAll('\\', '/').replace(/\.tsx$/, ''))
    .sort();
}
