import type { CheckResult } from '../../contracts/checks';
import type { SpecimenContent } from '../../contracts/content';
import { estimateSample } from '../sampleEstimate';
import { readSpecimen, type ReadSample, type ReadStructure } from '../specimenReading';
import { parseMassG } from '../units';
import type { CheckContext } from './context';
import { checkDates, isDate } from './dateChecks';
import { checkDoi, checkOrcid, checkRrid, checkSpecimenCode } from './identifierChecks';
import { applicable, byLevel, outcome } from './outcome';
import { checkPartHeavierThanWhole, checkPartsAndWhole, checkStructureTwice, type MeasuredStructure } from './partsChecks';
import { missingOfSpecimen } from './requiredFields';
import { checkScaleUp } from './scaleUpChecks';
import { checkSideNotDoubled } from './sideChecks';
import { checkDelineation, checkSecondSpecimen } from './speciesChecks';
import { checkUnitSlip, suggestedFactors } from './unitSlip';

/**
 * Everything that is checked of a specimen before a reviewer looks.
 *
 * `content` is what was entered, also half-filled; `context` what only the server knows (without it the
 * client shows the same checks but those that need the register). Paths are those of the content. The
 * impossible comes first, then the doubtful, then what passes; within a level in the order of the form.
 * Pure: the same content and context give the same list.
 */
export function checkSpecimenContent(content: SpecimenContent, context: CheckContext): CheckResult[] {
  const structures = readSpecimen(content);
  const { specimen, provenance } = content;
  const bodyMass = parseMassG(specimen.bodyMass);
  const measured: MeasuredStructure[] = structures.map(({ path, structure, structureMassG }) => ({ path, structure, structureMassG }));
  const weighsBody = specimen.bodyMassKind === 'measured' || specimen.bodyMassKind === 'estimated';
  const body: MeasuredStructure[] = weighsBody ? [{ path: 'specimen', structure: 'body', structureMassG: bodyMass.value }] : [];

  return byLevel([
    ...missingOfSpecimen(content),
    ...applicable([
      bodyMass.problem === null ? null : outcome('blocks', 'not-readable', 'specimen.bodyMass', bodyMass.problem),
      notPositive(bodyMass.value, 'specimen.bodyMass', 'The body mass'),
      checkSpecimenCode(specimen.code, context.labSpecimenCodes ?? [], 'specimen.code'),
      checkDoi(provenance.doi, 'provenance.doi'),
      checkDoi(provenance.protocolDoi, 'provenance.protocolDoi'),
      provenance.embargoUntil.trim() === '' || isDate(provenance.embargoUntil.trim())
        ? null
        : outcome('blocks', 'date-malformed', 'provenance.embargoUntil', 'The end of the embargo is written as year-month-day.', provenance.embargoUntil, 'YYYY-MM-DD'),
      ...(context.orcids ?? []).map(({ path, text }) => checkOrcid(text, path)),
    ]),
    ...datesOf(content, context.today),
    ...humanDonor(content),
    ...structures.flatMap((structure, i) => checksOfStructure(structure, content.structures[i]?.samples ?? [])),
    ...checkStructureTwice(measured),
    ...checkPartHeavierThanWhole([...measured, ...body], context.parts),
    ...checkPartsAndWhole(measured),
    ...checkSideNotDoubled(
      structures.map((structure, i) => ({
        path: structure.path,
        structure: structure.structure,
        structureMassG: structure.structureMassG,
        weighedMassG: structure.weighedMassG,
        sampledMassG: structure.estimate.structureMassG,
        samples: (content.structures[i]?.samples ?? []).map((sample, j) => ({
          side: sample.side, scaleUp: sample.scaleUp.kind, tissueMassG: structure.samples[j]?.tissueMassG ?? null,
        })),
      })),
    ),
    ...checkDelineation(structures.map((structure, i) => ({ path: structure.path, structure: structure.structure, delineation: content.structures[i]?.delineation ?? [] })), context.delineations),
    ...applicable(structures.map((structure) =>
      checkSecondSpecimen({ path: structure.path, structure: structure.structure, neurons: structure.estimate.neurons.value }, context.otherSpecimens ?? []))),
    ...structures.flatMap((structure) => unitSlipsOf(structure, context)),
  ]);
}

