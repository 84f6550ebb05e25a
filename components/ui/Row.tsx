import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';

interface RowProps {
  gap?: number;
  align?: ViewStyle['alignItems'];
  justify?: ViewStyle['justifyContent'];
  wrap?: boolean;
  style?: StyleProp<ViewStyle>;
  children?: ReactNode;
}

/** Things side by side. */
export function Row({ gap = 8, align = 'center', justify, wrap, style, children }: RowProps) {
  return (
    <View style={[{ flexDirection: 'row', gap, alignItems: align, justifyContent: justify, flexWrap: wrap ? 'wrap' : 'nowrap' }, style]}>
      {children}
    </View>
  );
}

interface StackProps {
  gap?: number;
  style?: StyleProp<ViewStyle>;
  children?: ReactNode;
}

/** Things one below the other. */
export function Stack({ gap = 8, style, children }: StackProps) {
  return <View style={[{ gap }, style]}>{children}</View>;
}
