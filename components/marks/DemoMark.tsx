import { View } from 'react-native';
import { Sign } from '../ui/Sign';
import { Text } from '../ui/Text';

/** The sign that invented data carry wherever they show. */
export function DemoMark({ words = 'demonstration data' }: { words?: string }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
      <Sign name="hatch" tone="inkSoft" size={14} />
      <Text size="least" tone="inkSoft">
        {words}
      </Text>
    </View>
  );
}