function notPositive(value: number | null, path: string, what: string): CheckResult | null {
  return value === null || value > 0 ? null : outcome('blocks', 'mass-not-positive', path, `${what} must be above zero.`, value, '> 0');
}

function datesOf(content: SpecimenContent, today: string): CheckResult[] {
  const before = [
    { path: 'specimen.diedOn', text: content.specimen.diedOn, act: 'death' },
    { path: 'specimen.fixedOn', text: content.specimen.fixedOn, act: 'fixation' },
  ];
  const counts = content.structures.flatMap((structure, i) =>
    structure.samples.map((sample, j) => ({ path: `structures.${i}.samples.${j}.countedOn`, text: sample.countedOn, act: 'count' })),
  );
  return checkDates([...before, ...counts], today);
}

/** A human donor is never identifiable: years instead of days, no age in days. */
function humanDonor(content: SpecimenContent): CheckResult[] {
  if (content.specimen.taxon !== 'homo-sapiens') return [];
  const { diedOn, fixedOn, ageDays } = content.specimen;
  return applicable([
    diedOn.trim().length > 4 ? outcome('blocks', 'human-donor', 'specimen.diedOn', 'Of a human donor only the year is kept.', null, 'YYYY') : null,
    fixedOn.trim().length > 4 ? outcome('blocks', 'human-donor', 'specimen.fixedOn', 'Of a human donor only the year is kept.', null, 'YYYY') : null,
    ageDays.trim() !== '' ? outcome('blocks', 'human-donor', 'specimen.ageDays', 'The age of a human donor is kept as an age class, never in days.') : null,
  ]);
}

function checksOfStructure(structure: ReadStructure, entries: SpecimenContent['structures'][number]['samples']): CheckResult[] {
  return [
    ...structure.problems.map((problem) => outcome('blocks', 'not-readable', problem.path, problem.message)),
    ...applicable([notPositive(structure.weighedMassG, `${structure.path}.mass`, 'The mass of the structure')]),
    ...structure.samples.flatMap((sample, j) => {
      const entry = entries[j];
      const rrid = applicable([checkRrid(entry?.antibodyRrid ?? '', `${sample.path}.antibodyRrid`)]);
      if (sample.input === null) {
        return [
          ...applicable([notPositive(sample.tissueMassG, `${sample.path}.tissueMass`, 'The mass of the tissue')]),
          ...(entry ? checkScaleUp({ kind: entry.scaleUp.kind }, entry.side, `${sample.path}.scaleUp`) : []),
          ...rrid,
        ];
      }
      const { checks } = estimateSample(sample.input, { structure: structure.structure, side: entry?.side ?? null, prefix: `${sample.path}.` });
      return [...checks.map((check) => ({ ...check, path: pathInContent(check.path, sample) })), ...rrid];
    }),
  ];
}

/** Turns a path of the calculator's input into that of the content, whose empty rows the input passed over. */
function pathInContent(path: string, sample: ReadSample): string {
  const inner = path.slice(sample.path.length + 1);
  const row = /^(aliquots|neun\.fields)\.(\d+)\.(.+)$/.exec(inner);
  if (row) {
    const places = row[1] === 'aliquots' ? sample.aliquotPaths : sample.neunPaths;
    const field = row[3] === 'volumeMl' ? 'squares' : (row[3] ?? '');
    return `${places[Number(row[2])] ?? sample.path}.${field}`;
  }
  const names: Readonly<Record<string, string>> = { tissueMassG: 'tissueMass', suspensionVolumeMl: 'suspensionVolume' };
  return `${sample.path}.${names[inner] ?? inner}`;
}

function unitSlipsOf(structure: ReadStructure, context: CheckContext): CheckResult[] {
  const inputs = structure.samples.flatMap((sample) => (sample.input === null ? [] : [sample.input]));
  const factors = suggestedFactors({
    squares: inputs.flatMap((input) => input.aliquots.flatMap((aliquot) => aliquot.squares ?? [])),
    dilutions: inputs.map((input) => input.dilution ?? 1),
  });
  return (context.lines ?? []).filter((line) => line.path === structure.path).map((line) => checkUnitSlip(line, structure.structure, factors));
}
