import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { Entered } from '../../../shared/contracts/content';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { Sign } from '../../ui/Sign';
import { Element } from '../../ui/Element';
import { Select, type SelectOption } from '../../ui/Select';
import { Span, Text } from '../../ui/Text';
import { NumberField, TextField, type TextFieldProps } from '../../ui/TextField';
import { UnitChoice } from '../../ui/UnitChoice';
import { useDraftContext, useFieldChecks } from './DraftContext';
import { placeId } from './reachField';

/** Two short fields side by side on a phone. */
const PAIR_ON_PHONE = 150;

/** As many fields side by side as have room; `pairs` puts two short ones side by side on a phone. */
export function FieldGrid({ least = 200, pairs, children }: { least?: number; pairs?: boolean; children: ReactNode }) {
  const { wide } = useBreakpoint();
  const column = pairs && !wide ? PAIR_ON_PHONE : least;
  return (
    <Element as="div" css={{ display: 'grid', gridTemplateColumns: `repeat(auto-fill, minmax(min(100%, ${column}px), 1fr))`, gap: '14px 16px', alignItems: 'start' }} nativeStyle={{ gap: 14 }}>
      {children}
    </Element>
  );
}

/** Where a field stands, so that checks and links can lead to it; a thread at the field shows its last word. */
export function FieldPlace({ path, children }: { path: string; children: ReactNode }) {
  const { comments } = useDraftContext();
  const last = comments.findLast((comment) => comment.fieldPath === path);
  return (
    <View id={placeId(path)} style={{ minWidth: 0, gap: 4 }}>
      {children}
      {last ? (
        <View style={{ flexDirection: 'row', gap: 6 }}>
          <View style={{ paddingTop: 2 }}>
            <Sign name="reticle" tone="cresyl" size={14} />
          </View>
          <Text size="secondary" style={{ flexShrink: 1 }}>
            <Span weight="semibold">{last.author.name}</Span> {last.text}
          </Text>
        </View>
      ) : null}
    </View>
  );
}

interface DraftTextProps extends Omit<TextFieldProps, 'error' | 'warning' | 'onChangeText'> {
  path: string;
  onChange: (text: string) => void;
}

/** Words at a field of the draft. */
export function DraftText({ path, onChange, ...rest }: DraftTextProps) {
  const found = useFieldChecks(path);
  return (
    <FieldPlace path={path}>
      <TextField {...rest} {...found} onChangeText={onChange} />
    </FieldPlace>
  );
}

/** A number at a field of the draft, kept as typed. */
export function DraftNumber({ path, onChange, whole, ...rest }: DraftTextProps & { whole?: boolean }) {
  const found = useFieldChecks(path);
  return (
    <FieldPlace path={path}>
      <NumberField {...rest} {...found} whole={whole} onChangeText={onChange} />
    </FieldPlace>
  );
}

interface DraftQuantityProps {
  path: string;
  label: string;
  value: Entered;
  units: readonly string[];
  onChange: (entered: Entered) => void;
  hint?: string;
  tone?: TextFieldProps['tone'];
}

/** A measured value and its unit, both kept as entered. */
export function DraftQuantity({ path, label, value, units, onChange, hint, tone }: DraftQuantityProps) {
  const found = useFieldChecks(path);
  return (
    <FieldPlace path={path}>
      <NumberField
        label={label}
        tone={tone}
        hint={hint}
        {...found}
        value={value.text}
        maxLength={60}
        onChangeText={(text) => onChange({ ...value, text })}
        end={<UnitChoice label={`Unit of ${label.charAt(0).toLowerCase()}${label.slice(1)}`} value={value.unit} units={units} onChange={(unit) => onChange({ ...value, unit })} />}
      />
    </FieldPlace>
  );
}

interface DraftChoiceProps<Value extends string> {
  path: string;
  label: string;
  value: Value | null;
  options: readonly SelectOption<Value>[];
  onChange: (value: Value) => void;
  hint?: string;
  placeholder?: string;
}

/** One of a vocabulary at a field of the draft. */
export function DraftChoice<Value extends string>({ path, value, placeholder = 'Choose', ...rest }: DraftChoiceProps<Value>) {
  const found = useFieldChecks(path);
  return (
    <FieldPlace path={path}>
      <Select {...rest} {...found} value={value ?? ''} placeholder={value === null ? placeholder : undefined} />
    </FieldPlace>
  );
}
