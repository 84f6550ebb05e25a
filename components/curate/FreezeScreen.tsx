import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { FreezePreview } from '../../shared/contracts/versions';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { useFreeze, useFreezePreview, useFreezeProgress } from '../queries/curate';
import { errorInWords } from '../queries/errorInWords';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { TextLink } from '../ui/TextLink';
import { VersionExponents } from '../versions/VersionExponents';
import { WhatChanged } from '../versions/WhatChanged';
import { CurateLinks } from './CurateLinks';

/** The next version before it is frozen: what comes, changes and goes, how exponents move; then one confirmation. */
export function FreezeScreen() {
  return (
    <RoleGate title="Freeze" roles={['curator']}>
      <Freeze />
    </RoleGate>
  );
}

function Freeze() {
  const [started, setStarted] = useState<string | null>(null);
  const preview = useFreezePreview();
  const running = preview.data?.underWay?.label ?? null;
  // A freeze found under way is followed to its end, also after the preview has moved on to the next version.
  if (running !== null && started === null) setStarted(running);
  const underWay = started ?? running;
  return (
    <Screen title="Freeze a version" sub="Freezing is for ever: a version can never be changed again, in the database either." actions={<CurateLinks current="freeze" />}>
      {underWay !== null ? (
        <Progress label={underWay} onNext={() => (setStarted(null), void preview.refetch())} />
      ) : (
        <QueryView pending={preview.isPending} error={preview.error ? errorInWords(preview.error) : null} data={preview.data} onRetry={() => void preview.refetch()}>
          {(data) => <Preview preview={data} onStarted={setStarted} />}
        </QueryView>
      )}
    </Screen>
  );
}

function Preview({ preview, onStarted }: { preview: FreezePreview; onStarted: (label: string) => void }) {
  const { sideBySide } = useBreakpoint();
  const { changes } = preview;
  const nothing = changes.came.length + changes.revised.length + changes.went.length + changes.setAside.length === 0;
  return (
    <>
      <View style={{ gap: 6 }}>
        <Text science weight="semibold" style={{ fontSize: 19, lineHeight: 26 }}>
          {preview.title}
        </Text>
        <Text>{`${preview.records} records of ${preview.species} species`}</Text>
        {preview.demonstration ? <DemoMark words="It holds demonstration records: its title, its page and every file will say so." /> : null}
        {nothing ? <Text>Nothing has changed since the current version: there is nothing to freeze.</Text> : null}
      </View>
      {preview.warnings.length > 0 ? (
        <Section title="Warnings" look="small">
          {preview.warnings.map((warning) => (
            <View key={warning} style={{ paddingVertical: 6 }}>
              <StateSign state="doubtful" words={warning} />
            </View>
          ))}
        </Section>
      ) : null}
      <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: 40 }}>
        <View style={{ flex: sideBySide ? 1.4 : undefined, minWidth: 0 }}>
          <VersionExponents fits={preview.exponents} label={preview.label} previous={changes.previous} />
        </View>
        <View style={{ flex: sideBySide ? 1 : undefined, minWidth: 0, gap: 24 }}>
          <WhatChanged changes={changes} />
          <Waiting title="Under embargo, not in it" rows={preview.embargoed.map((row) => ({ key: row.number, text: `${row.number} ${row.species}, ${row.structure.replaceAll('_', ' ')}, until ${row.until}` }))} />
          <Waiting title="In it with an open re-check" rows={preview.openRechecks.map((row) => ({ key: row.number, text: `${row.number} ${row.species}, ${row.structure.replaceAll('_', ' ')}` }))} />
        </View>
      </View>
      {nothing ? null : <FreezeForm preview={preview} onStarted={onStarted} />}
    </>
  );
}

function Waiting({ title, rows }: { title: string; rows: readonly { key: string; text: string }[] }) {
  if (rows.length === 0) return null;
  return (
    <Section title={title} look="small">
      {rows.map((row) => (
        <Text key={row.key} size="table" style={{ paddingVertical: 4 }}>
          {row.text}
        </Text>
      ))}
    </Section>
  );
}

function FreezeForm({ preview, onStarted }: { preview: FreezePreview; onStarted: (label: string) => void }) {
  const [label, setLabel] = useState('');
  const [note, setNote] = useState('');
  const [asking, setAsking] = useState(false);
  const freeze = useFreeze();
  const matches = label.trim() === preview.label;
  const send = () => freeze.mutate({ label: label.trim(), note }, { onSuccess: (progress) => onStarted(progress.label), onSettled: () => setAsking(false) });
  return (
    <Section title={`Freeze version ${preview.label}`}>
      <View style={{ gap: 12, paddingTop: 12, maxWidth: 560 }}>
        <TextField label="Note for the version's page" value={note} onChangeText={setNote} rows={2} maxLength={4000} hint="Optional; frozen with it." />
        <TextField label="Number of the version" value={label} onChangeText={setLabel} inputMode="numeric" hint={`Type ${preview.label} to confirm that this is the version you looked at.`} error={label !== '' && !matches ? `The version you looked at is ${preview.label}.` : undefined} />
        <Row>
          <Button kind="primary" label={`Freeze version ${preview.label}`} disabled={!matches} onPress={() => setAsking(true)} />
        </Row>
        {freeze.error ? (
          <Text role="alert" tone="flagged">
            {`${errorInWords(freeze.error).title} ${errorInWords(freeze.error).text}`}
          </Text>
        ) : null}
      </View>
      <ConfirmDialog open={asking} kind="primary" question={`Freeze version ${preview.label}?`} consequence={`${preview.records} records of ${preview.species} species become version ${preview.label}, for ever. Contributors whose records come in are told.`} confirmLabel="Freeze it" cancelLabel="Not yet" working={freeze.isPending} onConfirm={send} onCancel={() => setAsking(false)} />
    </Section>
  );
}

function Progress({ label, onNext }: { label: string; onNext: () => void }) {
  const progress = useFreezeProgress(true);
  const done = progress.data?.status === 'frozen' && progress.data.label === label;
  return (
    <Section title={done ? `Version ${label} is frozen` : `Version ${label} is being frozen`}>
      <View role="status" style={{ paddingTop: 10, gap: 4 }}>
        {(progress.data?.steps ?? []).map((step) => (
          <Text key={`${step.step}${step.at}`} size="table">
            {`${timeText(step.at)}  ${step.step.replaceAll('-', ' ')}${step.detail ? `: ${step.detail}` : ''}`}
          </Text>
        ))}
        {done ? null : <Text size="table" tone="inkSoft">You may leave this page; a notice tells you when it is done.</Text>}
        {progress.error ? <Text tone="flagged">{errorInWords(progress.error).text}</Text> : null}
      </View>
      {done ? (
        <Row gap={16} style={{ paddingTop: 12 }}>
          <Button kind="primary" label={`Open version ${label}`} href={`/versions/${label}` as Href} />
          <Button label="Look at the next one" onPress={onNext} />
        </Row>
      ) : (
        <View style={{ paddingTop: 12 }}>
          <TextLink href={'/curate' as Href}>What waits</TextLink>
        </View>
      )}
    </Section>
  );
}
