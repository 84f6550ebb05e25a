import { Pressable, View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { target } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from './Text';
import { useRovingFocus } from './useRovingFocus';

interface RadioListProps<Value extends string> {
  label: string;
  value: Value | null;
  options: readonly { value: Value; label: string; note?: string; disabled?: boolean }[];
  onChange: (value: Value) => void;
}

/** One of several in a column along a line; the chosen one is marked on the line in cresyl. */
export function RadioList<Value extends string>({ label, value, options, onChange }: RadioListProps<Value>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const chosen = options.findIndex((option) => option.value === value);
  const roving = useRovingFocus(options.length, (index) => {
    const option = options[index];
    if (option && !option.disabled) onChange(option.value);
  });
  return (
    <View style={{ gap: 4 }}>
      <Text size="table" weight="semibold">
        {label}
      </Text>
      <View role="radiogroup" aria-label={label}>
        {options.map((option, index) => {
          const on = option.value === value;
          const keys = { onKeyDown: roving.onKeyDown(index) };
          return (
            <Pressable
              key={option.value}
              ref={roving.register(index)}
              role="radio"
              aria-checked={on}
              disabled={option.disabled}
              tabIndex={on || (chosen < 0 && index === 0) ? 0 : -1}
              onPress={() => onChange(option.value)}
              {...keys}
              style={{ minHeight: wide ? 32 : target.phone, justifyContent: 'center', paddingVertical: 4, paddingLeft: on ? 10 : 12, borderLeftWidth: on ? 3 : 1, borderLeftColor: on ? colour.cresyl : colour.hairline }}
            >
              <Text size="table" tone={on ? 'ink' : 'inkSoft'} weight={on ? 'semibold' : 'regular'}>
                {option.label}
              </Text>
              {option.note ? (
                <Text size="least" tone="inkSoft">
                  {option.note}
                </Text>
              ) : null}
            </Pressable>
          );
        })}
      </View>
    </View>
  );
}
