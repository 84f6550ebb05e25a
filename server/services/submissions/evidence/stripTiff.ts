const sizes = [0, 1, 1, 2, 4, 8, 1, 1, 2, 4, 8, 4, 8, 4];
const gpsIfd = 34853;
const exifIfd = 34665;
const subIfds = 330;
/** XMP, IPTC, Photoshop's block, maker notes: all can hold a place. */
const removed = new Set([gpsIfd, 700, 33723, 34377, 37500]);
const mostIfds = 4096;

/** Thrown where an offset leads out of the file. */
class BrokenTiff extends Error {}

class TiffBytes {
  private readonly bytes: Buffer;
  private readonly little: boolean;
  constructor(bytes: Buffer, little: boolean) {
    this.bytes = bytes;
    this.little = little;
  }
  private within(at: number, length: number): void {
    if (at < 0 || at + length > this.bytes.length) throw new BrokenTiff();
  }
  u16(at: number): number {
    this.within(at, 2);
    return this.little ? this.bytes.readUInt16LE(at) : this.bytes.readUInt16BE(at);
  }
  u32(at: number): number {
    this.within(at, 4);
    return this.little ? this.bytes.readUInt32LE(at) : this.bytes.readUInt32BE(at);
  }
  writeU16(at: number, value: number): void {
    if (this.little) this.bytes.writeUInt16LE(value, at);
    else this.bytes.writeUInt16BE(value, at);
  }
  zero(at: number, length: number): void {
    this.within(at, length);
    this.bytes.fill(0, at, at + length);
  }
  move(from: number, to: number, length: number): void {
    this.within(from, length);
    this.bytes.copyWithin(to, from, from + length);
  }
}

interface Entry {
  at: number;
  tag: number;
  bytes: number;
  /** Where the value stands: in the entry itself or elsewhere. */
  valueAt: number;
  outside: boolean;
}

function entriesOf(tiff: TiffBytes, ifd: number): Entry[] {
  return Array.from({ length: tiff.u16(ifd) }, (_, i) => {
    const at = ifd + 2 + 12 * i;
    const bytes = (sizes[tiff.u16(at + 2)] ?? 1) * tiff.u32(at + 4);
    const outside = bytes > 4;
    return { at, tag: tiff.u16(at), bytes, valueAt: outside ? tiff.u32(at + 8) : at + 8, outside };
  });
}

/** Empties a directory that is taken out: its values, then itself. */
function zeroIfd(tiff: TiffBytes, ifd: number): void {
  const entries = entriesOf(tiff, ifd);
  for (const entry of entries) if (entry.outside) tiff.zero(entry.valueAt, entry.bytes);
  tiff.zero(ifd, 2 + 12 * entries.length);
}

function removeEntry(tiff: TiffBytes, ifd: number, at: number): void {
  const count = tiff.u16(ifd);
  const end = ifd + 2 + 12 * count + 4;
  tiff.move(at + 12, at, end - at - 12);
  tiff.zero(end - 12, 12);
  tiff.writeU16(ifd, count - 1);
}

function cleanIfd(tiff: TiffBytes, ifd: number): void {
  for (;;) {
    const found = entriesOf(tiff, ifd).find((entry) => removed.has(entry.tag));
    if (found === undefined) return;
    if (found.tag === gpsIfd) zeroIfd(tiff, tiff.u32(found.at + 8));
    else if (found.outside) tiff.zero(found.valueAt, found.bytes);
    removeEntry(tiff, ifd, found.at);
  }
}

/**
 * A TIFF without its GPS directory, XMP, IPTC and maker notes: their bytes are emptied and their entries removed in
 * place, so that every other offset and the image data stay.
 *
 * @returns null where the bytes are no classic TIFF or an offset leads out of them
 */
export function stripTiff(original: Buffer): Buffer | null {
  const order = original.toString('latin1', 0, 2);
  if ((order !== 'II' && order !== 'MM') || original.length < 8) return null;
  const bytes = Buffer.from(original);
  const tiff = new TiffBytes(bytes, order === 'II');
  try {
    if (tiff.u16(2) !== 42) return null;
    const waiting = [tiff.u32(4)];
    const seen = new Set<number>();
    for (let ifd = waiting.pop(); ifd !== undefined; ifd = waiting.pop()) {
      if (ifd === 0 || seen.has(ifd)) continue;
      seen.add(ifd);
      if (seen.size > mostIfds) return null;
      cleanIfd(tiff, ifd);
      const entries = entriesOf(tiff, ifd);
      for (const entry of entries) {
        if (entry.tag === exifIfd) waiting.push(tiff.u32(entry.at + 8));
        if (entry.tag === subIfds) for (let at = 0; at + 4 <= entry.bytes; at += 4) waiting.push(tiff.u32(entry.valueAt + at));
      }
      waiting.push(tiff.u32(ifd + 2 + 12 * entries.length));
    }
    return bytes;
  } catch (error) {
    if (error instanceof BrokenTiff) return null;
    throw error;
  }
}
