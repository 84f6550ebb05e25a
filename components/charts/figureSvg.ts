import { registeredFamily, type FontName } from '../theme/fontNames';
import { textWidth } from './labels';

export interface FigureCaption {
  /** Set in Lora above the figure. */
  title: string;
  /** Below it, one paragraph each: what is shown, version, DOI and citation; wrapped to the width. */
  lines: readonly string[];
}

export interface FigureColours {
  ground: string;
  ink: string;
  inkSoft: string;
}

const EDGE = 20;
const TITLE_HEIGHT = 44;
const LINE_HEIGHT = 18;
/** Widths are estimated, and Lora runs a little wider. */
const WIDTH_KEPT = 0.94;

/** Breaks a paragraph into lines that fit a width in px at a font size. */
export function wrapText(text: string, width: number, fontSize: number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ').flatMap((whole) => piecesOf(whole, width, fontSize))) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && textWidth(longer, fontSize) > width) {
      lines.push(line);
      line = word;
    } else line = longer;
  }
  return line === '' ? lines : [...lines, line];
}

/** A word longer than a line, an address for instance, in pieces that fit. */
function piecesOf(word: string, width: number, fontSize: number): string[] {
  const pieces: string[] = [];
  let piece = '';
  for (const character of word) {
    if (piece !== '' && textWidth(piece + character, fontSize) > width) {
      pieces.push(piece);
      piece = '';
    }
    piece += character;
  }
  return [...pieces, piece];
}

export function escapeXml(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');
}

/**
 * The whole file: title, the drawing (serialised, `width` × `height` px), caption lines, and the fonts
 * as @font-face rules. Returns the SVG with its size in px.
 */
export function composeFigureSvg(drawing: string, size: { width: number; height: number }, caption: FigureCaption, colours: FigureColours, fontFaces: string): { svg: string; width: number; height: number } {
  const width = size.width + 2 * EDGE;
  const lines = caption.lines.flatMap((line) => wrapText(line, size.width * WIDTH_KEPT, 13));
  const titleLines = wrapText(caption.title, size.width, 19);
  const top = TITLE_HEIGHT + (titleLines.length - 1) * 26;
  const height = Math.round(top + size.height + lines.length * LINE_HEIGHT + 2 * EDGE);
  const text = (x: number, y: number, font: FontName, fontSize: number, fill: string, words: string) =>
    `<text x="${x}" y="${y}" font-family="${registeredFamily[font]}" font-size="${fontSize}" fill="${fill}">${escapeXml(words)}</text>`;
  const svg = [
    `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" role="img">`,
    `<title>${escapeXml(caption.title)}</title><desc>${escapeXml(caption.lines.join(' '))}</desc>`,
    `<style>${fontFaces}</style>`,
    `<rect width="${width}" height="${height}" fill="${colours.ground}"/>`,
    ...titleLines.map((line, index) => text(EDGE, EDGE + 16 + index * 26, 'loraMedium', 19, colours.ink, line)),
    `<g transform="translate(${EDGE} ${top})">${drawing}</g>`,
    ...lines.map((line, index) => text(EDGE, top + size.height + EDGE + index * LINE_HEIGHT, index === 0 ? 'lora' : 'sans', 13, colours.inkSoft, line)),
    '</svg>',
  ].join('\n');
  return { svg, width, height };
}

/** The faces a serialised drawing names, and those of the caption. */
export function facesIn(drawing: string): FontName[] {
  const always: FontName[] = ['loraMedium', 'lora', 'sans'];
  return (Object.keys(registeredFamily) as FontName[]).filter((name) => always.includes(name) || new RegExp(`${registeredFamily[name]}(?![A-Za-z_])`).test(drawing));
}
