const soi = 0xd8;
const eoi = 0xd9;
const sos = 0xda;
const orientationTag = 0x0112;

/** A marker segment that decoding needs: JFIF and Adobe headers, colour profiles, tables and frames. */
function isKept(marker: number, payload: Buffer): boolean {
  if (marker === 0xe0 || marker === 0xee) return true;
  if (marker === 0xe2) return payload.subarray(0, 12).toString('latin1') === 'ICC_PROFILE\0';
  const isApplication = marker >= 0xe1 && marker <= 0xef;
  const isComment = marker === 0xfe;
  return !isApplication && !isComment;
}

/** Orientation of an Exif segment (2–8 where the image is turned), or null. */
function orientationOf(payload: Buffer): number | null {
  if (payload.subarray(0, 6).toString('latin1') !== 'Exif\0\0' || payload.length < 18) return null;
  const tiff = payload.subarray(6);
  const order = tiff.toString('latin1', 0, 2);
  if (order !== 'II' && order !== 'MM') return null;
  const u16 = (at: number) => (order === 'II' ? tiff.readUInt16LE(at) : tiff.readUInt16BE(at));
  const u32 = (at: number) => (order === 'II' ? tiff.readUInt32LE(at) : tiff.readUInt32BE(at));
  const ifd = u32(4);
  if (ifd + 2 > tiff.length) return null;
  for (let i = 0; i < u16(ifd); i += 1) {
    const entry = ifd + 2 + 12 * i;
    if (entry + 12 > tiff.length) return null;
    if (u16(entry) === orientationTag) {
      const value = u16(entry + 8);
      return value >= 2 && value <= 8 ? value : null;
    }
  }
  return null;
}

/** An Exif segment that says how the image is turned and nothing else. */
function orientationSegment(orientation: number): Buffer {
  const segment = Buffer.alloc(4 + 6 + 8 + 2 + 12 + 4);
  segment.writeUInt16BE(0xffe1, 0);
  segment.writeUInt16BE(segment.length - 2, 2);
  segment.write('Exif\0\0', 4, 'latin1');
  segment.write('MM\0*', 10, 'latin1');
  segment.writeUInt32BE(8, 14);
  segment.writeUInt16BE(1, 18);
  segment.writeUInt16BE(orientationTag, 20);
  segment.writeUInt16BE(3, 22);
  segment.writeUInt32BE(1, 24);
  segment.writeUInt16BE(orientation, 28);
  return segment;
}

/** Place of the next marker after entropy-coded data: stuffed zeros and restarts belong to the data. */
function endOfScan(bytes: Buffer, from: number): number {
  for (let at = from; at + 1 < bytes.length; at += 1) {
    if (bytes[at] !== 0xff) continue;
    const next = bytes[at + 1] ?? 0;
    if (next !== 0x00 && next !== 0xff && !(next >= 0xd0 && next <= 0xd7)) return at;
  }
  return -1;
}

/**
 * A JPEG without Exif, XMP, IPTC, comments and anything behind its end, so without location data; the image data
 * stay byte for byte. A turned image keeps the one tag that says so.
 *
 * @returns null where the bytes are no complete JPEG
 */
export function stripJpeg(bytes: Buffer): Buffer | null {
  if (bytes.length < 4 || bytes[0] !== 0xff || bytes[1] !== soi) return null;
  const start = [bytes.subarray(0, 2)];
  const parts: Buffer[] = [];
  let orientation: number | null = null;
  let at = 2;
  while (at + 1 < bytes.length) {
    if (bytes[at] !== 0xff) return null;
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    if (marker === eoi) {
      parts.push(bytes.subarray(at, at + 2));
      // The JFIF header comes first; the orientation follows it.
      const first = parts[0]?.[1] === 0xe0 ? [parts.shift()!] : [];
      return Buffer.concat([...start, ...first, ...(orientation === null ? [] : [orientationSegment(orientation)]), ...parts]);
    }
    if (at + 4 > bytes.length) return null;
    const length = bytes.readUInt16BE(at + 2);
    const end = at + 2 + length;
    if (length < 2 || end > bytes.length) return null;
    const payload = bytes.subarray(at + 4, end);
    if (isKept(marker, payload)) parts.push(bytes.subarray(at, end));
    else if (marker === 0xe1) orientation = orientation ?? orientationOf(payload);
    at = end;
    if (marker === sos) {
      const next = endOfScan(bytes, at);
      if (next < 0) return null;
      parts.push(bytes.subarray(at, next));
      at = next;
    }
  }
  return null;
}
