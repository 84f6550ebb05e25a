import { useMemo, type ReactNode } from 'react';
import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { useBreakpoint } from '../layout/useBreakpoint';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { Button } from '../ui/Button';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { VisuallyHidden } from '../ui/VisuallyHidden';
import { ExponentsTable } from './ExponentsTable';
import { findSpecies, flaggedSpecies, type CladeResult } from './figureGroups';
import { FigureCaptionLines, FigurePart } from './FigurePart';
import { LinesInFull } from './LinesInFull';
import { NoLine } from './NoLine';
import { PointsTable } from './PointsTable';
import type { ScalingChoice } from './scalingChoice';
import { SelectedRow } from './SelectedRow';
import { Remarks, Sentences } from './Sentences';
import { SpeciesPanel } from './SpeciesPanel';
import { axisOf } from './variables';

interface ScalingViewProps {
  answer: ScalingAnswer;
  results: readonly CladeResult[];
  marks: ReadonlyMap<string, CladeMarkSpec>;
  choice: ScalingChoice;
  change: (part: Partial<ScalingChoice>) => void;
  choices: ReactNode;
  /** Another answer is on the way. */
  busy: boolean;
  drawn: boolean;
}

const MOST_PANELS = 6;

/** Choices, figure and numbers: side by side from 1200 px, numbers below from 900, one column on a phone. */
export function ScalingView({ answer, results, marks, choice, change, choices, busy, drawn }: ScalingViewProps) {
  const { wide, sideBySide } = useBreakpoint();
  const { question } = answer;
  const x = useMemo(() => axisOf(question.x, question.xStructure), [question.x, question.xStructure]);
  const y = useMemo(() => axisOf(question.y, question.yStructure), [question.y, question.yStructure]);
  const selected = findSpecies(results, choice.species);
  const level = question.level;

  const figure = drawn ? <FigurePart answer={answer} results={results} choice={choice} change={change} x={x} y={y} /> : <NoLine answer={answer} change={change} />;
  const caption = <FigureCaptionLines answer={answer} results={results} x={x} y={y} />;
  const exponents = <ExponentsTable results={results} marks={marks} level={level} />;
  const panels = <Panels results={results} marks={marks} x={x} y={y} level={level} choice={choice} change={change} hideSelected={!wide} />;
  const lines = <LinesInFull results={results} marks={marks} x={x} />;
  const remarks =
    answer.remarks.length > 0 ? (
      <Section title="Remarks">
        <View style={{ paddingTop: 10 }}>
          <Remarks answer={answer} />
        </View>
      </Section>
    ) : null;
  const points = drawn ? <PointsTable results={results} marks={marks} x={x} y={y} selected={choice.species} /> : null;
  const status = <VisuallyHidden live>{busy ? 'The fit is on its way.' : ''}</VisuallyHidden>;
  const dim = { opacity: busy ? 0.55 : 1 };

  if (!wide) {
    return (
      <View style={[{ gap: 20 }, dim]} aria-busy={busy}>
        {status}
        {drawn ? (
          <>
            <View style={{ marginTop: -14 }}>
              {figure}
              <SelectedRow found={selected} marks={marks} level={level} />
              {exponents}
            </View>
            <Sentences answer={answer} marks={marks} />
            {caption}
            {panels}
            {lines}
            {remarks}
            {points}
          </>
        ) : (
          figure
        )}
      </View>
    );
  }
  const numbers = (
    <>
      {exponents}
      <Sentences answer={answer} marks={marks} />
      {panels}
      {sideBySide ? null : lines}
      {remarks}
    </>
  );
  return (
    <View style={{ gap: 32 }} aria-busy={busy}>
      {status}
      <View style={{ flexDirection: 'row', gap: 20, alignItems: 'flex-start' }}>
        <View style={{ width: 196, flexShrink: 0 }}>{choices}</View>
        <View style={[{ flex: 500, minWidth: 0, gap: 12 }, dim]}>
          {figure}
          {drawn ? caption : null}
          {sideBySide && drawn ? <View style={{ paddingTop: 20 }}>{lines}</View> : null}
        </View>
        {sideBySide && drawn ? <View style={[{ flex: 472, minWidth: 0, gap: 20, paddingLeft: 16 }, dim]}>{numbers}</View> : null}
      </View>
      {sideBySide || !drawn ? null : <View style={[{ gap: 20 }, dim]}>{numbers}</View>}
      {points}
    </View>
  );
}

type PanelsProps = Pick<ScalingViewProps, 'results' | 'marks' | 'choice' | 'change'> & { x: ReturnType<typeof axisOf>; y: ReturnType<typeof axisOf>; level: number; hideSelected: boolean };

/** The selected species, then every flagged one, furthest off the line first, then those set aside. */
function Panels({ results, marks, x, y, level, choice, change, hideSelected }: PanelsProps) {
  const selected = findSpecies(results, choice.species);
  const flagged = flaggedSpecies(results);
  const aside = results.flatMap((result) => result.aside.map((species) => ({ result, species, point: null })));
  const others = [...flagged, ...aside].filter(({ species }) => species.slug !== selected?.species.slug);
  const shared = { marks, x, y, level, choice, change };
  const toLeaveOut = flagged.map(({ species }) => species.slug);
  if (!selected && others.length === 0) {
    return (
      <Text size="secondary" tone="inkSoft">
        No species is flagged. Choose a point of the figure to see its place on the line.
      </Text>
    );
  }
  return (
    <View>
      {selected ? <SpeciesPanel key={`selected ${selected.species.slug}`} found={selected} selected {...shared} /> : null}
      {!selected && !hideSelected ? (
        <Text size="secondary" tone="inkSoft" style={{ paddingBottom: 8 }}>
          Choose a point of the figure to see its place on the line.
        </Text>
      ) : null}
      {others.slice(0, MOST_PANELS).map((found) => (
        <SpeciesPanel key={`${found.result.slug} ${found.species.slug}`} found={found} selected={false} {...shared} />
      ))}
      {others.length > MOST_PANELS ? (
        <Text size="secondary" tone="inkSoft">{`${others.length - MOST_PANELS} more are flagged or set aside: see the figure’s numbers.`}</Text>
      ) : null}
      {toLeaveOut.length > 0 ? (
        <Row>
          <Button kind="quiet" label="Fit without the flagged" onPress={() => change({ without: [...new Set([...choice.without, ...toLeaveOut])] })} style={{ marginLeft: -8 }} />
        </Row>
      ) : null}
    </View>
  );
}
