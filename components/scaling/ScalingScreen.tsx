import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { useAccount } from '../queries/account';
import { errorInWords, fieldErrorsOf } from '../queries/errorInWords';
import { useScaling } from '../queries/scaling';
import { assignCladeMarks } from '../theme/cladeMarks';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { ErrorState } from '../ui/Message';
import { Skeleton, SkeletonBlock } from '../ui/Skeleton';
import { methodWords } from './caption';
import { Choices } from './Choices';
import { CiteFitSheet } from './CiteFitSheet';
import { cladeResults, figureGroups } from './figureGroups';
import { FIGURE_ID, hasDiagonals } from './FigurePart';
import { SaveSheet, saveTable } from './SaveSheet';
import { queryOf } from './scalingChoice';
import { ScalingView } from './ScalingView';
import { useScalingChoice } from './useScalingChoice';
import { axisOf, questionTitle, shortTitle } from './variables';

type OpenSheet = 'choices' | 'save' | 'cite' | null;

/** Exponents of one variable on another, clade by clade: the choice stands in the address. */
export function ScalingScreen() {
  const { choice, change } = useScalingChoice();
  const { wide } = useBreakpoint();
  const account = useAccount();
  const [open, setOpen] = useState<OpenSheet>(null);
  const close = () => setOpen(null);
  const asksWorking = choice.working && (account.status !== 'in' || account.roles.includes('reviewer') || account.roles.includes('curator'));
  const scaling = useScaling(queryOf(choice), asksWorking);
  const answer = scaling.data;
  // With no clade chosen the register still says which could be; none is drawn.
  const noneChosen = choice.clades !== null && choice.clades.length === 0;
  const results = useMemo(() => (answer && !noneChosen ? cladeResults(answer) : []), [answer, noneChosen]);
  const shown = choice.clades ?? answer?.clades.map(({ slug }) => slug) ?? [];
  const marks = useMemo(() => assignCladeMarks(results.map(({ slug }) => slug)), [results]);
  const drawn = results.some(({ fitted, aside }) => fitted.length + aside.length > 0);
  const title = questionTitle(answer?.question ?? choice);
  const sub = answer ? `${results.length === 1 ? '1 clade' : `${results.length} clades`} · ${methodWords[answer.question.method] ?? answer.question.method} · ${answer.version === 'working' ? 'working set' : `version ${answer.version}`}` : undefined;
  const choices = <Choices choice={choice} change={change} answer={answer} chosen={shown} marks={marks} />;
  const acts = answer && drawn;
  const withDiagonals = answer ? hasDiagonals(figureGroups(results), axisOf(answer.question.x, answer.question.xStructure), axisOf(answer.question.y, answer.question.yStructure), answer.question) : false;
  return (
    <Screen
      title={title}
      heading={wide ? undefined : shortTitle(answer?.question ?? choice)}
      description="Exponents with their intervals, clade by clade, over the species means of a frozen version."
      sub={wide ? undefined : sub}
      demonstration={answer?.demonstration}
      actions={
        wide && acts ? (
          <>
            <Button label="Save figure" onPress={() => setOpen('save')} />
            <Button label="Save table" onPress={() => saveTable(answer, results)} />
            <Button kind="primary" label="Cite this fit" onPress={() => setOpen('cite')} />
          </>
        ) : undefined
      }
      foot={
        wide ? undefined : (
          <>
            <Button label="Axes and clades" grow onPress={() => setOpen('choices')} />
            <Button label="Save" disabled={!acts} onPress={() => setOpen('save')} />
            <Button kind="primary" label="Cite" spokenLabel="Cite this fit" disabled={!acts} onPress={() => setOpen('cite')} />
          </>
        )
      }
    >
      {answer ? (
        <ScalingView answer={answer} results={results} marks={marks} choice={choice} change={change} choices={choices} busy={scaling.isPlaceholderData} drawn={drawn} />
      ) : scaling.isPending ? (
        <FigureSkeleton />
      ) : (
        <ErrorState {...inWords(scaling.error)} retryLabel="Fit again" onRetry={() => void scaling.refetch()} />
      )}
      {!answer && !scaling.isPending ? <Button label="Begin with cortical mass on neurons" href="/scaling" style={{ alignSelf: 'flex-start' }} /> : null}
      <Sheet open={open === 'choices'} title="Axes and clades" onClose={close}>
        {choices}
      </Sheet>
      {open === 'save' && answer ? <SaveSheet answer={answer} results={results} choice={choice} figureId={FIGURE_ID} hasDiagonals={withDiagonals} onClose={close} /> : null}
      {open === 'cite' && answer ? <CiteFitSheet answer={answer} results={results} choice={choice} onClose={close} /> : null}
    </Screen>
  );
}

/** What failed, with what the register found wrong in the address. */
function inWords(error: unknown): { title: string; text: string } {
  const { title, text } = errorInWords(error);
  const found = fieldErrorsOf(error).map(({ message }) => `${message}.`);
  return { title: title === 'No answer came.' ? 'The fit did not arrive.' : title, text: [text, ...found].join(' ') };
}

/** The shape of the page while the fit is on the way. */
function FigureSkeleton() {
  const { sideBySide, wide } = useBreakpoint();
  return (
    <View style={{ flexDirection: wide ? 'row' : 'column', gap: wide ? 20 : 12 }}>
      {wide ? (
        <View style={{ width: 196 }}>
          <Skeleton rows={9} label="Choices on the way" />
        </View>
      ) : null}
      <View style={{ flex: wide ? 530 : undefined }}>
        <SkeletonBlock height={wide ? 560 : 392} label="Figure on the way" />
      </View>
      {sideBySide || !wide ? (
        <View style={{ flex: wide ? 436 : undefined }}>
          <Skeleton rows={3} label="Exponents on the way" />
        </View>
      ) : null}
    </View>
  );
}
