import { View } from 'react-native';
import type { Tone } from '../theme/tokens';
import type { TextSize } from '../theme/typography';
import { Sign, type SignName } from '../ui/Sign';
import { Text } from '../ui/Text';

const looks: Readonly<Record<string, { sign: SignName; tone: Tone }>> = {
  draft: { sign: 'pencil', tone: 'inkSoft' },
  submitted: { sign: 'clock', tone: 'waiting' },
  'changes requested': { sign: 'ring', tone: 'flagged' },
  approved: { sign: 'check', tone: 'settled' },
  declined: { sign: 'cross', tone: 'flagged' },
  withdrawn: { sign: 'dash', tone: 'inkSoft' },
  'kept here': { sign: 'bar', tone: 'waiting' },
  sent: { sign: 'check', tone: 'settled' },
  flagged: { sign: 'ring', tone: 'flagged' },
  doubtful: { sign: 'ring', tone: 'flagged' },
  impossible: { sign: 'cross', tone: 'flagged' },
  'set aside': { sign: 'dash', tone: 'inkSoft' },
  embargoed: { sign: 'clock', tone: 'waiting' },
  'under embargo': { sign: 'clock', tone: 'waiting' },
  open: { sign: 'clock', tone: 'waiting' },
  're-check open': { sign: 'clock', tone: 'waiting' },
  answered: { sign: 'check', tone: 'settled' },
  confirmed: { sign: 'check', tone: 'settled' },
  corrected: { sign: 'check', tone: 'settled' },
  closed: { sign: 'check', tone: 'settled' },
  'to review': { sign: 'clock', tone: 'waiting' },
  frozen: { sign: 'check', tone: 'settled' },
  verified: { sign: 'check', tone: 'settled' },
};

interface StateSignProps {
  /** The state's word; hyphens of codes become spaces. An unknown word gets the clock. */
  state: string;
  /** Other words than the state's own: "kept 14:36". */
  words?: string;
  size?: TextSize;
}

/** A state: always its sign and its word. */
export function StateSign({ state, words, size = 'table' }: StateSignProps) {
  const word = state === 're-check open' ? state : state.replace(/-/g, ' ');
  const { sign, tone } = looks[word] ?? { sign: 'clock', tone: 'waiting' };
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
      <Sign name={sign} tone={tone} />
      <Text size={size} weight="semibold" tone={tone}>
        {words ?? word}
      </Text>
    </View>
  );
}
