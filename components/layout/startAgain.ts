/** Builds the page anew. */
export function startAgain(render: () => void): void {
  render();
}
