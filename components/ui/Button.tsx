import { Link, type Href } from 'expo-router';
import { useState } from 'react';
import { Pressable, StyleSheet, Text as NativeText, View, type StyleProp, type ViewStyle } from 'react-native';
import { useTheme, type Theme } from '../theme/ThemeProvider';
import { radius, target } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { ProgressTicks } from './ProgressTicks';

export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'danger';

interface ButtonProps {
  /** The words on the button. */
  label: string;
  kind?: ButtonKind;
  onPress?: () => void;
  /** Makes it a link that looks like a button. */
  href?: Href;
  disabled?: boolean;
  /** Work goes on: the ticks fill, presses are ignored, `workingLabel` is shown. */
  working?: boolean;
  workingLabel?: string;
  /** 0 to 1. */
  progress?: number;
  /** A second, smaller line. */
  note?: string;
  /** Fill the free width of a row. */
  grow?: boolean;
  /** 64 px high, for the counting pad. */
  pad?: boolean;
  /** A longer spoken name where the words alone say too little. */
  spokenLabel?: string;
  expanded?: boolean;
  style?: StyleProp<ViewStyle>;
}

function frame(kind: ButtonKind, theme: Theme, active: boolean, disabled: boolean): ViewStyle {
  const { colour } = theme;
  if (disabled) return { borderColor: colour.tick, borderStyle: 'dashed', backgroundColor: 'transparent' };
  switch (kind) {
    case 'primary':
      return { backgroundColor: active ? colour.cresylPressed : colour.cresyl, borderColor: active ? colour.cresylPressed : colour.cresyl };
    case 'secondary':
      return { backgroundColor: active ? colour.frost : 'transparent', borderColor: colour.tick };
    case 'danger':
      return { backgroundColor: active ? colour.flaggedWash : 'transparent', borderColor: colour.flagged };
    case 'quiet':
      return { backgroundColor: active ? colour.frost : 'transparent', borderColor: 'transparent' };
  }
}

function wordTone(kind: ButtonKind, theme: Theme, disabled: boolean): string {
  if (disabled) return theme.colour.inkSoft;
  if (kind === 'primary') return theme.colour.onCresyl;
  if (kind === 'quiet') return theme.colour.cresyl;
  return kind === 'danger' ? theme.colour.flagged : theme.colour.ink;
}

/** An act. Kinds: primary (one per view), secondary, quiet, danger. Not possible is dashed. */
export function Button({ label, kind = 'secondary', onPress, href, disabled = false, working = false, workingLabel, progress, note, grow, pad, spokenLabel, expanded, style }: ButtonProps) {
  const theme = useTheme();
  const { wide } = useBreakpoint();
  const height = pad ? target.pad : wide ? target.wide : kind === 'quiet' ? target.phone : target.primaryPhone;
  const word = wordTone(kind, theme, disabled);
  const [pressed, setPressed] = useState(false);
  const [hovered, setHovered] = useState(false);
  const states = { onPressIn: () => setPressed(true), onPressOut: () => setPressed(false), onHoverIn: () => setHovered(true), onHoverOut: () => setHovered(false) };
  // One plain object: a link that hands its props to the Pressable would lose a style function or list.
  const look = StyleSheet.flatten([
      {
        minHeight: height,
        paddingHorizontal: kind === 'quiet' ? 8 : 16,
        paddingVertical: 6,
        borderWidth: 1,
        borderRadius: radius.control,
        flexDirection: 'row' as const,
        alignItems: 'center' as const,
        justifyContent: 'center' as const,
        gap: 8,
        flexGrow: grow ? 1 : 0,
      },
      frame(kind, theme, pressed || hovered, disabled),
      style,
  ]);
  const content = (
    <>
      {working && <ProgressTicks colour={word} progress={progress} />}
      <View style={{ alignItems: 'center' }}>
        <NativeText style={{ fontFamily: fontFamily('sansSemibold'), fontSize: wide ? 15 : 16, lineHeight: 20, color: word, textAlign: 'center' }}>
          {working ? (workingLabel ?? label) : label}
        </NativeText>
        {note ? (
          <NativeText style={{ fontFamily: fontFamily('sans'), fontSize: 13, lineHeight: 18, color: kind === 'primary' ? word : theme.colour.inkSoft }}>{note}</NativeText>
        ) : null}
      </View>
    </>
  );
  if (href !== undefined && !disabled) {
    return (
      <Link href={href} asChild>
        <Pressable role="link" aria-label={spokenLabel} style={look} {...states}>
          {content}
        </Pressable>
      </Link>
    );
  }
  return (
    <Pressable
      role="button"
      aria-label={spokenLabel}
      aria-busy={working || undefined}
      aria-expanded={expanded}
      disabled={disabled}
      onPress={working ? undefined : onPress}
      style={look}
      {...states}
    >
      {content}
    </Pressable>
  );
}
