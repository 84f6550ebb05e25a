import { Link } from 'expo-router';
import { Pressable, Text as NativeText, View } from 'react-native';
import Svg, { Circle, Line } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import { rail } from '../theme/tokens';
import { fontFamily } from '../theme/typography';
import { AccountBlock } from './AccountBlock';
import { minorTickOffsets } from './axisTicks';
import { PlaceLink } from './PlaceLink';
import type { Place } from './places';

const LABEL_END = 26;

interface RailProps {
  places: readonly Place[];
  current: number | null;
  height: number;
}

/** The rail is the y axis: places are its decades, labels to the left of the line, the current place a point on it. */
export function Rail({ places, current, height }: RailProps) {
  const { colour } = useTheme();
  const axis = rail.width - 1;
  const yOf = (index: number) => rail.firstTick + index * rail.step;
  const last = yOf(places.length - 1);
  return (
    <View role="banner" {...{ dataSet: { noprint: 'true' } }} style={{ width: rail.width, height, flexShrink: 0, zIndex: 1 }}>
      <Svg width={rail.width + 8} height={height} aria-hidden={true} style={{ position: 'absolute', left: 0, top: 0 }}>
        <Line x1={axis} x2={axis} y1={0} y2={height} stroke={colour.tick} strokeWidth={1.5} />
        {minorTickOffsets(places.length, rail.step).map((offset) => (
          <Line key={offset} x1={axis - rail.minorTick} x2={axis} y1={last - offset} y2={last - offset} stroke={colour.tick} strokeWidth={1} />
        ))}
        {places.map((place, index) => (
          <Line key={place.label} x1={axis - rail.majorTick} x2={axis} y1={yOf(index)} y2={yOf(index)} stroke={colour.tick} strokeWidth={1.5} />
        ))}
        {current === null ? null : <Circle cx={axis} cy={yOf(current)} r={rail.pointRadius} fill={colour.cresyl} />}
      </Svg>
      <Link href="/" asChild>
        <Pressable role="link" aria-label="Allokarya, to the register" style={{ position: 'absolute', right: LABEL_END, top: 22, minHeight: 40, justifyContent: 'center' }}>
          <NativeText style={{ fontFamily: fontFamily('lora'), fontSize: 22, lineHeight: 28, color: colour.ink }}>Allokarya</NativeText>
        </Pressable>
      </Link>
      <View role="navigation" aria-label="Places">
        {places.map((place, index) => (
          <PlaceLink
            key={place.label}
            place={place}
            current={index === current}
            fontSize={16}
            style={{ position: 'absolute', right: LABEL_END, top: yOf(index) - 20, height: 40, flexDirection: 'row', alignItems: place.waiting > 0 ? 'flex-start' : 'center', paddingTop: place.waiting > 0 ? 8 : 0 }}
          />
        ))}
      </View>
      <AccountBlock style={{ position: 'absolute', right: LABEL_END, bottom: 24, left: 8, alignItems: 'flex-end' }} />
    </View>
  );
}
