import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { Element } from './Element';
import { Sign } from './Sign';
import { Text } from './Text';

export interface FieldText {
  label: string;
  /** A quantity's colour for its label. */
  tone?: Tone;
  /** What is wrong and how to mend it. */
  error?: string;
  /** Doubtful, not wrong: asks for a word. */
  warning?: string;
  /** What to enter, in one line. */
  hint?: string;
  /** Keep the label for ears only, in a table cell. */
  labelHidden?: boolean;
  /** Keep error and warning for ears only: they stand in full below the table. */
  messageHidden?: boolean;
}

interface FieldFrameProps extends FieldText {
  id: string;
  grow?: boolean;
  children: ReactNode;
}

/** Ids of what describes the field, for aria-describedby. */
export function describedBy(id: string, { error, warning, hint }: Pick<FieldText, 'error' | 'warning' | 'hint'>): string | undefined {
  const ids = [error ? `${id}-error` : null, !error && warning ? `${id}-warning` : null, hint ? `${id}-hint` : null].filter((part) => part !== null);
  return ids.length ? ids.join(' ') : undefined;
}

/** Label above, control, then error or warning or hint, tied to the control by ids. */
export function FieldFrame({ id, label, tone = 'ink', error, warning, hint, labelHidden, messageHidden = false, grow, children }: FieldFrameProps) {
  const { colour } = useTheme();
  return (
    <View style={[{ gap: 4, minWidth: 0 }, grow ? { flexGrow: 1, flexShrink: 1, flexBasis: 0 } : null]}>
      <Element
        as="label"
        attributes={{ htmlFor: id, id: `${id}-label` }}
        css={
          labelHidden
            ? { position: 'absolute', width: 1, height: 1, overflow: 'hidden', clipPath: 'inset(50%)', whiteSpace: 'nowrap' }
            : { fontFamily: fontFamily('sansSemibold'), fontSize: 15, lineHeight: '20px', color: colour[tone] }
        }
      >
        {label}
      </Element>
      {children}
      {error ? <FieldMessage id={`${id}-error`} kind="error" text={error} hidden={messageHidden} /> : null}
      {!error && warning ? <FieldMessage id={`${id}-warning`} kind="warning" text={warning} hidden={messageHidden} /> : null}
      {hint ? (
        <Text id={`${id}-hint`} size="least" tone="inkSoft">
          {hint}
        </Text>
      ) : null}
    </View>
  );
}

const forEarsOnly = { position: 'absolute', width: 1, height: 1, overflow: 'hidden' } as const;

function FieldMessage({ id, kind, text, hidden }: { id: string; kind: 'error' | 'warning'; text: string; hidden: boolean }) {
  if (hidden) {
    return (
      <View style={forEarsOnly}>
        <Text id={id} size="secondary">
          {text}
        </Text>
      </View>
    );
  }
  return (
    <View style={{ flexDirection: 'row', gap: 6, alignItems: 'flex-start' }}>
      <View style={{ paddingTop: 2 }}>
        <Sign name={kind === 'error' ? 'cross' : 'ring'} tone="flagged" size={14} />
      </View>
      <Text id={id} size="secondary" tone="flagged" style={{ flexShrink: 1 }}>
        {text}
      </Text>
    </View>
  );
}
