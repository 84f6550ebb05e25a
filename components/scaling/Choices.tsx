import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { BinomialSpan } from '../marks/Binomial';
import { useAccount } from '../queries/account';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Button } from '../ui/Button';
import { Checkbox } from '../ui/Checkbox';
import { RadioList } from '../ui/RadioList';
import { SegmentedChoice } from '../ui/SegmentedChoice';
import { Text } from '../ui/Text';
import { AxisChoice } from './AxisChoice';
import { CladeChoice } from './CladeChoice';
import type { ScalingChoice } from './scalingChoice';
import { isMadeFromTheOther } from './variables';

interface ChoicesProps {
  choice: ScalingChoice;
  change: (part: Partial<ScalingChoice>) => void;
  answer: ScalingAnswer | undefined;
  chosen: readonly string[];
  marks: ReadonlyMap<string, CladeMarkSpec>;
}

/** All that can be chosen: axes, clades, method, level, bands, what is left out, and for reviewers and curators the set. */
export function Choices({ choice, change, answer, chosen, marks }: ChoicesProps) {
  const { wide } = useBreakpoint();
  const { roles } = useAccount();
  const seesWorking = roles.includes('reviewer') || roles.includes('curator');
  const onlyLeastSquares = isMadeFromTheOther(choice);
  const names = new Map(answer?.species.map(({ slug, species }) => [slug, species]));
  return (
    <View style={{ gap: 16 }}>
      {seesWorking ? (
        <SegmentedChoice
          label="set"
          value={choice.working ? 'working' : 'published'}
          options={[
            { value: 'published', label: wide ? 'Version' : 'Published version' },
            { value: 'working', label: wide ? 'Working' : 'Working set' },
          ]}
          onChange={(set) => change({ working: set === 'working', species: null })}
        />
      ) : null}
      <AxisChoice choice={choice} change={change} />
      <CladeChoice available={answer?.available ?? []} chosen={chosen} marks={marks} change={change} twoColumns={!wide} />
      <RadioList
        label="method"
        value={choice.method}
        options={[
          { value: 'ols', label: 'Ordinary least squares' },
          { value: 'sma', label: 'Standardised major axis', disabled: onlyLeastSquares, note: onlyLeastSquares ? 'no meaning for this pair' : undefined },
        ]}
        onChange={(method) => change({ method })}
      />
      <SegmentedChoice
        label="level of intervals"
        value={choice.level}
        options={[
          { value: '0.9', label: '90 %' },
          { value: '0.95', label: '95 %' },
          { value: '0.99', label: '99 %' },
        ]}
        onChange={(level) => change({ level })}
      />
      <View>
        <Checkbox label="confidence band" checked={choice.confidence && choice.method === 'ols'} disabled={choice.method !== 'ols'} onChange={(confidence) => change({ confidence })} />
        <Checkbox label="prediction band" checked={choice.prediction && choice.method === 'ols'} disabled={choice.method !== 'ols'} onChange={(prediction) => change({ prediction })} />
        {choice.method === 'ols' ? null : (
          <Text size="least" tone="inkSoft">
            This method predicts nothing and has no bands.
          </Text>
        )}
      </View>
      {choice.without.length > 0 ? (
        <View role="group" aria-label="Left out by you">
          <Text size="table" weight="semibold">
            left out by you
          </Text>
          {choice.without.map((slug) => {
            const name = names.get(slug) ?? slug;
            return (
              <View key={slug} style={{ paddingVertical: 4 }}>
                <Text size="table">
                  <BinomialSpan name={name} />
                </Text>
                <Button kind="quiet" label="Put back" spokenLabel={`Put back ${name}`} onPress={() => change({ without: choice.without.filter((other) => other !== slug) })} style={{ alignSelf: 'flex-start', marginLeft: -8 }} />
              </View>
            );
          })}
        </View>
      ) : null}
    </View>
  );
}
