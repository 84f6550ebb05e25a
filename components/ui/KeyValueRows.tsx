import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { row, type Tone } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CellContent } from './CellContent';
import { Element } from './Element';
import { Text } from './Text';

export interface KeyValue {
  key: string;
  label: string;
  tone?: Tone;
  value: ReactNode;
  /** Under the value, a sentence. */
  note?: string;
}

/** Names and values, a hairline between rows; a real list of terms to a screen reader. */
export function KeyValueRows({ rows, strongLabels }: { rows: readonly KeyValue[]; strongLabels?: boolean }) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <Element as="dl" css={{ margin: 0 }}>
      {rows.map(({ key, label, tone, value, note }) => (
        <Element
          key={key}
          as="div"
          css={{ display: 'flex', flexWrap: 'wrap', alignItems: 'center', justifyContent: 'space-between', columnGap: 16, minHeight: wide ? row.dense : row.table, padding: '4px 0', boxSizing: 'border-box', borderBottom: `1px solid ${colour.hairline}` }}
          nativeStyle={{ flexDirection: 'row', justifyContent: 'space-between' }}
        >
          <Element as="dt">
            <Text size="table" tone={tone ?? (strongLabels ? 'ink' : 'inkSoft')} weight={tone || strongLabels ? 'semibold' : 'regular'}>
              {label}
            </Text>
          </Element>
          <Element as="dd" css={{ margin: 0, marginLeft: 'auto', textAlign: 'right', maxWidth: '100%' }}>
            <CellContent>{value}</CellContent>
            {note ? (
              <View>
                <Text size="secondary" tone="inkSoft" align="right">
                  {note}
                </Text>
              </View>
            ) : null}
          </Element>
        </Element>
      ))}
    </Element>
  );
}
