import type { ThemeName } from './tokens';

/** On native there is no page around the app. */
export function usePageStyle(_name: ThemeName): void {}
