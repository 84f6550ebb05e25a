import { View } from 'react-native';
import { BinomialSpan } from '../marks/Binomial';
import { DemoMark } from '../marks/DemoMark';
import { Text } from '../ui/Text';

/** A species in the first cell of a row, with the sign of invented data below it. */
export function SpeciesCell({ species, demonstration }: { species: string; demonstration: boolean }) {
  return (
    <View>
      <Text>
        <BinomialSpan name={species} />
      </Text>
      {demonstration ? <DemoMark /> : null}
    </View>
  );
}
