/** Saves a text as a file of the browser; native builds have none and nothing happens. */
export function saveText(text: string, fileName: string, type: string): void {
  if (typeof document === 'undefined') return;
  const address = URL.createObjectURL(new Blob([text], { type: `${type};charset=utf-8` }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

/** An address of the app with its origin, as one sends it to others. */
export function fullAddress(path: string): string {
  return typeof location === 'undefined' ? path : `${location.origin}${path}`;
}
