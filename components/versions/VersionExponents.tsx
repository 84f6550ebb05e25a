import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { StandingExponent } from '../../shared/contracts/register';
import { formatBeforeAfter, formatExponent, formatInterval } from '../../shared/domain/quantityText';
import { CladeName } from '../marks/CladeMark';
import { ExponentWhisker, scaleFor } from '../marks/ExponentWhisker';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

const methodNames: Record<string, string> = { ols: 'least squares', sma: 'standardised major axis' };

const questionOf = (fit: StandingExponent): string => `${fit.y}/${fit.yStructure ?? ''}/${fit.x}/${fit.xStructure ?? ''}/${fit.method}`;
/** The clade stands in its row, so the question is named without it: titles end in clade and method. */
const wordsOf = (fit: StandingExponent): string => `${fit.title.replace(`, ${fit.cladeName}, ${fit.method.toUpperCase()}`, '')}, ${methodNames[fit.method] ?? fit.method}`;

function columnsFor(fits: readonly StandingExponent[], label: string, previous: string | null): TableColumn<StandingExponent>[] {
  const scale = scaleFor(fits.flatMap(({ exponent, lower, upper }) => (exponent === null ? [] : [{ exponent, lower, upper }])));
  const before = (fit: StandingExponent) => (fit.previous === null ? null : { exponent: fit.previous, lower: fit.previousLower, upper: fit.previousUpper });
  return [
    { key: 'clade', head: 'clade', cell: (fit) => <CladeName clade={fit.clade} name={fit.cladeName} /> },
    { key: 'n', head: 'species', align: 'end', cell: (fit) => <Text size="table">{fit.previousN !== null && fit.previousN !== fit.n ? `${fit.previousN} → ${fit.n}` : String(fit.n)}</Text> },
    {
      key: 'whisker',
      head: 'exponent with its interval',
      headContent: <View />,
      phone: 'hide',
      cell: (fit) => (fit.exponent === null ? null : <ExponentWhisker clade={fit.clade} exponent={fit.exponent} lower={fit.lower} upper={fit.upper} before={before(fit)} scale={scale} width={180} height={34} />),
    },
    ...(previous === null ? [] : [{ key: 'before', head: `version ${previous}`, align: 'end' as const, cell: (fit: StandingExponent) => <Text size="table" tone="inkSoft">{fit.previous === null ? '–' : formatExponent(fit.previous, 3)}</Text> }]),
    { key: 'now', head: `version ${label}`, align: 'end', cell: (fit) => <Text size="table" weight="semibold">{fit.exponent === null ? '–' : formatExponent(fit.exponent, 3)}</Text> },
    { key: 'interval', head: '95 % interval', align: 'end', nowrap: true, cell: (fit) => <Text size="table">{fit.unfit ?? formatInterval(fit.lower, fit.upper)}</Text> },
    ...(previous === null ? [] : [{ key: 'moved', head: 'moved', align: 'end' as const, cell: (fit: StandingExponent) => <Text size="table" tone="inkSoft">{fit.previous === null || fit.exponent === null ? 'new' : formatBeforeAfter(fit.previous, fit.exponent).difference}</Text> }]),
  ];
}

/** Standing exponents of a version beside those of the version before; one question at a time. */
export function VersionExponents({ fits, label, previous }: { fits: readonly StandingExponent[]; label: string; previous: string | null }) {
  const questions = [...new Map(fits.map((fit) => [questionOf(fit), wordsOf(fit)]))].map(([value, words]) => ({ value, label: words }));
  const usual = questions.find((question) => question.value.startsWith('structureMassG/cerebral_cortex/neurons') && question.value.endsWith('/ols')) ?? questions[0];
  const [chosen, setChosen] = useState(usual?.value ?? '');
  const shown = fits.filter((fit) => questionOf(fit) === chosen);
  return (
    <Section title={previous === null ? 'Exponents' : `Exponents, version ${previous} to ${label}`} bare style={{ gap: 8 }}>
      {questions.length === 0 ? (
        <Text size="table" tone="inkSoft">
          No clade has five species with both values.
        </Text>
      ) : (
        <>
          <View style={{ maxWidth: 560 }}>
            <Select label="Question" value={chosen} options={questions} onChange={setChosen} />
          </View>
          <Table caption={`Exponents of version ${label}`} rows={shown} columns={columnsFor(shown, label, previous)} rowKey={(fit) => fit.slug} rowHref={(fit) => scalingHref(fit, label)} />
          {previous === null ? null : <Text size="secondary" tone="inkSoft">{`Upper, hollow: version ${previous}. Lower: version ${label}.`}</Text>}
        </>
      )}
    </Section>
  );
}

function scalingHref(fit: StandingExponent, label: string): Href {
  const parameters = new URLSearchParams({ version: label, y: fit.y, x: fit.x, clades: fit.clade, method: fit.method });
  if (fit.yStructure) parameters.set('yStructure', fit.yStructure);
  if (fit.xStructure) parameters.set('xStructure', fit.xStructure);
  return `/scaling?${parameters.toString()}` as Href;
}
