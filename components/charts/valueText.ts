import { formatQuantity } from '../../shared/domain/quantityText';
import type { FigureAxis, PlacedPoint } from './figureTypes';

/** A value as it stands on its axis, three digits: "2.58 g", "1.05 × 10⁸". */
export function axisValueText(value: number, axis: FigureAxis): string {
  return formatQuantity({ value: Number(value.toPrecision(3)), kind: axis.kind, unit: axis.unit ?? '' })?.text ?? '–';
}

/** What a screen reader hears of a point. */
export function spokenPoint(point: PlacedPoint, x: FigureAxis, y: FigureAxis): string {
  const state = [point.flag ? (point.note ?? 'flagged') : null, point.setAside ? 'set aside' : null].filter(Boolean);
  return `${[point.label, point.group.label, ...state].join(', ')}: ${y.label} ${axisValueText(point.y, y)}, ${x.label} ${axisValueText(point.x, x)}`;
}
