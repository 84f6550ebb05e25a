import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { SampleEntry } from '../../shared/contracts/content';
import { massUnits, scaleUpKinds, sides, volumeUnits } from '../../shared/contracts/vocabulary';
import { countingChambers } from '../../shared/domain/chambers';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Disclosure } from '../ui/Disclosure';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';
import { NumberField } from '../ui/TextField';
import { UnitChoice } from '../ui/UnitChoice';
import type { Bench } from './useBench';

/** The colon form is read in two ways; its parts do not break over lines. */
const DILUTION_HINT = 'final ÷ original volume: 5, not 1\u00a0:\u00a05';

const sideWords: Record<(typeof sides)[number], string> = { left: 'left', right: 'right', both: 'both', midline: 'midline', 'not-stated': 'not stated' };
const scaleUpWords: Record<(typeof scaleUpKinds)[number], string> = { none: 'none, as counted', 'other-side': 'to the other side (×2)', 'mass-fraction': 'by a fraction of the mass', 'slab-series': 'from a series of slabs' };

/** Tissue, suspension, chamber, side and scale-up. */
export function SampleFields({ bench }: { bench: Bench }) {
  const { wide } = useBreakpoint();
  const { sample } = bench.entry;
  const { problems } = bench.reading;
  const { setSample } = bench;
  const setScaleUp = (part: Partial<SampleEntry['scaleUp']>) => setSample({ scaleUp: { ...sample.scaleUp, ...part } });
  const needsFactor = sample.scaleUp.kind === 'mass-fraction' || sample.scaleUp.kind === 'slab-series';
  return (
    <Section title="Suspension">
      <View style={{ gap: 14, paddingTop: 12 }}>
        <Pair>
          <NumberField
            label="tissue mass"
            tone="mass"
            grow
            value={sample.tissueMass.text}
            onChangeText={(text) => setSample({ tissueMass: { ...sample.tissueMass, text } })}
            end={<UnitChoice label="unit of the tissue mass" value={sample.tissueMass.unit} units={massUnits} onChange={(unit) => setSample({ tissueMass: { ...sample.tissueMass, unit } })} />}
            hint="of what was dissociated"
            error={problems['tissueMass']}
          />
          <NumberField
            label="suspension volume"
            grow
            value={sample.suspensionVolume.text}
            onChangeText={(text) => setSample({ suspensionVolume: { ...sample.suspensionVolume, text } })}
            end={<UnitChoice label="unit of the suspension volume" value={sample.suspensionVolume.unit} units={volumeUnits} onChange={(unit) => setSample({ suspensionVolume: { ...sample.suspensionVolume, unit } })} />}
            hint="of all nuclei"
            error={problems['suspensionVolume']}
          />
        </Pair>
        <Pair>
          <NumberField label="dilution" grow value={sample.dilution} onChangeText={(dilution) => setSample({ dilution })} hint={DILUTION_HINT} error={problems['dilution']} />
          <Select label="side counted" grow value={sample.side ?? ''} placeholder="choose" options={sides.map((side) => ({ value: side, label: sideWords[side] }))} onChange={(side) => setSample({ side })} />
        </Pair>
        <Pair stacked={!wide}>
          <Select label="counting chamber" grow={wide} value={sample.chamber.key} options={countingChambers.map(({ key, name }) => ({ value: key, label: name }))} onChange={(key) => setSample({ chamber: { ...sample.chamber, key } })} hint={countingChambers.find(({ key }) => key === sample.chamber.key)?.note} />
          {sample.chamber.key === 'other' ? (
            <NumberField
              label="volume of one square"
              grow={wide}
              value={sample.chamber.squareVolume.text}
              onChangeText={(text) => setSample({ chamber: { ...sample.chamber, squareVolume: { ...sample.chamber.squareVolume, text } } })}
              end={<UnitChoice label="unit of the volume of one square" value={sample.chamber.squareVolume.unit} units={volumeUnits} onChange={(unit) => setSample({ chamber: { ...sample.chamber, squareVolume: { ...sample.chamber.squareVolume, unit } } })} />}
              error={problems['chamber.squareVolume']}
            />
          ) : (
            <Select label="scale-up" grow={wide} value={sample.scaleUp.kind} options={scaleUpKinds.map((kind) => ({ value: kind, label: scaleUpWords[kind] }))} onChange={(kind) => setScaleUp({ kind, factor: kind === 'other-side' ? '2' : '1' })} />
          )}
        </Pair>
        {sample.chamber.key === 'other' ? (
          <Select label="scale-up" value={sample.scaleUp.kind} options={scaleUpKinds.map((kind) => ({ value: kind, label: scaleUpWords[kind] }))} onChange={(kind) => setScaleUp({ kind, factor: kind === 'other-side' ? '2' : '1' })} />
        ) : null}
        {problems['scaleUp.kind'] ? (
          <Text role="alert" size="secondary" tone="flagged">
            {problems['scaleUp.kind']}
          </Text>
        ) : null}
        {needsFactor ? (
          <Pair>
            <NumberField label="factor" grow value={sample.scaleUp.factor} onChangeText={(factor) => setScaleUp({ factor })} hint="1 or more" error={problems['scaleUp.factor']} />
            <NumberField label="its standard error" grow value={sample.scaleUp.factorSe} onChangeText={(factorSe) => setScaleUp({ factorSe })} hint="optional" error={problems['scaleUp.factorSe']} />
          </Pair>
        ) : null}
        <Disclosure label="Errors of volume and dilution" note="optional" startsOpen={sample.suspensionVolumeSe.text !== '' || sample.dilutionSe !== ''}>
          <Pair>
            <NumberField
              label="SE of the volume"
              grow
              unit={sample.suspensionVolumeSe.unit}
              value={sample.suspensionVolumeSe.text}
              onChangeText={(text) => setSample({ suspensionVolumeSe: { ...sample.suspensionVolumeSe, text } })}
              hint="shared by all aliquots"
              error={problems['suspensionVolumeSe']}
            />
            <NumberField label="SE of the dilution" grow value={sample.dilutionSe} onChangeText={(dilutionSe) => setSample({ dilutionSe })} hint="shared by all aliquots" error={problems['dilutionSe']} />
          </Pair>
        </Disclosure>
      </View>
    </Section>
  );
}

/** Two fields side by side, of one width. */
function Pair({ children, stacked }: { children: ReactNode; stacked?: boolean }) {
  return <View style={stacked ? { gap: 14 } : { flexDirection: 'row', gap: 16, alignItems: 'flex-start' }}>{children}</View>;
}
