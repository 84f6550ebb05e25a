import type { FieldText } from './FieldFrame';
import { RadioList } from './RadioList';

export interface SelectOption<Value extends string> {
  value: Value;
  label: string;
  disabled?: boolean;
}

export interface SelectProps<Value extends string> extends FieldText {
  value: Value | '';
  options: readonly SelectOption<Value>[];
  onChange: (value: Value) => void;
  /** First entry while nothing is chosen. */
  placeholder?: string;
  disabled?: boolean;
  required?: boolean;
  grow?: boolean;
}

/** One of several. A real select on the web; a list of choices on native. */
export function Select<Value extends string>({ label, value, options, onChange }: SelectProps<Value>) {
  return <RadioList label={label} value={value === '' ? null : value} options={options} onChange={onChange} />;
}
