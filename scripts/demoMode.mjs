import { query } from './cluster.mjs';

/** What the first start chose, or undefined on a database that no server has opened yet. */
export async function storedDemoMode(url) {
  const [table] = await query(url, "select to_regclass('public.register_settings') as name");
  if (table?.name === null) return undefined;
  const [row] = await query(url, "select value from register_settings where key = 'demo'");
  return row === undefined ? undefined : row.value === true ? 'on' : 'off';
}
