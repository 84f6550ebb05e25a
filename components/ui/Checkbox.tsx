import type { ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import { radius, target } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from './Text';

interface CheckboxProps {
  label: string;
  checked: boolean;
  onChange: (checked: boolean) => void;
  disabled?: boolean;
  /** Between box and words, a mark. */
  mark?: ReactNode;
  /** At the right end, a count. */
  end?: string;
  error?: string;
}

/** On or off, with an optional mark before and a count after the words. */
export function Checkbox({ label, checked, onChange, disabled, mark, end, error }: CheckboxProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <View>
      <Pressable
        role="checkbox"
        aria-checked={checked}
        aria-label={end ? `${label}, ${end}` : label}
        disabled={disabled}
        onPress={() => onChange(!checked)}
        style={{ flexDirection: 'row', alignItems: 'center', gap: 10, minHeight: wide ? 30 : target.phone, paddingVertical: 4 }}
      >
        <View
          style={{
            width: 18,
            height: 18,
            borderRadius: radius.control,
            borderWidth: 1,
            borderStyle: disabled ? 'dashed' : 'solid',
            borderColor: error ? colour.flagged : checked ? colour.cresyl : colour.tick,
            backgroundColor: checked ? colour.cresyl : 'transparent',
            alignItems: 'center',
            justifyContent: 'center',
            flexShrink: 0,
          }}
        >
          {checked ? (
            <Svg width={12} height={12} viewBox="0 0 12 12" aria-hidden={true}>
              <Path d="M2 6.4L4.8 9L10 3.2" stroke={colour.onCresyl} strokeWidth={2} fill="none" />
            </Svg>
          ) : null}
        </View>
        {mark}
        <View style={{ flex: 1 }}>
          <Text size={wide ? 'table' : 'body'} tone={checked && !disabled ? 'ink' : 'inkSoft'}>
            {label}
          </Text>
        </View>
        {end ? (
          <Text size="table" tone={checked ? 'ink' : 'inkSoft'}>
            {end}
          </Text>
        ) : null}
      </Pressable>
      {error ? (
        <Text size="secondary" tone="flagged">
          {error}
        </Text>
      ) : null}
    </View>
  );
}
