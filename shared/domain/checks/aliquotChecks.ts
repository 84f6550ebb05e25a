import type { CheckResult } from '../../contracts/checks';
import { isExcluded, type AliquotInput, type SampleEstimate, type SampleInput } from '../sampleTypes';
import { limits } from './limits';
import { outcome, shortFigure } from './outcome';

/** Volume of one large square of the improved Neubauer chamber, 1 mm × 1 mm × 0.1 mm, in mL. */
const LARGE_SQUARE_ML = 1e-4;
const NUMBER_WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

type Counts = Pick<SampleEstimate, 'aliquotCv' | 'excessCv' | 'dispersion' | 'aliquotsCounted'>;

function inWords(count: number): string {
  return NUMBER_WORDS[count] ?? String(count);
}

/** Squares counted in an aliquot: as entered, else as many large squares as its volume holds exactly, else null. */
export function squaresOf(aliquot: AliquotInput): number | null {
  if (aliquot.squares !== undefined && aliquot.squares !== null) return aliquot.squares > 0 ? aliquot.squares : null;
  const squares = aliquot.volumeMl / LARGE_SQUARE_ML;
  const whole = Math.round(squares);
  return whole >= 1 && whole <= 18 && Math.abs(squares - whole) < 1e-6 ? whole : null;
}

function included(input: SampleInput): AliquotInput[] {
  return input.aliquots.filter((aliquot) => !isExcluded(aliquot));
}

/** Nuclei are whole numbers and not negative; one finding for each aliquot that is not. */
export function checkWholeNuclei(input: SampleInput, path: string): CheckResult[] {
  return input.aliquots.flatMap((aliquot, i) =>
    Number.isInteger(aliquot.nuclei) && aliquot.nuclei >= 0
      ? []
      : [outcome('blocks', 'not-a-whole-number', `${path}aliquots.${i}.nuclei`, 'Nuclei are counted: the number must be whole and not negative.', String(aliquot.nuclei), 'whole, ≥ 0')],
  );
}

/** CV between aliquots against common practice. */
export function checkAliquotCv(counts: Counts, path: string): CheckResult | null {
  if (counts.aliquotCv === null) return null;
  const isWide = counts.aliquotCv > limits.aliquotCv;
  return outcome(
    isWide ? 'warns' : 'passes', 'aliquot-cv', `${path}aliquots`,
    isWide
      ? `The CV between aliquots is above ${limits.aliquotCv}, the common practice; mixing the suspension again and counting more aliquots may narrow it.`
      : 'The CV between aliquots is within common practice.',
    counts.aliquotCv, `≤ ${limits.aliquotCv}`,
  );
}

/** Excess of the CV over counting error, √max(0, CV² − 1/c̄), spoken of only where the dispersion agrees. */
export function checkExcessCv(counts: Counts, path: string): CheckResult | null {
  if (counts.excessCv === null || counts.dispersion === null) return null;
  const isExcessive = counts.excessCv > limits.excessCv && counts.dispersion.p < limits.excessCvDispersionP;
  const few = counts.aliquotsCounted <= 12 ? inWords(counts.aliquotsCounted) : String(counts.aliquotsCounted);
  return outcome(
    isExcessive ? 'warns' : 'passes', 'excess-cv', `${path}aliquots`,
    isExcessive
      ? `The aliquots differ more than counting error explains (dispersion p ${shortFigure(counts.dispersion.p)}): clumps, or a suspension not mixed evenly?`
      : `No sign of clumping; ${few} aliquots show little.`,
    counts.excessCv, `≤ ${limits.excessCv}`,
  );
}

/** Dispersion smaller than independent counts give, or all aliquots identical. */
export function checkDispersionTooSmall(input: SampleInput, counts: Counts, path: string): CheckResult | null {
  const aliquots = included(input);
  if (counts.dispersion === null) return null;
  const first = aliquots[0];
  const areIdentical = first !== undefined && aliquots.length >= 3 && aliquots.every((a) => a.nuclei === first.nuclei && a.volumeMl === first.volumeMl);
  const isTooSmall = counts.dispersion.p > limits.dispersionTooSmallP;
  const { statistic, df } = counts.dispersion;
  return outcome(
    areIdentical || isTooSmall ? 'warns' : 'passes', 'dispersion-too-small', `${path}aliquots`,
    areIdentical
      ? 'All aliquots hold the same number of nuclei; independent counts seldom do. Was one count copied?'
      : isTooSmall
        ? 'The aliquots agree more closely than independent counts would. Were they counted separately?'
        : 'The aliquots differ as independent counts may.',
    `${shortFigure(statistic)} on ${df} df, p ${shortFigure(counts.dispersion.p)}`, `p ≤ ${limits.dispersionTooSmallP}`,
  );
}

