import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { Heading } from './Heading';

interface SectionProps {
  title: ReactNode;
  level?: 2 | 3 | 4;
  /** Section title in Lora, or the small semibold one of dense views. */
  look?: 'section' | 'small';
  /** At the right end of the title: words or a link. */
  end?: ReactNode;
  /** No line under the title: the table below brings its own. */
  bare?: boolean;
  id?: string;
  style?: StyleProp<ViewStyle>;
  children?: ReactNode;
}

/** A section: its title, a line in ink, its content. */
export function Section({ title, level = 2, look = 'section', end, bare, id, style, children }: SectionProps) {
  const { colour } = useTheme();
  return (
    <View style={[{ minWidth: 0 }, style]} id={id}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 16, alignItems: 'baseline', justifyContent: 'space-between', borderBottomWidth: bare ? 0 : 1, borderBottomColor: colour.ink, paddingBottom: bare ? 2 : 6 }}>
        <Heading level={level} look={look}>
          {title}
        </Heading>
        {end}
      </View>
      {children}
    </View>
  );
}
