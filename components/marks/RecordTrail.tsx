import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { Span, Text } from '../ui/Text';

export interface TrailEvent {
  key: string;
  /** What happened, semibold: "submitted". */
  what: string;
  /** Who and of what: "revision 1, I. Okonkwo". */
  detail?: string;
  /** ISO date or date and time with zone, as text. */
  when: string;
  /** Why, in the words of who did it. */
  why?: string;
}

/** What happened to a record, oldest first, along an axis; the newest is the point. */
export function RecordTrail({ events }: { events: readonly TrailEvent[] }) {
  const { colour } = useTheme();
  return (
    <View role="list">
      {events.map(({ key, what, detail, when, why }, index) => {
        const newest = index === events.length - 1;
        return (
          <View key={key} role="listitem" style={{ flexDirection: 'row', paddingVertical: 6, paddingLeft: 20 }}>
            <View style={{ position: 'absolute', left: 5, top: 0, bottom: 0, width: 1.5, backgroundColor: colour.tick }} />
            <View style={{ position: 'absolute', left: 5, top: 16, width: 9, height: 1.5, backgroundColor: colour.tick }} />
            {newest ? <View style={{ position: 'absolute', left: 0.5, top: 11.5, width: 10, height: 10, borderRadius: 5, backgroundColor: colour.cresyl }} /> : null}
            <View style={{ flex: 1, minWidth: 0 }}>
              <Text size="table">
                <Span weight="semibold">{what}</Span>
                {detail ? <Span tone="inkSoft">{`  ${detail}`}</Span> : null}
              </Text>
              {why ? <Text size="secondary">{why}</Text> : null}
              <Text size="least" tone="inkSoft">
                {when}
              </Text>
            </View>
          </View>
        );
      })}
    </View>
  );
}
