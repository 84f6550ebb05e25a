/** Loads the page anew: a part that failed to arrive is remembered as failed until then. */
export function startAgain(): void {
  globalThis.location.reload();
}
