import { View } from 'react-native';
import type { Register } from '../../shared/contracts/register';
import { groupThousands } from '../../shared/domain/quantityText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { useTheme } from '../theme/ThemeProvider';
import { Text } from '../ui/Text';

const words = { species: 'species', records: 'records', structures: 'structures', sources: 'sources', specimens: 'specimens', labs: 'laboratories' } as const;

/** What the current version covers, in numbers. Kinds of which there are none are left out on a phone. */
export function Coverage({ counts }: { counts: Register['counts'] }) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const keys = (Object.keys(words) as (keyof typeof words)[]).filter((key) => (key !== 'specimens' && key !== 'labs') || counts[key] > 0).slice(0, wide ? 6 : 4);
  return (
    <View role="list" aria-label="What the version holds" style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', columnGap: 12, rowGap: 8, flex: wide ? 1 : undefined }}>
      {keys.map((key) => (
        <View key={key} role="listitem" style={{ paddingLeft: wide ? 14 : 0, borderLeftWidth: wide ? 1 : 0, borderLeftColor: colour.hairline, minWidth: wide ? 90 : undefined }}>
          <Text size="count" weight="light">
            {groupThousands(String(counts[key]))}
          </Text>
          <Text size="table" tone="inkSoft">
            {words[key]}
          </Text>
        </View>
      ))}
    </View>
  );
}
