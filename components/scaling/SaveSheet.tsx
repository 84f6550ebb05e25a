import { useState } from 'react';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import { canSaveFigure, saveFigure } from '../charts/saveFigure';
import { useCitation } from '../queries/versions';
import { useTheme } from '../theme/ThemeProvider';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { Stack } from '../ui/Row';
import { Text } from '../ui/Text';
import { figureCaption, fileNameOf } from './caption';
import type { CladeResult } from './figureGroups';
import { pointsCsv } from './pointsCsv';
import { fullAddress, saveText } from './saveText';
import { addressOf, type ScalingChoice } from './scalingChoice';

interface SaveSheetProps {
  answer: ScalingAnswer;
  results: readonly CladeResult[];
  choice: ScalingChoice;
  /** Id of the figure's element. */
  figureId: string;
  hasDiagonals: boolean;
  onClose: () => void;
}

export function saveTable(answer: ScalingAnswer, results: readonly CladeResult[]): void {
  saveText(pointsCsv(answer, results), `${fileNameOf(answer)}.csv`, 'text/csv');
}

/** The figure as SVG or PNG with caption, version and citation inside, and its numbers as CSV. */
export function SaveSheet({ answer, results, choice, figureId, hasDiagonals, onClose }: SaveSheetProps) {
  const { colour } = useTheme();
  const [saving, setSaving] = useState<'svg' | 'png' | null>(null);
  const [failed, setFailed] = useState<string | null>(null);
  const citation = useCitation(answer.version, 'text', [], !choice.working);
  const save = async (format: 'svg' | 'png') => {
    setSaving(format);
    setFailed(null);
    try {
      const caption = figureCaption(answer, results, choice, { citation: citation.data?.trim() ?? null, hasDiagonals, address: fullAddress(addressOf(choice, answer.version)) });
      await saveFigure({ elementId: figureId, format, fileName: fileNameOf(answer), caption, colours: { ground: colour.ground, ink: colour.ink, inkSoft: colour.inkSoft } });
      onClose();
    } catch (error) {
      setFailed(error instanceof Error ? error.message : 'The figure could not be saved.');
    } finally {
      setSaving(null);
    }
  };
  const waits = citation.isPending && !choice.working;
  return (
    <Sheet open title="Save" closeLabel="Close" onClose={onClose} width={440}>
      <Text size="secondary" tone="inkSoft">
        Caption, version and citation are written into the figure; it takes the colours of the theme shown.
      </Text>
      <Stack gap={10}>
        <Button kind="primary" label="Figure as SVG" note="scales, can be edited" disabled={!canSaveFigure || waits} working={saving === 'svg'} onPress={() => void save('svg')} />
        <Button label="Figure as PNG" note="at twice the size" disabled={!canSaveFigure || waits} working={saving === 'png'} onPress={() => void save('png')} />
        <Button
          label="Table as CSV"
          note="every point with its residual, flag and records"
          onPress={() => {
            saveTable(answer, results);
            onClose();
          }}
        />
      </Stack>
      {failed ? (
        <Text role="alert" tone="flagged" size="secondary">
          {failed}
        </Text>
      ) : null}
    </Sheet>
  );
}
