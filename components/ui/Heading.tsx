import type { ReactNode, Ref } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';
import { fontFamily, headingStyle, type HeadingLook } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';

interface HeadingProps {
  /** Real heading level, 1 to 6. */
  level: 1 | 2 | 3 | 4 | 5 | 6;
  look?: HeadingLook;
  tone?: Tone;
  id?: string;
  /** Lets the page put focus on it after navigation. */
  focusable?: boolean;
  headingRef?: Ref<NativeText>;
  style?: StyleProp<TextStyle>;
  children: ReactNode;
}

/** A real heading; how it looks and which level it has are told apart. */
export function Heading({ level, look = level === 1 ? 'page' : 'section', tone = 'ink', id, focusable, headingRef, style, children }: HeadingProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const { font, fontSize, lineHeight } = headingStyle(look, wide);
  const focus = focusable ? { tabIndex: -1 as const } : null;
  return (
    <NativeText
      ref={headingRef}
      role="heading"
      aria-level={level}
      id={id}
      {...focus}
      style={[{ fontFamily: fontFamily(font), fontSize, lineHeight, color: colour[tone], fontWeight: 'normal' }, style]}
    >
      {children}
    </NativeText>
  );
}
