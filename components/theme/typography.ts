import { Platform } from 'react-native';
import { registeredFamily, type FontName } from './fontNames';

export type { FontName } from './fontNames';

/** The family to put in a style: on the web with a fall-back until the bundled file is there. */
export function fontFamily(font: FontName): string {
  const name = registeredFamily[font];
  if (Platform.OS !== 'web') return name;
  return `${name}, ${font.startsWith('lora') ? 'Georgia, serif' : 'system-ui, sans-serif'}`;
}

export type TextSize = 'body' | 'field' | 'table' | 'secondary' | 'least' | 'count';

/** Font size and line height in px. Body text is larger on a phone: the x-height of the face is low. */
export function textSize(size: TextSize, wide: boolean): { fontSize: number; lineHeight: number } {
  switch (size) {
    case 'body':
      return { fontSize: wide ? 16 : 17, lineHeight: 24 };
    case 'field':
      return { fontSize: wide ? 16 : 18, lineHeight: 24 };
    case 'table':
      return { fontSize: 15, lineHeight: 20 };
    case 'secondary':
      return { fontSize: 14, lineHeight: 20 };
    case 'least':
      return { fontSize: 13, lineHeight: 18 };
    case 'count':
      return { fontSize: 38, lineHeight: 40 };
  }
}

export type HeadingLook = 'page' | 'species' | 'section' | 'small';

/** Font, size and line height of a heading look. */
export function headingStyle(look: HeadingLook, wide: boolean): { font: FontName; fontSize: number; lineHeight: number } {
  switch (look) {
    case 'page':
      return { font: 'loraMedium', fontSize: wide ? 28 : 22, lineHeight: wide ? 36 : 28 };
    case 'species':
      return { font: 'loraMediumItalic', fontSize: wide ? 28 : 27, lineHeight: wide ? 36 : 34 };
    case 'section':
      return { font: 'loraMedium', fontSize: 19, lineHeight: 26 };
    case 'small':
      return { font: 'sansSemibold', fontSize: 15, lineHeight: 20 };
  }
}
