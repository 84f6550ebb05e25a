import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Button } from './Button';
import { Sign } from './Sign';
import { Span, Text } from './Text';

export interface MessageAction {
  label: string;
  onPress?: () => void;
  href?: Href;
}

interface MessageProps {
  /** First words, semibold. */
  title: string;
  text?: ReactNode;
  action?: MessageAction;
}

/** A quiet sheet with a sentence and the next act. */
function Message({ title, text, action, wrong, role }: MessageProps & { wrong?: boolean; role?: 'alert' | 'status' }) {
  const { colour } = useTheme();
  return (
    <View role={role} style={{ padding: 16, gap: 8, borderWidth: 1, borderColor: colour.hairline, borderRadius: radius.control, backgroundColor: colour.sheet, alignItems: 'flex-start', maxWidth: 640 }}>
      <View style={{ flexDirection: 'row', gap: 8, alignItems: 'flex-start' }}>
        {wrong ? (
          <View style={{ paddingTop: 4 }}>
            <Sign name="cross" tone="flagged" />
          </View>
        ) : null}
        <Text style={{ flexShrink: 1 }}>
          <Span weight="semibold">{title}</Span>
          {text ? <> {text}</> : null}
        </Text>
      </View>
      {action ? <Button kind="quiet" label={action.label} onPress={action.onPress} href={action.href} style={{ marginLeft: -8 }} /> : null}
    </View>
  );
}

/** Nothing here yet, and what to do next. */
export function EmptyState(props: MessageProps) {
  return <Message {...props} />;
}

/** What failed, what is kept, and how to try again. */
export function ErrorState({ retryLabel = 'Try again', onRetry, ...props }: Omit<MessageProps, 'action'> & { onRetry?: () => void; retryLabel?: string }) {
  return <Message {...props} wrong role="alert" action={onRetry ? { label: retryLabel, onPress: onRetry } : undefined} />;
}

/** Seen but not allowed, who may, and the way back. */
export function NoPermission(props: MessageProps) {
  return <Message {...props} role="status" />;
}
