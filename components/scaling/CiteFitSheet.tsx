import { useState } from 'react';
import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { formatExponent, formatInterval } from '../../shared/domain/quantityText';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { CitationBox } from '../versions/CiteSheet';
import { copyText } from '../versions/copyText';
import { methodWords } from './caption';
import { recordsUsed, type CladeResult } from './figureGroups';
import { fullAddress } from './saveText';
import { addressOf, type ScalingChoice } from './scalingChoice';
import { questionTitle } from './variables';

interface CiteFitSheetProps {
  answer: ScalingAnswer;
  results: readonly CladeResult[];
  choice: ScalingChoice;
  onClose: () => void;
}

/** Citation of exactly the rows this fit used, with their primary sources, the fit in words, and the address that shows it again. */
export function CiteFitSheet({ answer, results, choice, onClose }: CiteFitSheetProps) {
  const [style, setStyle] = useState<'text' | 'bibtex'>('text');
  const [copied, setCopied] = useState<boolean | null>(null);
  const records = recordsUsed(results);
  const address = fullAddress(addressOf(choice, answer.version));
  const level = `${Number((answer.question.level * 100).toPrecision(3))} %`;
  const fits = results.flatMap(({ name, fit: { exponent, n } }) => (exponent ? [`${name} ${formatExponent(exponent.estimate)} (${level} ${formatInterval(exponent.lower, exponent.upper)}, n = ${n})`] : []));
  return (
    <Sheet open title="Cite this fit" closeLabel="Close" onClose={onClose} width={600}>
      <Text>{`${questionTitle(answer.question)}, ${methodWords[answer.question.method] ?? answer.question.method}${fits.length > 0 ? `: ${fits.join('; ')}` : ''}.`}</Text>
      {choice.working ? (
        <Text tone="waiting">The working set changes from day to day and cannot be cited. Show the published version to cite its fit.</Text>
      ) : (
        <Section title={`Version ${answer.version}, ${records.length} ${records.length === 1 ? 'record' : 'records'} used`} look="small" level={3}>
          <View style={{ paddingTop: 10 }}>
            <CitationBox label={answer.version} records={records} style={style} onStyle={setStyle} />
          </View>
        </Section>
      )}
      <Section title="Address of this view" look="small" level={3}>
        <View style={{ paddingTop: 8, gap: 8 }}>
          <Text size="secondary" style={{ userSelect: 'text', overflowWrap: 'anywhere' } as object}>
            {address}
          </Text>
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
            <Button label="Copy address" onPress={() => void copyText(address).then(setCopied)} />
            {copied === null ? null : (
              <Text role="status" size="secondary" tone={copied ? 'settled' : 'flagged'}>
                {copied ? 'Copied.' : 'Copying is not allowed here: select the text.'}
              </Text>
            )}
          </View>
        </View>
      </Section>
    </Sheet>
  );
}
