import { useCallback, useId, useMemo, useState } from 'react';
import { View } from 'react-native';
import { assignCladeMarks } from '../theme/cladeMarks';
import { useTheme } from '../theme/ThemeProvider';
import { figure } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { FigureChart } from './FigureChart';
import { FigureHover } from './FigureHover';
import { figureFrame, obstaclesOf, placeDiagonals, placeFigureLabels, placePoints } from './figureLayout';
import { FigureSurface } from './FigureSurface';
import type { FigureAxis, FigureGroup, PlacedPoint } from './figureTypes';
import { nearestIndex, type XY } from './geometry';
import { nextPoint, pointKey } from './keyboard';

export interface ScalingFigureProps {
  /** Name of the figure for a screen reader and the saved file. */
  title: string;
  x: FigureAxis;
  y: FigureAxis;
  groups: readonly FigureGroup[];
  showConfidence: boolean;
  showPrediction: boolean;
  /** Lines of constant density, where the pair has that meaning. */
  diagonals: 'per-mg' | null;
  /** Id of the selected point (a species). */
  selectedId: string | null;
  onSelect: (id: string | null) => void;
  width: number;
  /** Without it: the height at which both ranges fill the width. */
  height?: number;
  /** Id of the element around the drawing, for `saveFigure`. */
  elementId?: string;
}

const HIT_RADIUS = 30;

function marginsFor(wide: boolean) {
  return wide ? { left: 62, right: 10, top: 30, bottom: 66 } : { left: 58, right: 6, top: 28, bottom: 60 };
}

/** A log–log figure of stored fits: points per clade, line and bands over the clade's own range, a decade equally long on both axes. */
export function ScalingFigure(props: ScalingFigureProps) {
  const { title, x, y, groups, showConfidence, showPrediction, diagonals, selectedId, onSelect, width, height: wanted, elementId } = props;
  const { wide } = useBreakpoint();
  const { name } = useTheme();
  const idPrefix = `${useId()}point-`;
  const [hovered, setHovered] = useState<string | null>(null);
  const [visited, setVisited] = useState<string | null>(null);
  const radius = wide ? figure.markRadiusWide : figure.markRadiusPhone;
  const fontSize = wide ? 15 : 14;

  const layout = useMemo(() => {
    const { frame, height } = figureFrame(groups, width, wanted, marginsFor(wide));
    const points = placePoints(groups, frame);
    const labels = placeFigureLabels(groups, points, frame, { fontSize, wide, radius });
    const what = [x, y].find((axis) => axis.kind === 'count')?.variable === 'cells' ? 'cells' : 'neurons';
    const lines = diagonals === null ? [] : placeDiagonals(frame, points, x.variable, y.variable, what, obstaclesOf(points, labels, groups, frame), wide);
    return { frame, height, points, labels, diagonals: lines, specs: assignCladeMarks(groups.map((group) => group.key)) };
  }, [groups, width, wanted, wide, fontSize, radius, x, y, diagonals]);

  const { points, frame, height } = layout;
  const places = useMemo(() => points.map((point): XY => ({ x: point.px, y: point.py })), [points]);
  const pointAt = (place: XY): PlacedPoint | null => {
    const index = nearestIndex(places, place, HIT_RADIUS);
    return index === null ? null : (points[index] ?? null);
  };
  const selected = points.find((point) => point.id === selectedId) ?? null;
  const entry = points.find((point) => pointKey(point) === visited) ?? selected ?? points[0] ?? null;
  const shown = points.find((point) => pointKey(point) === hovered) ?? null;

  // Stable, so that the drawing does not repeat itself while the pointer moves over it.
  const onFocusPoint = useCallback((point: PlacedPoint | null) => setHovered(point ? pointKey(point) : null), []);
  const onKey = useCallback(
    (key: string, point: PlacedPoint): boolean => {
      if (key === 'Enter' || key === ' ') {
        onSelect(point.id);
        return true;
      }
      if (key === 'Escape') {
        onSelect(null);
        return true;
      }
      const next = nextPoint(points, point, key);
      if (!next) return false;
      setVisited(pointKey(next));
      focusPoint(idPrefix + pointKey(next));
      return true;
    },
    [points, onSelect, idPrefix],
  );

  return (
    <View id={elementId}>
      <FigureSurface
        width={width}
        height={height}
        onHover={(place) => {
          const point = place ? pointAt(place) : null;
          setHovered(point ? pointKey(point) : null);
        }}
        onTap={(place) => onSelect(pointAt(place)?.id ?? null)}
      >
        <FigureChart
          title={title}
          x={x}
          y={y}
          groups={groups}
          showConfidence={showConfidence}
          showPrediction={showPrediction}
          width={width}
          layout={layout}
          height={height}
          radius={radius}
          fontSize={fontSize}
          themeName={name}
          selected={selected}
          idPrefix={idPrefix}
          activeKey={entry ? pointKey(entry) : null}
          onFocusPoint={onFocusPoint}
          onKey={onKey}
        />
        {shown ? <FigureHover frame={frame} width={width} height={height} point={shown} x={x} y={y} radius={radius} /> : null}
      </FigureSurface>
    </View>
  );
}

function focusPoint(id: string): void {
  if (typeof document === 'undefined') return;
  const element = document.getElementById(id);
  element?.focus();
}
