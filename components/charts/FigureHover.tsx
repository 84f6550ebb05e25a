import { View } from 'react-native';
import Svg, { Circle } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import { figure, radius as corner } from '../theme/tokens';
import { Text } from '../ui/Text';
import type { FigureAxis, PlacedPoint } from './figureTypes';
import type { Frame } from './logScale';
import { axisValueText } from './valueText';

interface FigureHoverProps {
  frame: Frame;
  width: number;
  height: number;
  point: PlacedPoint;
  x: FigureAxis;
  y: FigureAxis;
  radius: number;
}

const BOX = 210;

/** What the pointer or the keyboard is at: a ring and the species with its two values. Not part of the saved figure. */
export function FigureHover({ frame, width, height, point, x, y, radius }: FigureHoverProps) {
  const { colour } = useTheme();
  const left = point.px + BOX + 20 > frame.left + frame.width ? Math.max(0, point.px - BOX - 14) : point.px + 14;
  const top = Math.min(Math.max(0, point.py - 70), height - 80);
  return (
    <View style={{ position: 'absolute', left: 0, top: 0, width, height, pointerEvents: 'none' }} aria-hidden={true}>
      <Svg width={width} height={height} style={{ position: 'absolute' }}>
        <Circle cx={point.px} cy={point.py} r={radius + figure.selectedRing} fill="none" stroke={colour.cresyl} strokeWidth={1.5} />
      </Svg>
      <View style={{ position: 'absolute', left, top, maxWidth: BOX, paddingHorizontal: 10, paddingVertical: 6, backgroundColor: colour.sheet, borderWidth: 1, borderColor: colour.tick, borderRadius: corner.control }}>
        <Text size="table" italic>
          {point.label}
        </Text>
        <Text size="least" tone="inkSoft">
          {[point.group.label, point.flag ? (point.note ?? 'flagged') : null, point.setAside ? 'set aside' : null].filter(Boolean).join(', ')}
        </Text>
        <Text size="least" tone={y.tone}>
          {axisValueText(point.y, y)}
          {y.unit ? '' : ` ${y.label}`}
        </Text>
        <Text size="least" tone={x.tone}>
          {axisValueText(point.x, x)}
          {x.unit ? '' : ` ${x.label}`}
        </Text>
      </View>
    </View>
  );
}
