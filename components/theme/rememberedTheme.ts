import type { ThemeName } from './tokens';

const KEY = 'allokarya.theme';

/** The theme chosen on this device, or null. Storage can be forbidden by the browser; then nothing is remembered. */
export function recallTheme(): ThemeName | null {
  try {
    const stored = globalThis.localStorage?.getItem(KEY);
    return stored === 'brightfield' || stored === 'darkfield' ? stored : null;
  } catch {
    return null;
  }
}

export function rememberTheme(name: ThemeName): void {
  try {
    globalThis.localStorage?.setItem(KEY, name);
  } catch {
    // A private window may refuse; the choice then lasts as long as the page.
  }
}
