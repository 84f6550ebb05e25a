import { deflateSync, crc32 } from 'node:zlib';

/** Small files made byte by byte, with a place hidden in them as cameras and programs hide it. */

export const hiddenPlace = 'GPS-PLACE-47.3769N';

/** An Exif block (big-endian) with an orientation, a camera's text and a GPS directory. */
export function exifBlock(orientation: number): Buffer {
  const place = Buffer.from(`${hiddenPlace}\0`, 'latin1');
  const tiff = Buffer.alloc(8 + 2 + 2 * 12 + 4 + 2 + 12 + 4);
  tiff.write('MM\0*', 0, 'latin1');
  tiff.writeUInt32BE(8, 4);
  tiff.writeUInt16BE(2, 8);
  tiff.writeUInt16BE(0x0112, 10);
  tiff.writeUInt16BE(3, 12);
  tiff.writeUInt32BE(1, 14);
  tiff.writeUInt16BE(orientation, 18);
  tiff.writeUInt16BE(0x8825, 22);
  tiff.writeUInt16BE(4, 24);
  tiff.writeUInt32BE(1, 26);
  tiff.writeUInt32BE(38, 30);
  tiff.writeUInt16BE(1, 38);
  tiff.writeUInt16BE(0x1b, 40);
  tiff.writeUInt16BE(2, 42);
  tiff.writeUInt32BE(place.length, 44);
  tiff.writeUInt32BE(tiff.length, 48);
  return Buffer.concat([tiff, place]);
}

const segment = (marker: number, payload: Buffer) => {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(payload.length + 2, 2);
  return Buffer.concat([head, payload]);
};

/** Scan header and entropy-coded bytes, with a stuffed zero and a restart marker among them. */
export const jpegImageData = Buffer.concat([segment(0xda, Buffer.from([1, 1, 0, 0, 63, 0])), Buffer.from([0x12, 0xff, 0x00, 0x34, 0xff, 0xd0, 0x56])]);

/** A JPEG as from a phone: Exif with a place, XMP, IPTC, a comment, and a second picture behind its end. */
export function jpegWithPlace(orientation = 1): Buffer {
  return Buffer.concat([
    Buffer.from([0xff, 0xd8]),
    segment(0xe0, Buffer.from('JFIF\0\x01\x01\0\0\x01\0\x01\0\0', 'latin1')),
    segment(0xe1, Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), exifBlock(orientation)])),
    segment(0xe1, Buffer.from(`http://ns.adobe.com/xap/1.0/\0<x>${hiddenPlace}</x>`, 'latin1')),
    segment(0xed, Buffer.from(`Photoshop 3.0\0${hiddenPlace}`, 'latin1')),
    segment(0xfe, Buffer.from(hiddenPlace, 'latin1')),
    segment(0xe2, Buffer.from('ICC_PROFILE\0colour', 'latin1')),
    segment(0xdb, Buffer.alloc(65, 1)),
    segment(0xc0, Buffer.from([8, 0, 1, 0, 1, 1, 1, 0x11, 0])),
    jpegImageData,
    Buffer.from([0xff, 0xd9]),
    Buffer.from(`trailing ${hiddenPlace}`, 'latin1'),
  ]);
}

const chunk = (type: string, data: Buffer) => {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const [length, sum] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(data.length);
  sum.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, sum]);
};

export const pngImageData = chunk('IDAT', deflateSync(Buffer.from([0, 128])));

export function pngWithPlace(): Buffer {
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', Buffer.from([0, 0, 0, 1, 0, 0, 0, 1, 8, 0, 0, 0, 0])),
    chunk('eXIf', exifBlock(1)),
    chunk('tEXt', Buffer.from(`Comment\0${hiddenPlace}`, 'latin1')),
    chunk('iTXt', Buffer.from(`XML:com.adobe.xmp\0\0\0\0\0${hiddenPlace}`, 'latin1')),
    pngImageData,
    chunk('IEND', Buffer.alloc(0)),
    Buffer.from(hiddenPlace, 'latin1'),
  ]);
}

/** A TIFF of one grey pixel row, its first directory holding size, strip, XMP and a GPS directory. */
export function tiffWithPlace(): Buffer {
  const place = Buffer.from(`${hiddenPlace}\0`, 'latin1');
  const pixels = Buffer.from([1, 2, 3, 4, 5, 6]);
  const tags: [tag: number, type: number, count: number, value: number][] = [
    [256, 4, 1, 6], [257, 4, 1, 1], [258, 3, 1, 8], [259, 3, 1, 1], [262, 3, 1, 1], [273, 4, 1, 0], [277, 3, 1, 1], [278, 4, 1, 1], [279, 4, 1, 6], [700, 1, place.length, 0], [34853, 4, 1, 0],
  ];
  const ifdAt = 8;
  const pixelsAt = ifdAt + 2 + 12 * tags.length + 4;
  const xmpAt = pixelsAt + pixels.length;
  const gpsAt = xmpAt + place.length;
  const gpsValueAt = gpsAt + 2 + 12 + 4;
  const values: Record<number, number> = { 273: pixelsAt, 700: xmpAt, 34853: gpsAt };
  const file = Buffer.alloc(gpsValueAt + place.length);
  file.write('II*\0', 0, 'latin1');
  file.writeUInt32LE(ifdAt, 4);
  file.writeUInt16LE(tags.length, ifdAt);
  tags.forEach(([tag, type, count, value], i) => {
    const at = ifdAt + 2 + 12 * i;
    file.writeUInt16LE(tag, at);
    file.writeUInt16LE(type, at + 2);
    file.writeUInt32LE(count, at + 4);
    file.writeUInt32LE(values[tag] ?? value, at + 8);
  });
  pixels.copy(file, pixelsAt);
  place.copy(file, xmpAt);
  file.writeUInt16LE(1, gpsAt);
  file.writeUInt16LE(0x1b, gpsAt + 2);
  file.writeUInt16LE(2, gpsAt + 4);
  file.writeUInt32LE(place.length, gpsAt + 6);
  file.writeUInt32LE(gpsValueAt, gpsAt + 10);
  place.copy(file, gpsValueAt);
  return file;
}

export const pdf = Buffer.from('%PDF-1.4\n1 0 obj<<>>endobj\ntrailer<<>>\n%%EOF\n', 'latin1');
export const csv = Buffer.from('aliquot,nuclei\n1,412\n2,388\n', 'utf8');
/** The beginning of a program of Windows, and of one of Linux. */
export const windowsProgram = Buffer.concat([Buffer.from('MZ\x90\0\x03\0\0\0', 'latin1'), Buffer.alloc(200)]);
export const linuxProgram = Buffer.concat([Buffer.from('\x7fELF\x02\x01\x01\0', 'latin1'), Buffer.alloc(200)]);
