import { useId, type ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { target } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from './Text';
import { useRovingFocus } from './useRovingFocus';

interface TabsProps<Value extends string> {
  label: string;
  value: Value;
  tabs: readonly { value: Value; label: string; count?: number }[];
  onChange: (value: Value) => void;
  /** The panel of the chosen tab. */
  children: ReactNode;
}

/** Panels of one thing; the chosen tab has a line in cresyl under it. */
export function Tabs<Value extends string>({ label, value, tabs, onChange, children }: TabsProps<Value>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const id = useId();
  const roving = useRovingFocus(tabs.length, (index) => {
    const tab = tabs[index];
    if (tab) onChange(tab.value);
  });
  return (
    <View>
      <View role="tablist" aria-label={label} style={{ flexDirection: 'row', flexWrap: 'wrap', borderBottomWidth: 1, borderBottomColor: colour.ink }}>
        {tabs.map((tab, index) => {
          const on = tab.value === value;
          const keys = { onKeyDown: roving.onKeyDown(index) };
          return (
            <Pressable
              key={tab.value}
              ref={roving.register(index)}
              role="tab"
              id={`${id}-${tab.value}`}
              aria-selected={on}
              aria-controls={`${id}-panel`}
              tabIndex={on ? 0 : -1}
              onPress={() => onChange(tab.value)}
              {...keys}
              style={{ minHeight: wide ? target.wide : target.phone, justifyContent: 'center', marginRight: 20, borderBottomWidth: 3, borderBottomColor: on ? colour.cresyl : 'transparent' }}
            >
              <Text size="table" weight={on ? 'semibold' : 'regular'} tone={on ? 'ink' : 'inkSoft'}>
                {tab.label}
                {tab.count === undefined ? '' : ` ${tab.count}`}
              </Text>
            </Pressable>
          );
        })}
      </View>
      <View role={'tabpanel' as 'none'} id={`${id}-panel`} aria-labelledby={`${id}-${value}`} style={{ paddingTop: 12 }}>
        {children}
      </View>
    </View>
  );
}
