import { MARK_PATH_RADIUS } from '../theme/cladeMarks';
import type { FigureMarkProps } from './figureMarkProps';
import { pointKey } from './keyboard';

/** A point of the figure: named, reached by Tab and the arrow keys, chosen by Enter. */
export function FigureMark({ x = 0, y = 0, datum, look, idPrefix, activeKey, onFocusPoint, onKey }: FigureMarkProps) {
  if (!datum || !look) return null;
  const { point } = datum;
  const { spec, radius, fill, stroke, outline, spoken } = look(point);
  const scale = radius / MARK_PATH_RADIUS;
  const key = pointKey(point);
  return (
    <path
      id={`${idPrefix}${key}`}
      d={spec.path}
      transform={`translate(${x} ${y}) scale(${scale})`}
      fill={fill}
      stroke={stroke ?? outline}
      strokeWidth={(stroke ? 1.6 : 1) / scale}
      paintOrder={stroke ? undefined : 'stroke'}
      role="img"
      tabIndex={key === activeKey ? 0 : -1}
      aria-label={spoken}
      style={{ outline: 'none' }}
      onFocus={() => onFocusPoint?.(point)}
      onBlur={() => onFocusPoint?.(null)}
      onKeyDown={(event) => {
        if (onKey?.(event.key, point)) event.preventDefault();
      }}
    />
  );
}
