import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { RecordPage } from '../../shared/contracts/register';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { BinomialSpan } from '../marks/Binomial';
import { CladeMark } from '../marks/CladeMark';
import { PlaceOnLine } from '../marks/PlaceOnLine';
import { RecordTrail } from '../marks/RecordTrail';
import { StateSign } from '../marks/StateSign';
import { errorInWords } from '../queries/errorInWords';
import { useRecordPage } from '../queries/register';
import { FlagList } from '../species/FlagList';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink, TextLink } from '../ui/TextLink';
import { CiteSheet } from '../versions/CiteSheet';
import { AskRecheckSheet } from './AskRecheckSheet';
import { RecordFacts, RecordValues } from './RecordFacts';
import { RecordSamples } from './RecordSamples';
import { SetAsideSheet } from './SetAsideSheet';

/** One record: its values, where it lies, flags, and everything that happened to it. */
export function RecordScreen({ number }: { number: string }) {
  const record = useRecordPage(number);
  if (record.data) return <RecordView page={record.data} />;
  return (
    <Screen title={number} back={<BackLink href={'/species' as Href} label="Species" />}>
      <QueryView pending={record.isPending} error={record.error ? errorInWords(record.error) : null} data={record.data} onRetry={() => void record.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}

function stateOf(page: RecordPage): { state: string; words: string } {
  if (page.withdrawn !== null) return { state: 'withdrawn', words: 'withdrawn' };
  if (page.working) return { state: 'approved', words: 'approved, in no version yet' };
  return { state: 'frozen', words: `in version ${page.version ?? ''}` };
}

function RecordView({ page }: { page: RecordPage }) {
  const { sideBySide } = useBreakpoint();
  const [open, setOpen] = useState<'cite' | 'recheck' | 'setAside' | null>(null);
  const close = () => setOpen(null);
  const { row } = page;
  const cited = page.inVersions.at(-1);
  const main = (
    <>
      <RecordValues row={row} />
      {page.places.length > 0 ? (
        <Section title="Place on the line" look="small" style={{ gap: 8 }}>
          {page.places.map((place) => (
            <View key={place.fit} style={{ gap: 2 }}>
              <PlaceOnLine clade={place.clade} place={{ ratio: place.ratio, lower: place.lowerRatio, upper: place.upperRatio }} level={place.level} flagged={!place.inside} />
              <Text size="secondary" tone="inkSoft">{`line of ${place.cladeName}, ${place.n} species, fitted without this one`}</Text>
            </View>
          ))}
        </Section>
      ) : null}
      {page.flags.length > 0 ? <FlagList flags={page.flags} /> : null}
      {page.setAside.length > 0 ? (
        <Section title="Set aside" look="small">
          {page.setAside.map((aside) => (
            <Text key={`${aside.at}${aside.reason}`} size="table" style={{ paddingVertical: 6 }}>
              {`${aside.scope === 'all' ? 'From every fit' : 'From the fits of one pair of variables'}, by ${aside.by}, ${timeText(aside.at)}: ${aside.reason}`}
            </Text>
          ))}
        </Section>
      ) : null}
      {page.samples.length > 0 ? <RecordSamples samples={page.samples} /> : null}
    </>
  );
  const aside = (
    <>
      {page.rechecks.length > 0 ? (
        <Section title="Re-checks" look="small">
          {page.rechecks.map((recheck) => (
            <View key={recheck.id} style={{ paddingVertical: 8, gap: 2 }}>
              <StateSign state={recheck.status} words={`re-check ${recheck.status}`} />
              <Text size="table">{recheck.question}</Text>
            </View>
          ))}
        </Section>
      ) : null}
      <RecordFacts page={page} />
      <Section title="Trail" look="small">
        <RecordTrail events={page.trail.map((item, index) => ({ key: String(index), what: item.what, detail: item.who, when: timeText(item.at), why: item.why || undefined }))} />
      </Section>
    </>
  );
  return (
    <Screen
      title={`${row.number}, ${row.species}`}
      heading={row.number}
      sub={
        <Row gap={8} wrap>
          {row.lineage.length > 0 ? <CladeMark clade={page.cladeName} /> : null}
          <Text>
            <TextLink href={`/species/${row.taxonSlug}` as Href} look="plain">
              <BinomialSpan name={row.species} />
            </TextLink>
            {`, ${page.structureName.toLowerCase()}`}
            {row.specimen ? `, specimen ${row.specimen}` : ''}
          </Text>
          <StateSign {...stateOf(page)} />
        </Row>
      }
      back={<BackLink href={`/species/${row.taxonSlug}` as Href} label={row.species} />}
      actions={
        <>
          {page.may.revise ? <Button label="Open the submission" href={`/submissions/${page.may.revise}` as Href} /> : null}
          {page.may.askRecheck ? <Button label="Ask for a re-check" onPress={() => setOpen('recheck')} /> : null}
          {page.may.setAside ? <Button label="Set aside" onPress={() => setOpen('setAside')} /> : null}
          {cited ? <Button kind="primary" label="Cite" spokenLabel={`Cite record ${row.number}`} onPress={() => setOpen('cite')} /> : null}
        </>
      }
      demonstration={row.demonstration}
    >
      {page.withdrawn !== null ? <Text>{`Withdrawn: ${page.withdrawn}`}</Text> : null}
      {sideBySide ? (
        <View style={{ flexDirection: 'row', gap: 40 }}>
          <View style={{ flex: 1.4, minWidth: 0, gap: 28 }}>{main}</View>
          <View style={{ flex: 1, minWidth: 0, gap: 28 }}>{aside}</View>
        </View>
      ) : (
        <>
          {main}
          {aside}
        </>
      )}
      {open === 'cite' && cited ? <CiteSheet label={cited} records={[row.number]} title={`Cite record ${row.number}`} onClose={close} /> : null}
      {open === 'recheck' ? <AskRecheckSheet record={row.number} flags={page.flags} onClose={close} /> : null}
      {open === 'setAside' ? <SetAsideSheet record={row.number} structure={row.structure} onClose={close} /> : null}
    </Screen>
  );
}
