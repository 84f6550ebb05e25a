import type { CheckResult } from '../../shared/contracts/checks';
import type { SubmissionContent } from '../../shared/contracts/content';
import { wordOnCheck } from '../../shared/domain/checks/outcome';
import { fieldName } from '../../shared/domain/fieldNames';
import type { CheckRow } from './CheckList';

const order = { blocks: 0, warns: 1, passes: 2 } as const;

/** Names of the checks in the words of the trade. */
const names: Readonly<Record<string, string>> = {
  'aliquot-cv': 'CV between aliquots',
  'both-sides-doubled': 'sides and scale-up',
  'cells-not-the-sum': 'neurons and other cells sum to cells',
  'count-negative': 'count',
  'date-in-the-future': 'date',
  'date-malformed': 'date',
  'dates-out-of-order': 'order of dates',
  'definition-unknown': 'definition of the structure',
  'delineation-mixed': 'delineation',
  'dilution-below-one': 'dilution',
  'dispersion-too-small': 'aliquots alike',
  'doi-malformed': 'DOI',
  'entry-twice': 'entries stand once',
  'excess-cv': 'CV beyond counting error',
  'few-aliquots': 'aliquots counted',
  'few-neun-nuclei': 'nuclei scored for NeuN',
  'fraction-outside': 'NeuN-positive fraction',
  'human-donor': 'human donor not identifiable',
  'listed-twice': 'species and structure stand once',
  'mass-not-positive': 'mass',
  'midline-doubled': 'sides and scale-up',
  'missing': 'still to enter',
  'neun-fields-disagree': 'NeuN fields agree',
  'neun-near-the-ends': 'NeuN-positive fraction',
  'not-a-whole-number': 'whole number',
  'not-readable': 'number',
  'nuclei-per-square': 'nuclei per square',
  'orcid-malformed': 'ORCID iD',
  'part-heavier-than-whole': 'parts lighter than the whole',
  'parts-and-whole': 'parts sum to the whole',
  'pooled-twice': 'animals of a pooled sample',
  'real-species-in-demonstration': 'demonstration species',
  'refused': 'refused by the register',
  'rrid-malformed': 'RRID of the antibody',
  'scale-up-factor': 'scale-up',
  'scaled-to-both-sides': 'one side scaled to both',
  'scaled-up': 'scale-up',
  'second-specimen': 'agrees with other specimens',
  'side-not-doubled': 'one side or both',
  'specimen-code-taken': 'specimen code',
  'spread-exceeds-mean': 'spread and mean',
  'spread-negative': 'spread',
  'structure-of-another-class': 'structure of the class',
  'structure-twice': 'structures stand once',
  'structure-unknown': 'structure',
  'taxon-not-a-species': 'species',
  'taxon-not-accepted': 'species',
  'taxon-unknown': 'species',
  'too-many-animals': 'number of animals',
  'unit-slip': 'unit slip',
  'volume-not-positive': 'volume',
  'volume-of-one-square': 'counted volume and squares',
};

/** Name of a check; the code in plain words where the list has none. */
export const checkName = (code: string): string => names[code] ?? code.replaceAll('-', ' ');

/** Structure and sample that a check speaks of, where the same check stands for several: "cerebellum, sample 2". */
function placeOf(check: CheckResult, checks: readonly CheckResult[], content: SubmissionContent | null): string {
  const [place] = /^(structures|values)\.\d+(\.samples\.\d+)?/.exec(check.path) ?? [];
  const repeated = checks.some((other) => other !== check && other.code === check.code && other.path !== check.path);
  return place === undefined || !repeated ? '' : `, ${fieldName(place, content)}`;
}

/** Checks as rows of a check list: what blocks first, then what is doubtful with the contributor's word on it. */
export function checkRows(checks: readonly CheckResult[], explanations: Readonly<Record<string, string>> = {}, content: SubmissionContent | null = null): CheckRow[] {
  return [...checks]
    .sort((a, b) => order[a.level] - order[b.level])
    .map((check, index) => {
      const word = wordOnCheck(check, explanations);
      return {
        key: `${check.code}@${check.path}#${index}`,
        level: check.level,
        name: `${checkName(check.code)}${placeOf(check, checks, content)}`,
        figure: check.figure ?? undefined,
        limit: check.limit ?? undefined,
        sentence: check.level === 'passes' ? undefined : `${check.message}${word === null ? '' : ` The contributor says: “${word}”`}`,
      };
    });
}
