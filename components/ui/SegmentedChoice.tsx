import { useId } from 'react';
import { Pressable, Text as NativeText, View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius, target, type Tone } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from './Text';
import { useRovingFocus } from './useRovingFocus';

interface SegmentedChoiceProps<Value extends string> {
  label: string;
  labelHidden?: boolean;
  tone?: Tone;
  value: Value | null;
  options: readonly { value: Value; label: string }[];
  onChange: (value: Value) => void;
  error?: string;
}

/** Two to five short choices side by side; the chosen one is frosted and semibold. */
export function SegmentedChoice<Value extends string>({ label, labelHidden, tone = 'ink', value, options, onChange, error }: SegmentedChoiceProps<Value>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const id = useId();
  const chosen = options.findIndex((option) => option.value === value);
  const roving = useRovingFocus(options.length, (index) => {
    const option = options[index];
    if (option) onChange(option.value);
  });
  return (
    <View style={{ gap: 4 }}>
      {labelHidden ? null : (
        <Text size="table" weight="semibold" tone={tone}>
          {label}
        </Text>
      )}
      <View
        role="radiogroup"
        aria-label={label}
        aria-describedby={error ? `${id}-error` : undefined}
        style={{ flexDirection: 'row', borderWidth: 1, borderColor: error ? colour.flagged : colour.tick, borderRadius: radius.control }}
      >
        {options.map((option, index) => {
          const on = option.value === value;
          const keys = { onKeyDown: roving.onKeyDown(index) };
          return (
            <Pressable
              key={option.value}
              ref={roving.register(index)}
              role="radio"
              aria-checked={on}
              tabIndex={on || (chosen < 0 && index === 0) ? 0 : -1}
              onPress={() => onChange(option.value)}
              {...keys}
              style={{
                flex: 1,
                minHeight: (wide ? target.wide : target.phone) - 2,
                paddingHorizontal: 6,
                alignItems: 'center',
                justifyContent: 'center',
                backgroundColor: on ? colour.frost : 'transparent',
                borderLeftWidth: index === 0 ? 0 : 1,
                borderLeftColor: colour.hairline,
              }}
            >
              <NativeText style={{ fontFamily: fontFamily(on ? 'sansSemibold' : 'sans'), fontSize: 15, lineHeight: 20, color: on ? colour.ink : colour.inkSoft, textAlign: 'center' }}>
                {option.label}
              </NativeText>
            </Pressable>
          );
        })}
      </View>
      {error ? (
        <Text id={`${id}-error`} size="secondary" tone="flagged">
          {error}
        </Text>
      ) : null}
    </View>
  );
}
