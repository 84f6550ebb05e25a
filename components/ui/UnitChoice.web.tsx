import type { ChangeEvent } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { target } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Element } from './Element';
import { Sign } from './Sign';
import type { UnitChoiceProps } from './UnitChoice';

/** The unit at the right end inside a field: the browser's own select without a frame of its own. */
export function UnitChoice({ label, value, units, onChange }: UnitChoiceProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <View style={{ flexShrink: 0, justifyContent: 'center' }}>
      <Element
        as="select"
        attributes={{ 'aria-label': label, value, onChange: (event: ChangeEvent<HTMLSelectElement>) => onChange(event.target.value) }}
        css={{ appearance: 'none', border: 0, margin: 0, minHeight: (wide ? target.wide : target.phone) - 2, padding: '0 18px 0 4px', background: 'transparent', color: colour.inkSoft, fontFamily: fontFamily('sans'), fontSize: 16, textAlign: 'right' }}
      >
        {units.includes(value) ? null : <option value={value}>{value}</option>}
        {units.map((unit) => (
          <option key={unit} value={unit}>
            {unit}
          </option>
        ))}
      </Element>
      <View style={{ position: 'absolute', right: 0, pointerEvents: 'none' }}>
        <Sign name="chevron" tone="inkSoft" size={11} />
      </View>
    </View>
  );
}
