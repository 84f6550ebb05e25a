/** One nucleus of a version's section, in the units of the field it is drawn in. */
export interface SectionNucleus {
  cx: number;
  cy: number;
  /** Half axes of the ellipse. */
  rx: number;
  ry: number;
  angleDegrees: number;
  opacity: number;
}

const COLUMNS = 16;
const ROWS = 2;

/**
 * The section drawn from a version's SHA-256, so that two versions never look alike.
 *
 * Byte i of 32 stands in column i mod 16 and row ⌊i/16⌋; its high nibble is x within the cell
 * (0.18–0.82), its low nibble y (0.16–0.84); radius 1.5 + 3·((37b mod 256)/256)·h/44; flattening
 * 0.7 + 0.5·((91b mod 64)/64); angle 53b mod 180°; opacity 0.45 + 0.55·((13b mod 16)/15).
 * Input: 64 hexadecimal digits and the size of the field. Throws RangeError for any other digest or
 * a size that is not above zero.
 */
export function sectionOf(sha256Hex: string, field: { width: number; height: number }): SectionNucleus[] {
  if (!/^[0-9a-f]{64}$/i.test(sha256Hex)) throw new RangeError('A section is drawn from 64 hexadecimal digits.');
  if (!(field.width > 0 && field.height > 0)) throw new RangeError('A section needs a field above zero in size.');
  const cellWidth = field.width / COLUMNS;
  const cellHeight = field.height / ROWS;
  return Array.from({ length: COLUMNS * ROWS }, (_, i) => {
    const byte = Number.parseInt(sha256Hex.slice(2 * i, 2 * i + 2), 16);
    const x = 0.18 + (0.82 - 0.18) * ((byte >> 4) / 15);
    const y = 0.16 + (0.84 - 0.16) * ((byte & 15) / 15);
    const radius = 1.5 + (3 * ((37 * byte) % 256) * field.height) / (256 * 44);
    return {
      cx: ((i % COLUMNS) + x) * cellWidth,
      cy: (Math.floor(i / COLUMNS) + y) * cellHeight,
      rx: radius,
      ry: radius * (0.7 + 0.5 * (((91 * byte) % 64) / 64)),
      angleDegrees: (53 * byte) % 180,
      opacity: 0.45 + 0.55 * (((13 * byte) % 16) / 15),
    };
  });
}
