import { MarkPath } from '../marks/CladeMark';
import type { FigureMarkProps } from './figureMarkProps';

/** A point of the figure, drawn by the chart at its place. */
export function FigureMark({ x = 0, y = 0, datum, look }: FigureMarkProps) {
  if (!datum || !look) return null;
  const { spec, radius, fill, stroke } = look(datum.point);
  return <MarkPath spec={spec} radius={radius} x={x} y={y} fill={fill} stroke={stroke} />;
}
