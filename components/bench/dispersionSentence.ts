import { formatP } from '../../shared/domain/quantityText';
import type { SampleEstimate } from '../../shared/domain/sampleTypes';

const NUMBER_WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

/** What the spread of the aliquots says; few of them never prove the absence of clumps. */
export function dispersionSentence({ dispersion, aliquotsCounted, checks }: SampleEstimate): string | null {
  if (dispersion === null) return aliquotsCounted === 1 ? 'One aliquot shows nothing of the error between aliquots.' : null;
  const said = checks.find(({ code }) => code === 'excess-cv');
  const few = NUMBER_WORDS[aliquotsCounted] ?? String(aliquotsCounted);
  const words = said?.level === 'warns' ? 'more than counting error explains' : `no sign of clumping; ${few} aliquots show little`;
  return `Dispersion ${dispersion.statistic.toPrecision(3)} on ${dispersion.df} df, ${formatP(dispersion.p)}: ${words}.`;
}
