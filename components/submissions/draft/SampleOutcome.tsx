import type { SampleEntry } from '../../../shared/contracts/content';
import { formatInterval, formatP } from '../../../shared/domain/quantityText';
import { estimateSample } from '../../../shared/domain/sampleEstimate';
import { readSample } from '../../../shared/domain/specimenReading';
import { View } from 'react-native';
import { Span, Text } from '../../ui/Text';

const errorWords = { 'between-aliquots': 'the error is the one between aliquots', counting: 'the error is the counting one, which is the larger' } as const;

/** What the aliquots of a sample say of themselves: CV, dispersion in words, NeuN-positive fraction. */
export function SampleOutcome({ sample, structure }: { sample: SampleEntry; structure: string }) {
  const { input } = readSample(sample, 'sample');
  if (input === null) {
    return (
      <Text size="secondary" tone="inkSoft">
        With the suspension volume and an aliquot, the numbers appear here as you type.
      </Text>
    );
  }
  const { aliquotCv, dispersion, standardErrorKind, neuronFraction, checks } = estimateSample(input, { structure, side: sample.side });
  const clumping = checks.find((check) => check.code === 'excess-cv')?.message;
  return (
    <View role="status" style={{ gap: 4 }}>
      {aliquotCv === null ? null : (
        <Text size="table">
          CV <Span weight="semibold">{aliquotCv.toFixed(3)}</Span>
          {dispersion ? <Span tone="inkSoft">{` · dispersion ${dispersion.statistic.toPrecision(2)} on ${dispersion.df} df, ${formatP(dispersion.p)}`}</Span> : null}
        </Text>
      )}
      {clumping ? <Text size="secondary">{clumping}</Text> : null}
      {standardErrorKind ? (
        <Text size="secondary" tone="inkSoft">
          {`Of the standard error: ${errorWords[standardErrorKind]}.`}
        </Text>
      ) : null}
      {neuronFraction.value === null ? null : (
        <Text size="table">
          NeuN-positive fraction <Span weight="semibold">{neuronFraction.value.toFixed(3)}</Span>
          <Span tone="inkSoft">{` (${formatInterval(neuronFraction.lower, neuronFraction.upper, 3)})${neuronFraction.varianceKind === 'between-fields' ? ', by the variance between fields' : ''}`}</Span>
        </Text>
      )}
    </View>
  );
}
