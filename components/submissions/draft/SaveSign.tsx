import { View } from 'react-native';
import { StateSign } from '../../marks/StateSign';
import { Button } from '../../ui/Button';
import { Notice } from '../../ui/Notice';
import { Text } from '../../ui/Text';
import type { DraftSaver, SaveState } from './DraftSaver';

const clock = (iso: string): string => {
  const time = new Date(iso);
  return `${String(time.getHours()).padStart(2, '0')}:${String(time.getMinutes()).padStart(2, '0')}`;
};

/** Where the newest typing is: kept at the register, or here and not yet sent. */
export function SaveSign({ state }: { state: SaveState }) {
  return (
    <View role="status" aria-live="polite">
      {state.kind === 'kept' ? <StateSign state={state.at === null ? 'draft' : 'sent'} words={state.at === null ? 'draft' : `kept ${clock(state.at)}`} size="secondary" /> : null}
      {state.kind === 'here' ? <StateSign state="kept here" words={state.offline ? 'kept here, not yet sent' : 'keeping'} size="secondary" /> : null}
      {state.kind === 'refused' || state.kind === 'stale' ? <StateSign state="kept here" words="kept here, not sent" size="secondary" /> : null}
    </View>
  );
}

/** What stands in the way of keeping the draft at the register, and the choice where two states exist. */
export function SaveTrouble({ state, saver }: { state: SaveState; saver: DraftSaver }) {
  if (state.kind === 'here' && state.offline) {
    return (
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 10 }}>
        <Text size="secondary" style={{ flexShrink: 1 }}>
          The register does not answer. Go on; what you type is kept on this device and sent when it returns.
        </Text>
        <Button kind="quiet" label="Send now" onPress={saver.retry} style={{ marginVertical: -6 }} />
      </View>
    );
  }
  if (state.kind === 'refused') {
    return <Notice tone="flagged" title={state.title} text={`${state.text} What you typed is kept on this device.`} action={{ label: 'Send again', onPress: saver.retry }} />;
  }
  if (state.kind !== 'stale') return null;
  return (
    <View style={{ gap: 8 }} role="alert">
      <Notice tone="flagged" title="This draft was changed elsewhere" text="Both states are kept: yours here, the newer one at the register. Choose which goes on." />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button label="Use the newer state" onPress={saver.takeNewer} grow />
        <Button label="Keep mine (send it)" onPress={saver.keepMine} grow />
      </View>
    </View>
  );
}
