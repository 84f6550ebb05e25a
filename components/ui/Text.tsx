import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';
import { fontFamily, textSize, type FontName, type TextSize } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';

export type TextWeight = 'light' | 'regular' | 'semibold';

const sans: Record<TextWeight, FontName> = { light: 'sansLight', regular: 'sans', semibold: 'sansSemibold' };

interface TextProps {
  size?: TextSize;
  tone?: Tone;
  weight?: TextWeight;
  /** Lora, for captions, citation text and names. */
  science?: boolean;
  italic?: boolean;
  align?: 'left' | 'right' | 'center';
  /** Rendered as a paragraph. */
  paragraph?: boolean;
  /** Does not break. */
  nowrap?: boolean;
  /** Cut with an ellipsis after so many lines. */
  lines?: number;
  id?: string;
  role?: 'status' | 'alert';
  style?: StyleProp<TextStyle>;
  children?: ReactNode;
}

/** Running text: size, tone and weight by name. Semibold Lora does not exist here: it becomes medium. */
export function Text({ size = 'body', tone = 'ink', weight = 'regular', science, italic, align, paragraph, nowrap, lines, id, role, style, children }: TextProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <NativeText
      id={id}
      role={role ?? (paragraph ? ('paragraph' as 'none') : undefined)}
      numberOfLines={lines}
      style={[
        textSize(size, wide),
        { fontFamily: fontFamily(faceOf(weight, science, italic)), color: colour[tone], textAlign: align, maxWidth: '100%' },
        // A property of the web; native text in a row does not break by itself.
        nowrap ? ({ whiteSpace: 'nowrap' } as TextStyle) : null,
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}

function faceOf(weight: TextWeight, science = false, italic = false): FontName {
  if (!science && !italic) return sans[weight];
  if (italic) return weight === 'semibold' ? 'loraMediumItalic' : 'loraItalic';
  return weight === 'semibold' ? 'loraMedium' : 'lora';
}

interface SpanProps {
  tone?: Tone;
  weight?: TextWeight;
  science?: boolean;
  italic?: boolean;
  style?: StyleProp<TextStyle>;
  children?: ReactNode;
}

/** A stretch inside a Text: takes size and colour from it unless told otherwise. */
export function Span({ tone, weight, science, italic, style, children }: SpanProps) {
  const { colour } = useTheme();
  const changesFace = weight !== undefined || science || italic;
  return (
    <NativeText
      style={[
        tone ? { color: colour[tone] } : null,
        changesFace ? { fontFamily: fontFamily(faceOf(weight ?? 'regular', science, italic)) } : null,
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}
