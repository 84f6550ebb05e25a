import { View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import Svg, { Circle, Line } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import { bar } from '../theme/tokens';
import { minorTickOffsets } from './axisTicks';
import { PlaceLink } from './PlaceLink';
import type { Place } from './places';

const LINE_Y = 6;

interface BarProps {
  places: readonly Place[];
  current: number | null;
  width: number;
}

/** The bar is the x axis: places are its decades, the current one a point on the line. */
export function Bar({ places, current, width }: BarProps) {
  const { colour } = useTheme();
  const { bottom } = useSafeAreaInsets();
  const step = width / places.length;
  const xOf = (index: number) => step * (index + 0.5);
  return (
    <View role="navigation" aria-label="Places" {...{ dataSet: { noprint: 'true' } }} style={{ height: bar.height + bottom, backgroundColor: colour.ground, flexShrink: 0 }}>
      <Svg width={width} height={20} aria-hidden={true} style={{ position: 'absolute', left: 0, top: 0 }}>
        <Line x1={0} x2={width} y1={LINE_Y} y2={LINE_Y} stroke={colour.tick} strokeWidth={1.5} />
        {minorTickOffsets(places.length, step).map((offset) => (
          <Line key={offset} x1={xOf(0) + offset} x2={xOf(0) + offset} y1={LINE_Y} y2={LINE_Y + bar.minorTick} stroke={colour.tick} strokeWidth={1} />
        ))}
        {places.map((place, index) => (
          <Line key={place.label} x1={xOf(index)} x2={xOf(index)} y1={LINE_Y} y2={LINE_Y + bar.majorTick} stroke={colour.tick} strokeWidth={1.5} />
        ))}
        {current === null ? null : <Circle cx={xOf(current)} cy={LINE_Y} r={bar.pointRadius} fill={colour.cresyl} />}
      </Svg>
      <View style={{ flexDirection: 'row', height: bar.height }}>
        {places.map((place, index) => (
          <PlaceLink
            key={place.label}
            place={place}
            current={index === current}
            fontSize={width < 375 ? 13 : 14}
            style={{ width: step, height: bar.height, flexDirection: 'row', justifyContent: 'center', alignItems: 'flex-start', paddingTop: LINE_Y + 17 }}
          />
        ))}
      </View>
    </View>
  );
}
