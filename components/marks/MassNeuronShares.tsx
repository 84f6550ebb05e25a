import { View } from 'react-native';
import Svg, { Defs, LinearGradient, Path, Rect, Stop } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import { Span, Text } from '../ui/Text';
import { shareLabel, shareRibbons, type Ribbon, type SharePart } from './shareRibbons';
import { useMeasuredWidth } from './useMeasuredWidth';

const BAR = 6;
const HEIGHT = 136;

/** Which part holds how much of the mass (above) and of the neurons (below); the ribbon between shows how the shares shift. */
export function MassNeuronShares({ parts }: { parts: readonly SharePart[] }) {
  const { colour, name } = useTheme();
  const { width, onLayout } = useMeasuredWidth();
  const ribbons = width > 0 ? shareRibbons(parts, { width, top: BAR, bottom: HEIGHT - BAR, gap: 3 }) : [];
  const shifted = [...parts].sort((a, b) => b.neuronShare - b.massShare - (a.neuronShare - a.massShare))[0];
  const strength = name === 'darkfield' ? 0.42 : 0.3;
  return (
    <View onLayout={onLayout} style={{ gap: 4 }}>
      <Labels ribbons={ribbons} side="top" />
      <Svg width={width || '100%'} height={HEIGHT} aria-hidden={true}>
        <Defs>
          <LinearGradient id="shareRibbon" x1="0" y1="0" x2="0" y2="1">
            <Stop offset="0" stopColor={colour.mass} stopOpacity={strength} />
            <Stop offset="1" stopColor={colour.neurons} stopOpacity={strength} />
          </LinearGradient>
          <LinearGradient id="shareRibbonSoft" x1="0" y1="0" x2="0" y2="1">
            <Stop offset="0" stopColor={colour.mass} stopOpacity={strength / 2} />
            <Stop offset="1" stopColor={colour.neurons} stopOpacity={strength / 2} />
          </LinearGradient>
        </Defs>
        {ribbons.map((ribbon) => (
          <Path key={ribbon.key} d={ribbon.path} fill={ribbon.key === shifted?.key ? 'url(#shareRibbon)' : 'url(#shareRibbonSoft)'} />
        ))}
        {ribbons.map(({ key, top, bottom }) => [
          <Rect key={`${key}-mass`} x={top.from} y={0} width={Math.max(1, top.to - top.from)} height={BAR} fill={colour.mass} />,
          <Rect key={`${key}-neurons`} x={bottom.from} y={HEIGHT - BAR} width={Math.max(1, bottom.to - bottom.from)} height={BAR} fill={colour.neurons} />,
        ])}
      </Svg>
      <Labels ribbons={ribbons} side="bottom" />
      <Text size="secondary" tone="inkSoft">
        <Span tone="mass" weight="semibold">
          mass
        </Span>{' '}
        above,{' '}
        <Span tone="neurons" weight="semibold">
          neurons
        </Span>{' '}
        below
        {shifted ? `: ${percent(shifted.massShare)} of the mass is ${shifted.label}, with ${percent(shifted.neuronShare)} of the neurons.` : '.'}
      </Text>
    </View>
  );
}

function percent(share: number): string {
  return `${Math.round(share * 100)} %`;
}

function Labels({ ribbons, side }: { ribbons: readonly Ribbon[]; side: 'top' | 'bottom' }) {
  return (
    <View style={{ height: 20 }} aria-hidden={true}>
      {ribbons.map((ribbon) => {
        const span = ribbon[side];
        const label = shareLabel(ribbon.label, side === 'top' ? ribbon.massShare : ribbon.neuronShare, span.to - span.from);
        if (!label) return null;
        return (
          <View key={ribbon.key} style={{ position: 'absolute', left: span.from, top: 0 }}>
            <Text size="secondary" nowrap>
              {label.name}
              <Span weight="semibold" tone={side === 'top' ? 'mass' : 'neurons'}>
                {label.share}
              </Span>
            </Text>
          </View>
        );
      })}
    </View>
  );
}
