import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { SampleEstimate } from '../../shared/domain/sampleTypes';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Quantity } from '../marks/Quantity';
import { StateSign } from '../marks/StateSign';
import { useAccount } from '../queries/account';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { Row } from '../ui/Row';
import { Text } from '../ui/Text';
import { copyText } from '../versions/copyText';
import { requestBody } from './benchEntry';
import { Cautions } from './Cautions';
import { AliquotRows, NeunRows } from './CountRows';
import { Results } from './Results';
import { SampleFields } from './SampleFields';
import { useBench } from './useBench';

/** From counts in a chamber to cells, neurons and other cells, at once and without an account. */
export function BenchScreen() {
  const { sideBySide, wide } = useBreakpoint();
  const { roles } = useAccount();
  const bench = useBench();
  const [asking, setAsking] = useState(false);
  const [copied, setCopied] = useState<boolean | null>(null);
  const { input } = bench.reading;
  const kept = bench.keptAt ? <StateSign state="kept here" words={`kept here ${timeText(bench.keptAt).slice(11, 16)}`} size="secondary" /> : undefined;
  const form = (
    <>
      <SampleFields bench={bench} />
      <AliquotRows bench={bench} />
      <NeunRows bench={bench} />
    </>
  );
  return (
    <Screen title="Bench" sub="One sample, from the counting chamber to cells and neurons. Nothing is sent; it stays on this device." description="From nuclei counted in a chamber to cells, neurons and other cells with their errors." actions={kept} foot={!wide && bench.reading.estimate ? <LiveNumbers estimate={bench.reading.estimate} /> : undefined}>
      <Cautions />
      {sideBySide ? (
        <View style={{ flexDirection: 'row', gap: 48, alignItems: 'flex-start' }}>
          <View style={{ flex: 560, minWidth: 0, maxWidth: 640, gap: 28 }}>{form}</View>
          <View style={{ flex: 480, minWidth: 0, maxWidth: 560 }}>
            <Results bench={bench} />
          </View>
        </View>
      ) : (
        <View style={{ gap: wide ? 28 : 24, maxWidth: 720 }}>
          {form}
          <Results bench={bench} />
        </View>
      )}
      <Row wrap gap={10}>
        {roles.includes('contributor') ? <Button kind="primary" label="Enter this as a sample" href={'/submissions/new' as Href} /> : null}
        <Button label="Copy as JSON" disabled={input === null} onPress={() => input && void copyText(JSON.stringify(requestBody(input), null, 2)).then(setCopied)} />
        <Button label="Clear all" kind="quiet" disabled={bench.isEmpty} onPress={() => setAsking(true)} />
        {copied === null ? null : (
          <Text role="status" size="secondary" tone={copied ? 'settled' : 'flagged'}>
            {copied ? 'Copied, as POST /api/v1/samples/estimate takes it.' : 'Copying is not allowed here.'}
          </Text>
        )}
      </Row>
      <ConfirmDialog
        open={asking}
        question="Clear all that was entered?"
        consequence="Mass, volumes and every count leave this device. They stand nowhere else."
        confirmLabel="Clear all"
        cancelLabel="Keep it"
        onConfirm={() => {
          bench.clear();
          setCopied(null);
          setAsking(false);
        }}
        onCancel={() => setAsking(false)}
      />
    </Screen>
  );
}

/** On a phone the two numbers that matter stay in sight while one types. */
function LiveNumbers({ estimate }: { estimate: SampleEstimate }) {
  return (
    <View style={{ flex: 1, flexDirection: 'row', justifyContent: 'space-between', gap: 12 }} aria-hidden={true}>
      <View>
        <Text size="least" tone="cells" weight="semibold">
          cells
        </Text>
        <Quantity value={estimate.cells.value} error={estimate.cells.standardError} kind="count" tone="cells" />
      </View>
      <View style={{ alignItems: 'flex-end' }}>
        <Text size="least" tone="neurons" weight="semibold">
          neurons
        </Text>
        <Quantity value={estimate.neurons.value} error={estimate.neurons.standardError} kind="count" tone="neurons" missing="NeuN counts missing" />
      </View>
    </View>
  );
}