/** Nuclei per square: too few give a large counting error, too many overlap. */
export function checkNucleiPerSquare(input: SampleInput, path: string): CheckResult | null {
  const aliquots = included(input);
  const squares = aliquots.map(squaresOf);
  if (aliquots.length === 0 || squares.some((count) => count === null)) return null;
  const perSquare = aliquots.reduce((sum, a) => sum + a.nuclei, 0) / squares.reduce<number>((sum, count) => sum + (count ?? 0), 0);
  const isFew = perSquare < limits.nucleiPerSquareLeast;
  const isMany = perSquare > limits.nucleiPerSquareMost;
  return outcome(
    isFew || isMany ? 'warns' : 'passes', 'nuclei-per-square', `${path}aliquots`,
    isFew
      ? 'Few nuclei per square: the counting error is large, a denser suspension counts better.'
      : isMany
        ? 'Many nuclei per square: they overlap and are missed, a further dilution counts better.'
        : 'Nuclei per square are in the range that counts well.',
    perSquare, `${limits.nucleiPerSquareLeast} – ${limits.nucleiPerSquareMost}`,
  );
}

/** Number of aliquots against common practice. */
export function checkFewAliquots(counts: Counts, path: string): CheckResult {
  const isFew = counts.aliquotsCounted < limits.aliquotsLeast;
  return outcome(
    isFew ? 'warns' : 'passes', 'few-aliquots', `${path}aliquots`,
    isFew
      ? `${counts.aliquotsCounted === 1 ? 'One aliquot shows' : `With ${inWords(counts.aliquotsCounted)} aliquots the counts show`} little of the error between aliquots; common practice is at least four.`
      : 'As many aliquots as common practice asks, or more.',
    counts.aliquotsCounted, `≥ ${limits.aliquotsLeast}`,
  );
}

/**
 * The volume of one square stands where four were counted: one square would hold more nuclei than
 * can be counted and a quarter of them would not, or one aliquot's volume is a quarter of the
 * others' while its count is like theirs.
 */
export function checkVolumeOfOneSquare(input: SampleInput, path: string): CheckResult | null {
  const aliquots = included(input).filter((aliquot) => aliquot.volumeMl > 0);
  if (aliquots.length === 0 || aliquots.some((aliquot) => squaresOf(aliquot) === null)) return null;
  const single = aliquots.filter((aliquot) => squaresOf(aliquot) === 1);
  const others = aliquots.filter((aliquot) => squaresOf(aliquot) !== 1);
  const meanOf = (list: AliquotInput[]) => list.reduce((sum, aliquot) => sum + aliquot.nuclei, 0) / list.length;
  const perSquareOfOthers = others.reduce((sum, a) => sum + a.nuclei, 0) / others.reduce((sum, a) => sum + (squaresOf(a) ?? 0), 0);
  const mean = single.length === 0 ? null : meanOf(single);
  const isCrowded = others.length === 0 && mean !== null && mean > limits.nucleiPerSquareMost && mean / 4 <= limits.nucleiPerSquareMost;
  const isUnlikeOthers = others.length > 0 && mean !== null && perSquareOfOthers > 0 && mean > 2 * perSquareOfOthers;
  if (!isCrowded && !isUnlikeOthers) {
    return outcome('passes', 'volume-of-one-square', `${path}aliquots`, 'The counted volume agrees with the number of squares.', mean, `≤ ${limits.nucleiPerSquareMost}`);
  }
  return outcome(
    'warns', 'volume-of-one-square', `${path}aliquots`,
    isCrowded
      ? 'The volume is that of one square, yet the count is more than one square holds. Were four squares counted? Then the volume is four times as large.'
      : 'Some aliquots carry the volume of one square, yet their counts are like those of several. Were as many squares counted there?',
    mean, `≤ ${isCrowded ? limits.nucleiPerSquareMost : shortFigure(2 * perSquareOfOthers)}`,
  );
}
