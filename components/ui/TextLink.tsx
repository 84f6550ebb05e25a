import { Link, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import type { StyleProp, TextStyle } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';
import { fontFamily, textSize, type TextSize } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';

interface TextLinkProps {
  href: Href;
  size?: TextSize;
  tone?: Tone;
  /** `plain` takes face and colour from the text around it and is underlined. */
  look?: 'act' | 'plain';
  /** Covers the whole table row it stands in. */
  coversRow?: boolean;
  spokenLabel?: string;
  /** Leaves the register: opens in a new tab. */
  outside?: boolean;
  style?: StyleProp<TextStyle>;
  children: ReactNode;
}

/** A link in words. */
export function TextLink({ href, size, tone, look = 'act', coversRow, spokenLabel, outside, style, children }: TextLinkProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const data = coversRow ? { dataSet: { rowlink: 'true' } } : null;
  return (
    <Link
      href={href}
      aria-label={spokenLabel}
      {...data}
      {...(outside ? { target: '_blank', rel: 'noopener noreferrer' } : null)}
      style={[
        size ? textSize(size, wide) : null,
        look === 'act'
          ? { fontFamily: fontFamily('sansSemibold'), color: colour[tone ?? 'cresyl'], textDecorationLine: 'none' }
          : { textDecorationLine: coversRow ? 'none' : 'underline', color: tone ? colour[tone] : undefined },
        coversRow ? { position: 'static' } : null,
        style,
      ]}
    >
      {children}
    </Link>
  );
}

/** The way back to the list a page belongs to. */
export function BackLink({ href, label }: { href: Href; label: string }) {
  return (
    <TextLink href={href} size="secondary" style={{ paddingVertical: 6, alignSelf: 'flex-start' }}>
      {label}
    </TextLink>
  );
}
