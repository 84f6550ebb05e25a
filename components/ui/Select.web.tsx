import { useId, type ChangeEvent } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius, target } from '../theme/tokens';
import { fontFamily, textSize } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Element } from './Element';
import { describedBy, FieldFrame } from './FieldFrame';
import type { SelectProps } from './Select';
import { Sign } from './Sign';

/** One of several: the browser's own select in our frame, so that keyboard, search and phone pickers work. */
export function Select<Value extends string>({ value, options, onChange, placeholder, disabled, required, grow, ...text }: SelectProps<Value>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const id = useId();
  const { fontSize } = textSize('field', wide);
  const wrong = Boolean(text.error);
  return (
    <FieldFrame id={id} grow={grow} {...text}>
      <View
        {...{ dataSet: { framed: 'true' } }}
        style={{
          minHeight: wide ? target.wide : target.primaryPhone,
          borderWidth: 1,
          borderStyle: disabled ? 'dashed' : 'solid',
          borderColor: wrong || text.warning ? colour.flagged : colour.tick,
          borderRadius: radius.control,
          backgroundColor: disabled ? 'transparent' : colour.sheet,
          justifyContent: 'center',
        }}
      >
        <Element
          as="select"
          attributes={{
            id,
            value,
            disabled,
            required,
            'aria-describedby': describedBy(id, text),
            'aria-invalid': wrong || undefined,
            onChange: (event: ChangeEvent<HTMLSelectElement>) => {
              const chosen = options.find((option) => option.value === event.target.value);
              if (chosen) onChange(chosen.value);
            },
          }}
          css={{
            appearance: 'none',
            border: 0,
            margin: 0,
            width: '100%',
            minHeight: wide ? target.wide - 2 : target.primaryPhone - 2,
            padding: '0 34px 0 12px',
            background: 'transparent',
            color: disabled ? colour.inkSoft : colour.ink,
            fontFamily: fontFamily('sans'),
            fontSize,
            textOverflow: 'ellipsis',
          }}
        >
          {placeholder !== undefined || value === '' ? (
            <option value="" disabled={required}>
              {placeholder ?? ''}
            </option>
          ) : null}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </Element>
        <View style={{ position: 'absolute', right: 10, pointerEvents: 'none' }}>
          <Sign name="chevron" tone="inkSoft" size={14} />
        </View>
      </View>
    </FieldFrame>
  );
}
