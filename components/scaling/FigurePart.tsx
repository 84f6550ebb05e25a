import { useMemo } from 'react';
import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { densityRange } from '../charts/geometry';
import type { FigureAxis, FigureGroup } from '../charts/figureTypes';
import { ScalingFigure } from '../charts/ScalingFigure';
import { dayText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { DemoMark } from '../marks/DemoMark';
import { useMeasuredWidth } from '../marks/useMeasuredWidth';
import { VersionLine } from '../marks/VersionStamp';
import { useVersions } from '../queries/versions';
import { SkeletonBlock } from '../ui/Skeleton';
import { Text } from '../ui/Text';
import { countsLine } from './caption';
import { figureGroups, type CladeResult } from './figureGroups';
import type { ScalingChoice } from './scalingChoice';
import { questionTitle } from './variables';

export const FIGURE_ID = 'scaling-figure';
/** On a phone figure, selected row, exponents and acts stand on one screen. */
const PHONE_HEIGHT = 392;

interface FigurePartProps {
  answer: ScalingAnswer;
  results: readonly CladeResult[];
  choice: ScalingChoice;
  change: (part: Partial<ScalingChoice>) => void;
  x: FigureAxis;
  y: FigureAxis;
}

/** Whether the pair of axes has lines of constant density. */
export function hasDiagonals(groups: readonly FigureGroup[], x: FigureAxis, y: FigureAxis, question: ScalingAnswer['question']): boolean {
  return question.xStructure === question.yStructure && densityRange(groups.flatMap(({ points }) => points), x.variable, y.variable) !== null;
}

/** The figure in the width it has. */
export function FigurePart({ answer, results, choice, change, x, y }: FigurePartProps) {
  const { wide } = useBreakpoint();
  const { width, onLayout } = useMeasuredWidth();
  const groups = useMemo(() => figureGroups(results), [results]);
  const diagonals = hasDiagonals(groups, x, y, answer.question);
  const height = wide ? undefined : PHONE_HEIGHT;
  return (
    <View onLayout={onLayout} style={{ minHeight: height ?? 420 }}>
      {width > 0 ? (
        <ScalingFigure
          elementId={FIGURE_ID}
          title={questionTitle(answer.question)}
          x={x}
          y={y}
          groups={groups}
          showConfidence={choice.confidence}
          showPrediction={choice.prediction}
          diagonals={diagonals ? 'per-mg' : null}
          selectedId={choice.species}
          onSelect={(species) => change({ species })}
          width={width}
          height={height}
        />
      ) : (
        <SkeletonBlock height={height ?? 420} />
      )}
    </View>
  );
}

/** Under the figure: how many species, what hollow and dotted mean, and the version shown. */
export function FigureCaptionLines({ answer, results, x, y }: Pick<FigurePartProps, 'answer' | 'results' | 'x' | 'y'>) {
  const versions = useVersions();
  const version = versions.data?.items.find(({ label }) => label === answer.version);
  const groups = useMemo(() => figureGroups(results), [results]);
  return (
    <View style={{ gap: 4 }}>
      <Text science size="secondary" tone="inkSoft">
        {countsLine(results, hasDiagonals(groups, x, y, answer.question))}
      </Text>
      {answer.demonstration ? <DemoMark /> : null}
      {answer.version === 'working' ? (
        <Text size="secondary" tone="waiting">
          Working set: approved, not yet frozen. It changes and cannot be cited.
        </Text>
      ) : version ? (
        <VersionLine label={version.label} doi={version.doi} frozen={dayText(version.frozenAt)} />
      ) : (
        <Text size="secondary" tone="inkSoft">{`version ${answer.version}`}</Text>
      )}
    </View>
  );
}
