import { View } from 'react-native';
import { variables, type Variable } from '../../shared/contracts/vocabulary';
import { useBreakpoint } from '../layout/useBreakpoint';
import { useStructures } from '../queries/register';
import { Select } from '../ui/Select';
import { Stack } from '../ui/Row';
import type { ScalingChoice } from './scalingChoice';
import { axisOf, usualStructures, variableChoice } from './variables';

interface AxisChoiceProps {
  choice: ScalingChoice;
  change: (part: Partial<ScalingChoice>) => void;
}

const options = variables.map((variable) => ({ value: variable, label: variableChoice(variable) }));

/** Vertical and horizontal axis: which variable of which structure. */
export function AxisChoice({ choice, change }: AxisChoiceProps) {
  const { wide } = useBreakpoint();
  return (
    <View style={{ flexDirection: wide ? 'column' : 'row', gap: 16 }}>
      <OneAxis axis="y" choice={choice} change={change} />
      <OneAxis axis="x" choice={choice} change={change} />
    </View>
  );
}

function OneAxis({ axis, choice, change }: AxisChoiceProps & { axis: 'y' | 'x' }) {
  const { wide } = useBreakpoint();
  const structures = useStructures();
  const own = axis === 'y' ? { variable: choice.y, structure: choice.yStructure } : { variable: choice.x, structure: choice.xStructure };
  const other = axis === 'y' ? { variable: choice.x, structure: choice.xStructure } : { variable: choice.y, structure: choice.yStructure };
  const label = axis === 'y' ? 'vertical axis' : 'horizontal axis';
  const known = structures.data?.map(({ key, name }) => ({ value: key, label: name })) ?? usualStructures.map((key) => ({ value: key as string, label: key.replaceAll('_', ' ') }));
  const first = known.filter(({ value }) => usualStructures.some((key) => key === value));
  const rest = known.filter(({ value }) => !usualStructures.some((key) => key === value));

  const set = (variable: Variable, structure: string | null, otherStructure = other.structure) => {
    const part = axis === 'y' ? { y: variable, yStructure: structure, xStructure: otherStructure } : { x: variable, xStructure: structure, yStructure: otherStructure };
    change({ ...part, species: null });
  };
  const chooseVariable = (variable: Variable) => {
    const structure = variable === 'bodyMassG' ? null : (own.structure ?? other.structure ?? 'cerebral_cortex');
    // A body mass on one axis needs a structure on the other.
    const otherStructure = other.variable === 'bodyMassG' ? null : other.structure;
    set(variable, structure, otherStructure);
  };
  // Both axes speak of one structure until they are told apart.
  const chooseStructure = (structure: string) => set(own.variable, structure, axis === 'y' && other.structure === own.structure ? structure : other.structure);
  const isSame = (variable: Variable, structure: string | null) => variable === other.variable && structure === other.structure;

  return (
    <Stack gap={8} style={wide ? undefined : { flex: 1, minWidth: 0 }}>
      <Select
        label={label}
        tone={axisOf(own.variable, own.structure).tone}
        value={own.variable}
        options={options.map((option) => ({ ...option, disabled: isSame(option.value, option.value === 'bodyMassG' ? null : own.structure) }))}
        onChange={chooseVariable}
      />
      {own.variable === 'bodyMassG' ? null : (
        <Select
          label={`structure of the ${label}`}
          labelHidden
          value={own.structure ?? ''}
          options={[...first, ...rest].map((option) => ({ ...option, disabled: isSame(own.variable, option.value) }))}
          onChange={chooseStructure}
        />
      )}
    </Stack>
  );
}
