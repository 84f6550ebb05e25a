import Svg, { Circle, Path } from 'react-native-svg';
import { cladeMark, MARK_PATH_RADIUS, type CladeMarkSpec } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { Row } from '../ui/Row';
import { Span, Text } from '../ui/Text';

interface CladeMarkProps {
  /** Slug or name of the clade. */
  clade: string;
  /** A mark assigned for this view, where clades shown together would share one. */
  spec?: CladeMarkSpec;
  /** Radius in px. */
  radius?: number;
  /** Set aside from the fit. */
  hollow?: boolean;
  ring?: 'flagged' | 'selected';
}

/** A clade's shape in its colour; its name always stands beside it. */
export function CladeMark({ clade, spec = cladeMark(clade), radius = 5, hollow, ring }: CladeMarkProps) {
  const theme = useTheme();
  const reach = ring ? radius * 2.1 + 2 : radius * 1.3 + 1;
  const fill = spec.colour[theme.name];
  return (
    <Svg width={2 * reach} height={2 * reach} viewBox={`${-reach} ${-reach} ${2 * reach} ${2 * reach}`} aria-hidden={true}>
      {ring ? <Circle r={radius * 2.1} fill="none" stroke={ring === 'flagged' ? theme.colour.flagged : theme.colour.cresyl} strokeWidth={2} /> : null}
      <MarkPath spec={spec} radius={radius} x={0} y={0} fill={hollow ? theme.colour.sheet : fill} stroke={hollow ? fill : undefined} />
    </Svg>
  );
}

interface MarkPathProps {
  spec: CladeMarkSpec;
  radius: number;
  x: number;
  y: number;
  fill: string;
  /** Outline, for hollow marks. */
  stroke?: string;
}

/** The mark inside another drawing. */
export function MarkPath({ spec, radius, x, y, fill, stroke }: MarkPathProps) {
  const scale = radius / MARK_PATH_RADIUS;
  return <Path d={spec.path} transform={`translate(${x} ${y}) scale(${scale})`} fill={fill} stroke={stroke} strokeWidth={stroke ? 1.6 / scale : undefined} />;
}

/** Mark, name and, softer, a number of species. */
export function CladeName({ clade, name = clade, count, spec }: { clade: string; name?: string; count?: number | string; spec?: CladeMarkSpec }) {
  return (
    <Row gap={8}>
      <CladeMark clade={clade} spec={spec} />
      <Text size="table" nowrap>
        {name}
        {count === undefined ? null : <Span tone="inkSoft"> {count}</Span>}
      </Text>
    </Row>
  );
}
