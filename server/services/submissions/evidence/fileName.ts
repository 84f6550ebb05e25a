import type { EvidenceType } from './readEvidence';

const extensions: Record<EvidenceType, readonly string[]> = {
  'application/pdf': ['pdf'],
  'image/png': ['png'],
  'image/jpeg': ['jpg', 'jpeg'],
  'image/tiff': ['tif', 'tiff'],
  'text/csv': ['csv', 'tsv', 'txt'],
};
const longestName = 120;

/**
 * A file name that leads nowhere: without folders, control and direction characters or leading dots, at most 120
 * characters, and with an extension of what the file is.
 */
export function safeFileName(name: string, mediaType: EvidenceType): string {
  const base = name.normalize('NFC').split(/[/\\]/).at(-1) ?? '';
  const plain = base
    .replace(/[\p{Cc}\p{Cf}]/gu, '')
    .replace(/[<>:"|?*]/g, '_')
    .replace(/^[.\s]+|[.\s]+$/g, '');
  const known = extensions[mediaType];
  const extension = /\.([A-Za-z0-9]{1,8})$/.exec(plain)?.[1]?.toLowerCase();
  const ending = extension !== undefined && known.includes(extension) ? '' : `.${known[0]}`;
  const stem = plain === '' ? 'file' : plain;
  if (stem.length + ending.length <= longestName) return stem + ending;
  const kept = ending === '' ? `.${extension}` : ending;
  return [...stem].slice(0, longestName - kept.length).join('') + kept;
}

/** Header that makes a browser save a file under its name and never show it. */
export function contentDisposition(name: string): string {
  const ascii = name.replace(/[^\x20-\x7e]|["\\%]/g, '_');
  const encoded = encodeURIComponent(name).replace(/['()*]/g, (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`);
  return `attachment; filename="${ascii}"; filename*=UTF-8''${encoded}`;
}
