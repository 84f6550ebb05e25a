import { useId, type ReactNode, type Ref } from 'react';
import { TextInput, View, type TextInputProps } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius, target } from '../theme/tokens';
import { fontFamily, textSize } from '../theme/typography';
import { useBreakpoint } from '../layout/useBreakpoint';
import { describedBy, FieldFrame, type FieldText } from './FieldFrame';
import { Sign } from './Sign';
import { Text } from './Text';

export interface TextFieldProps extends FieldText {
  value: string;
  onChangeText: (text: string) => void;
  onBlur?: () => void;
  onSubmit?: () => void;
  /** Unit or other words at the right end inside the frame. */
  unit?: string;
  placeholder?: string;
  disabled?: boolean;
  /** Shown, not to be changed. */
  readOnly?: boolean;
  required?: boolean;
  secret?: boolean;
  /** More than one line, so many high. */
  rows?: number;
  inputMode?: TextInputProps['inputMode'];
  autoComplete?: TextInputProps['autoComplete'];
  autoFocus?: boolean;
  maxLength?: number;
  align?: 'left' | 'right';
  /** Semibold entry, for counts in a table. */
  strong?: boolean;
  grow?: boolean;
  inputRef?: Ref<TextInput>;
  /** Left inside the frame, a sign. */
  start?: ReactNode;
  /** Right inside the frame, a control: the choice of a unit. */
  end?: ReactNode;
}

/** One line of text (or several) with label, unit, error, warning and hint. */
export function TextField(props: TextFieldProps) {
  const { value, onChangeText, onBlur, onSubmit, unit, placeholder, disabled, readOnly, required, secret, rows, inputMode, autoComplete, autoFocus, maxLength, align, strong, grow, inputRef, start, end, ...text } = props;
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const id = useId();
  const wrong = Boolean(text.error);
  const border = wrong || text.warning ? colour.flagged : colour.tick;
  return (
    <FieldFrame id={id} grow={grow} {...text}>
      <View
        {...{ dataSet: { framed: 'true' } }}
        style={{
          flexDirection: 'row',
          alignItems: rows ? 'flex-start' : 'center',
          gap: 8,
          minHeight: wide ? target.wide : target.primaryPhone,
          paddingHorizontal: 12,
          borderWidth: 1,
          borderColor: border,
          borderStyle: disabled ? 'dashed' : 'solid',
          borderRadius: radius.control,
          backgroundColor: disabled || readOnly ? 'transparent' : colour.sheet,
          boxShadow: wrong ? `inset 0 0 0 1px ${border}` : undefined,
        }}
      >
        {start}
        <TextInput
          ref={inputRef}
          id={id}
          value={value}
          onChangeText={onChangeText}
          onBlur={onBlur}
          onSubmitEditing={onSubmit}
          placeholder={placeholder}
          placeholderTextColor={colour.inkSoft}
          editable={!disabled && !readOnly}
          secureTextEntry={secret}
          multiline={rows !== undefined}
          {...(rows === undefined ? null : { rows })}
          inputMode={inputMode}
          autoComplete={autoComplete}
          autoCapitalize="none"
          autoFocus={autoFocus}
          maxLength={maxLength}
          aria-describedby={describedBy(id, text)}
          aria-invalid={wrong || undefined}
          aria-required={required || undefined}
          aria-disabled={disabled || undefined}
          style={[
            textSize('field', wide),
            {
              flex: 1,
              minWidth: 0,
              paddingVertical: rows ? 8 : 6,
              fontFamily: fontFamily(strong ? 'sansSemibold' : 'sans'),
              color: disabled ? colour.inkSoft : colour.ink,
              textAlign: align,
              backgroundColor: 'transparent',
            },
          ]}
        />
        {unit ? (
          <Text size="body" tone="inkSoft" style={{ flexShrink: 0, paddingVertical: rows ? 8 : 0 }}>
            {unit}
          </Text>
        ) : null}
        {end}
      </View>
    </FieldFrame>
  );
}

/** A measured number, kept as it was typed; parsing belongs to the form. `whole` asks for a keypad without a point. */
export function NumberField({ whole = false, ...props }: Omit<TextFieldProps, 'inputMode' | 'rows' | 'secret'> & { whole?: boolean }) {
  return <TextField {...props} inputMode={whole ? 'numeric' : 'decimal'} autoComplete="off" />;
}

/** A line to search with: no box, a rule under it, as on the register. */
export function SearchField({ label, value, onChangeText, placeholder, onSubmit }: Pick<TextFieldProps, 'label' | 'value' | 'onChangeText' | 'placeholder' | 'onSubmit'>) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  return (
    <View
      {...{ dataSet: { framed: 'true' } }}
      style={{ flexDirection: 'row', alignItems: 'center', gap: 10, minHeight: wide ? target.wide : target.phone, borderBottomWidth: 1, borderBottomColor: colour.tick }}
    >
      <Sign name="search" tone="inkSoft" />
      <TextInput
        value={value}
        onChangeText={onChangeText}
        onSubmitEditing={onSubmit}
        placeholder={placeholder}
        placeholderTextColor={colour.inkSoft}
        inputMode="search"
        role="searchbox"
        aria-label={label}
        autoCapitalize="none"
        autoCorrect={false}
        style={[textSize('body', wide), { flex: 1, minWidth: 0, color: colour.ink, fontFamily: fontFamily('sans'), paddingVertical: 6 }]}
      />
    </View>
  );
}

