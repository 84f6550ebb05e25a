const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
/** Chunks beside the critical ones that say how the image looks, not where or by whom it was made. */
const kept = new Set(['tRNS', 'gAMA', 'cHRM', 'sRGB', 'iCCP', 'sBIT', 'bKGD', 'hIST', 'pHYs', 'sPLT', 'cICP', 'mDCV', 'cLLI', 'acTL', 'fcTL', 'fdAT']);

/**
 * A PNG without Exif, texts (XMP among them) and anything behind its end, so without location data; the image data
 * stay byte for byte.
 *
 * @returns null where the bytes are no complete PNG
 */
export function stripPng(bytes: Buffer): Buffer | null {
  if (!bytes.subarray(0, 8).equals(signature)) return null;
  const parts = [bytes.subarray(0, 8)];
  let at = 8;
  while (at + 12 <= bytes.length) {
    const length = bytes.readUInt32BE(at);
    const type = bytes.toString('latin1', at + 4, at + 8);
    const end = at + 12 + length;
    if (end > bytes.length || !/^[A-Za-z]{4}$/.test(type)) return null;
    const isCritical = type.charCodeAt(0) < 0x60;
    if (isCritical || kept.has(type)) parts.push(bytes.subarray(at, end));
    if (type === 'IEND') return Buffer.concat(parts);
    at = end;
  }
  return null;
}
