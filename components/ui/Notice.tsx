import { Pressable, View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius, type StateTone } from '../theme/tokens';
import { Button } from './Button';
import type { MessageAction } from './Message';
import { Sign, type SignName } from './Sign';
import { Text } from './Text';

export interface NoticeContent {
  tone: StateTone;
  title: string;
  text?: string;
  action?: MessageAction;
  /** Sign where the tone's own does not fit. */
  sign?: SignName;
}

const signs: Record<StateTone, SignName> = { settled: 'check', waiting: 'bar', flagged: 'ring' };

/** News from work that went on elsewhere. With `onClose` it can be closed. */
export function Notice({ tone, title, text, action, sign, onClose }: NoticeContent & { onClose?: () => void }) {
  const { colour } = useTheme();
  return (
    <View style={{ padding: 12, paddingLeft: 14, gap: 2, backgroundColor: colour.sheet, borderWidth: 1, borderColor: colour.hairline, borderRadius: radius.control }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
        <Sign name={sign ?? signs[tone]} tone={tone} />
        <Text size="secondary" weight="semibold" tone={tone} style={{ flex: 1 }}>
          {title}
        </Text>
        {onClose ? (
          <Pressable role="button" aria-label={`Close notice: ${title}`} onPress={onClose} hitSlop={12} style={{ width: 24, height: 24, alignItems: 'center', justifyContent: 'center' }}>
            <Sign name="close" tone="inkSoft" size={12} />
          </Pressable>
        ) : null}
      </View>
      {text ? <Text size="table">{text}</Text> : null}
      {action ? <Button kind="quiet" label={action.label} onPress={action.onPress} href={action.href} style={{ alignSelf: 'flex-start', marginLeft: -8 }} /> : null}
    </View>
  );
}
