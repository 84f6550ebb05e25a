import type { CheckResult } from '../../contracts/checks';
import { estimateNeuronFraction, neunFields, neunHomogeneity } from '../neunFraction';
import type { NeunInput } from '../sampleTypes';
import { limits } from './limits';
import { outcome, shortFigure } from './outcome';

/** Path of one NeuN count: a single total stands in the object itself, fields stand in a list. */
function fieldPath(neun: NeunInput, path: string, index: number): string {
  return 'fields' in neun ? `${path}.fields.${index}` : path;
}

/** NeuN counts are whole, not negative, and the positive ones are among those counted. */
export function checkNeunPossible(neun: NeunInput, path: string): CheckResult[] {
  return neunFields(neun).flatMap((field, i) => {
    const at = fieldPath(neun, path, i);
    const notWhole = (['positive', 'total'] as const).filter((key) => !Number.isInteger(field[key]) || field[key] < 0);
    if (notWhole.length > 0) {
      return notWhole.map((key) =>
        outcome('blocks', 'not-a-whole-number', `${at}.${key}`, 'Nuclei are counted: the number must be whole and not negative.', String(field[key]), 'whole, ≥ 0'),
      );
    }
    return field.positive <= field.total
      ? []
      : [outcome('blocks', 'fraction-outside', `${at}.positive`, 'More nuclei are NeuN-positive than were counted: the fraction would lie above 1.', field.positive / field.total, '0 – 1')];
  });
}

/** Nuclei counted for the NeuN-positive fraction against common practice. */
export function checkFewNeunNuclei(neun: NeunInput, path: string): CheckResult {
  const total = neunFields(neun).reduce((sum, field) => sum + field.total, 0);
  const isFew = total < limits.neunNucleiLeast;
  return outcome(
    isFew ? 'warns' : 'passes', 'few-neun-nuclei', path,
    isFew
      ? `Fewer nuclei than the ${limits.neunNucleiLeast} of common practice were counted for the NeuN-positive fraction: its error is large.`
      : 'Enough nuclei were counted for the NeuN-positive fraction.',
    total, `≥ ${limits.neunNucleiLeast}`,
  );
}

/** Whether the fields agree in their NeuN-positive fraction (chi-square of homogeneity). */
export function checkNeunFieldsDisagree(neun: NeunInput, path: string): CheckResult | null {
  const test = neunHomogeneity(neun);
  if (test === null) return null;
  const disagree = test.p < limits.neunFieldsP;
  return outcome(
    disagree ? 'warns' : 'passes', 'neun-fields-disagree', path,
    disagree
      ? 'The fields disagree in their NeuN-positive fraction more than chance gives: uneven staining, or clumps of one kind of nuclei?'
      : 'The fields agree in their NeuN-positive fraction.',
    `${shortFigure(test.statistic)} on ${test.df} df, p ${shortFigure(test.p)}`, `p ≥ ${limits.neunFieldsP}`,
  );
}

/** NeuN-positive fraction near 0 or 1 for the structure: a failed stain, or a wrong threshold. */
export function checkNeunNearEnds(neun: NeunInput, structure: string | null, path: string): CheckResult | null {
  const fraction = estimateNeuronFraction(neun);
  if (fraction === null) return null;
  const general = { least: 0.02, most: 0.98 };
  const range = (structure === null ? undefined : limits.neunFraction[structure]) ?? limits.neunFraction['general'] ?? general;
  const isLow = fraction.value < range.least;
  const isHigh = fraction.value > range.most;
  return outcome(
    isLow || isHigh ? 'warns' : 'passes', 'neun-near-the-ends', path,
    isLow
      ? 'The NeuN-positive fraction is lower than this structure usually gives: did the antibody reach the nuclei?'
      : isHigh
        ? 'The NeuN-positive fraction is higher than this structure usually gives: is background counted as stain?'
        : 'The NeuN-positive fraction is in the usual range.',
    fraction.value, `${range.least} – ${range.most}`,
  );
}
