import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { Sign, type SignName } from '../ui/Sign';
import { Text } from '../ui/Text';
import { VisuallyHidden } from '../ui/VisuallyHidden';

export interface CheckRow {
  key: string;
  level: 'passes' | 'warns' | 'blocks';
  name: string;
  /** The figure found, as text. */
  figure?: string;
  /** The limit it was held against, as text. */
  limit?: string;
  /** For a check that warns or blocks. */
  sentence?: string;
}

const signs: Record<CheckRow['level'], { sign: SignName; tone: 'settled' | 'flagged'; spoken: string }> = {
  passes: { sign: 'check', tone: 'settled', spoken: 'passes' },
  warns: { sign: 'ring', tone: 'flagged', spoken: 'doubtful' },
  blocks: { sign: 'cross', tone: 'flagged', spoken: 'impossible' },
};

/** Every quality check with its figure, limit and, where it does not pass, its sentence. */
export function CheckList({ checks }: { checks: readonly CheckRow[] }) {
  const { colour } = useTheme();
  return (
    <View role="list">
      {checks.map(({ key, level, name, figure, limit, sentence }) => {
        const { sign, tone, spoken } = signs[level];
        const passes = level === 'passes';
        return (
          <View key={key} role="listitem" style={{ paddingVertical: 8, borderBottomWidth: 1, borderBottomColor: colour.hairline, flexDirection: 'row', gap: 10 }}>
            <View style={{ paddingTop: 2 }}>
              <Sign name={sign} tone={tone} />
              <VisuallyHidden>{spoken}</VisuallyHidden>
            </View>
            <View style={{ flex: 1, minWidth: 0, gap: 2 }}>
              <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', alignItems: 'baseline', columnGap: 12 }}>
                <Text size="table" weight="semibold" tone={passes ? 'ink' : 'flagged'}>
                  {name}
                </Text>
                <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: 8, marginLeft: 'auto' }}>
                  {figure ? (
                    <Text size="table" tone={passes ? 'ink' : 'flagged'}>
                      {figure}
                    </Text>
                  ) : null}
                  {limit ? (
                    <Text size="secondary" tone="inkSoft">
                      {limit}
                    </Text>
                  ) : null}
                </View>
              </View>
              {sentence ? <Text size="secondary">{sentence}</Text> : null}
            </View>
          </View>
        );
      })}
    </View>
  );
}
