/** Id of the place of a field on the page. */
export const placeId = (path: string): string => `field-${path}`;

/** The nearest place on the page for a path: the field itself, or the part of the form that holds it. */
function placeOf(path: string): HTMLElement | null {
  const parts = path.split('.');
  for (let length = parts.length; length > 0; length -= 1) {
    const found = document.getElementById(placeId(parts.slice(0, length).join('.')));
    if (found) return found;
  }
  return null;
}

/** Brings a field into view and puts the cursor in it. On native the step alone is opened. */
export function reachField(path: string): void {
  if (typeof document === 'undefined') return;
  const place = placeOf(path);
  if (place === null) return;
  const still = globalThis.matchMedia?.('(prefers-reduced-motion: reduce)').matches ?? false;
  place.scrollIntoView({ block: 'center', behavior: still ? 'auto' : 'smooth' });
  place.querySelector<HTMLElement>('input, select, textarea, button, [role="radio"], [role="checkbox"], [role="button"]')?.focus({ preventScroll: true });
}
