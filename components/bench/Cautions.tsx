import { useState } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Button } from '../ui/Button';
import { Heading } from '../ui/Heading';
import { Span, Text } from '../ui/Text';
import { recallCautionsRead, rememberCautionsRead } from './keptBench';

const cautions: readonly { first: string; rest: string }[] = [
  { first: 'Paraformaldehyde and DAPI are hazardous.', rest: 'Work under a hood, in gloves and eye protection, and keep their waste apart.' },
  { first: 'Glass homogenisers break.', rest: 'Turn without force, in cut-resistant gloves.' },
  { first: 'UV lamps harm eyes and skin.', rest: 'Close the shutter and keep the shield in place.' },
  { first: 'Never touch the phone with gloves that met tissue, DAPI or fixative.', rest: 'Change them, or bag the phone.' },
  { first: 'Macaque, bat, carnivore and human tissue:', rest: 'the laboratory’s biosafety rules and trained staff prevail over anything written here.' },
  { first: 'Estimates are for research,', rest: 'not for diagnosis.' },
];

/** What can harm at this bench: in full until it is marked as read on this device, then folded to one line. */
export function Cautions() {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const [open, setOpen] = useState(() => !recallCautionsRead());
  const frame = { borderWidth: 1, borderColor: colour.hairline, borderLeftWidth: 4, borderLeftColor: colour.waiting, borderRadius: radius.control, backgroundColor: colour.sheet, paddingHorizontal: 16 } as const;
  if (!open) {
    return (
      <View role="region" aria-label="Cautions" style={[frame, { paddingVertical: 4, flexDirection: 'row', alignItems: 'center', gap: 10 }]}>
        <View style={{ flex: 1, minWidth: 0 }}>
          <Text size="secondary">
            <Span weight="semibold" tone="waiting">
              Cautions:
            </Span>{' '}
            paraformaldehyde, DAPI, glass, UV; no used gloves on the phone.
          </Text>
        </View>
        <Button kind="quiet" label="Show" spokenLabel="Show the cautions" expanded={false} onPress={() => setOpen(true)} style={{ marginRight: -8 }} />
      </View>
    );
  }
  return (
    <View role="region" aria-label="Cautions" style={[frame, { paddingVertical: 14, gap: 10 }]}>
      <Heading level={2} look="small" tone="waiting">
        Before you count
      </Heading>
      <View role="list" style={{ gap: 6, flexDirection: wide ? 'row' : 'column', flexWrap: wide ? 'wrap' : 'nowrap' }}>
        {cautions.map(({ first, rest }) => (
          <View key={first} role="listitem" style={wide ? { width: '48%', paddingRight: 16 } : undefined}>
            <Text size="table">
              <Span weight="semibold">{first}</Span> {rest}
            </Text>
          </View>
        ))}
      </View>
      <Button
        label="I have read this"
        onPress={() => {
          rememberCautionsRead();
          setOpen(false);
        }}
        style={{ alignSelf: 'flex-start' }}
      />
    </View>
  );
}
