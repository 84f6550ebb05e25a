import { Pressable } from 'react-native';
import { Text } from './Text';

export interface UnitChoiceProps {
  /** Spoken name: "Unit of tissue mass". */
  label: string;
  value: string;
  units: readonly string[];
  onChange: (unit: string) => void;
}

/** The unit at the right end inside a field; a press goes to the next one. */
export function UnitChoice({ label, value, units, onChange }: UnitChoiceProps) {
  const next = units[(units.indexOf(value) + 1) % units.length] ?? value;
  return (
    <Pressable role="button" aria-label={`${label}, ${value}`} hitSlop={12} onPress={() => onChange(next)}>
      <Text tone="inkSoft">{value}</Text>
    </Pressable>
  );
}
