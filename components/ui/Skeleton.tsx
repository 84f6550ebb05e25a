import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { VisuallyHidden } from './VisuallyHidden';

const shares = [0.12, 0.5, 0.34];

/** Rows in their final shape while they are on the way. */
export function Skeleton({ rows = 5, rowHeight = 40, label = 'Loading' }: { rows?: number; rowHeight?: number; label?: string }) {
  const { colour } = useTheme();
  return (
    <View aria-busy role="status">
      <VisuallyHidden>{label}</VisuallyHidden>
      {Array.from({ length: rows }, (_, index) => (
        <View key={index} style={{ height: rowHeight, flexDirection: 'row', alignItems: 'center', gap: 12, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
          {shares.map((share, place) => (
            <View key={share} style={{ height: 8, borderRadius: 2, backgroundColor: colour.frost, flexGrow: share * (1 + ((index + place) % 3) * 0.2), flexBasis: 0 }} />
          ))}
        </View>
      ))}
    </View>
  );
}

/** A block of a given height, for a figure or a stamp on the way. */
export function SkeletonBlock({ height, label = 'Loading' }: { height: number; label?: string }) {
  const { colour } = useTheme();
  return (
    <View aria-busy role="status" style={{ height, borderRadius: radius.stamp, borderWidth: 1, borderColor: colour.hairline, backgroundColor: colour.frost }}>
      <VisuallyHidden>{label}</VisuallyHidden>
    </View>
  );
}
