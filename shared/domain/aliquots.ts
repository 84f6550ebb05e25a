import { chiSquareLowerTail, chiSquareQuantile, chiSquareUpperTail, tQuantile } from '../stats/distributions';
import { NO_SHARED_ERRORS, NORMAL_975, type Uncertain } from './quantity';
import { isExcluded, type AliquotInput, type SampleInput } from './sampleTypes';

export interface PooledAliquots {
  /** Nuclei in the whole suspension, before any scale-up. */
  counted: Uncertain;
  standardErrorKind: 'between-aliquots' | 'counting';
  /** CV between aliquots, sd(n)/mean(n); null for one aliquot or where no nucleus was counted. */
  aliquotCv: number | null;
  dispersion: { statistic: number; df: number; p: number; lowerTailP: number } | null;
  nucleiCounted: number;
  aliquotsCounted: number;
  meanCount: number;
}

function isPossible(aliquot: AliquotInput): boolean {
  return Number.isInteger(aliquot.nuclei) && aliquot.nuclei >= 0 && Number.isFinite(aliquot.volumeMl) && aliquot.volumeMl > 0;
}

/**
 * Nuclei of a suspension from its aliquots: cells = V·r, r = Σc/Σe, e = v/D.
 *
 * Inputs: volumes in mL, dilution = final ÷ original volume (≥ 1, default 1). Excluded aliquots do
 * not enter. Output: nuclei in the suspension with its 95 % limits: t on k−1 df where the error
 * between aliquots is the larger, exact Poisson limits (Garwood 1936) where the counting error is.
 * With Σc = 0 the standard error is undefined (NaN), the limits are not.
 * Returns null where there is no aliquot, or any number is impossible.
 * Source: Herculano-Houzel & Lent 2005, J. Neurosci. 25:2518–2521; ratio estimator, Cochran 1977, 6.4.
 */
export function poolAliquots(input: SampleInput): PooledAliquots | null {
  const aliquots = input.aliquots.filter((aliquot) => !isExcluded(aliquot));
  const dilution = input.dilution ?? 1;
  const volume = input.suspensionVolumeMl;
  const k = aliquots.length;
  if (k === 0 || !aliquots.every(isPossible)) return null;
  if (!(Number.isFinite(volume) && volume > 0 && Number.isFinite(dilution) && dilution >= 1)) return null;

  const effective = aliquots.map((aliquot) => aliquot.volumeMl / dilution);
  const sumCount = aliquots.reduce((sum, aliquot) => sum + aliquot.nuclei, 0);
  const sumEffective = effective.reduce((sum, e) => sum + e, 0);
  const rate = sumCount / sumEffective;
  const cells = volume * rate;

  // e²(n − r)² = (c − e·r)²: this form needs no division by a small volume.
  let squares = 0;
  let statistic = 0;
  aliquots.forEach((aliquot, i) => {
    const expected = (effective[i] ?? NaN) * rate;
    squares += (aliquot.nuclei - expected) ** 2;
    statistic += expected > 0 ? (aliquot.nuclei - expected) ** 2 / expected : 0;
  });
  const betweenSe = k > 1 ? (volume * Math.sqrt((k / (k - 1)) * squares)) / sumEffective : 0;
  const countingSe = sumCount > 0 ? cells / Math.sqrt(sumCount) : NaN;
  const isBetween = betweenSe > countingSe;

  const perCount = volume / sumEffective;
  const halfWidth = isBetween ? tQuantile(0.975, k - 1) * betweenSe : 0;
  const [poissonLower, poissonUpper] = isBetween ? [0, 0] : poissonLimits(sumCount);
  return {
    counted: {
      value: cells,
      variance: isBetween ? betweenSe ** 2 : countingSe ** 2,
      below: isBetween ? halfWidth : cells - perCount * poissonLower,
      above: isBetween ? halfWidth : perCount * poissonUpper - cells,
      shared: sharedErrors(input, cells),
    },
    standardErrorKind: isBetween ? 'between-aliquots' : 'counting',
    aliquotCv: betweenCv(aliquots.map((aliquot, i) => aliquot.nuclei / (effective[i] ?? NaN))),
    dispersion:
      k > 1 && sumCount > 0 && Number.isFinite(statistic)
        ? { statistic, df: k - 1, p: chiSquareUpperTail(statistic, k - 1), lowerTailP: chiSquareLowerTail(statistic, k - 1) }
        : null,
    nucleiCounted: sumCount,
    aliquotsCounted: k,
    meanCount: sumCount / k,
  };
}

/** From this many degrees of freedom the series below is exact to 1e-12 and the quantile of the package is not. */
const LARGE_DF = 1500;

/**
 * Quantile of chi-square at 0.025 or 0.975. For large df by the Cornish–Fisher series to df⁻²
 * (Goldberg & Levine 1946): the incomplete gamma function of the package is off by 1e-4 above
 * df 1,880, and a Poisson limit of 1,000 nuclei needs 2,000.
 */
function chiSquarePoint(p: 0.025 | 0.975, df: number): number {
  if (df < LARGE_DF) return chiSquareQuantile(p, df);
  const z = p === 0.975 ? NORMAL_975 : -NORMAL_975;
  return (
    df +
    Math.sqrt(2 * df) * z +
    (2 / 3) * (z ** 2 - 1) +
    (z ** 3 - 7 * z) / (9 * Math.sqrt(2 * df)) -
    (6 * z ** 4 + 14 * z ** 2 - 32) / (405 * df) +
    (9 * z ** 5 + 256 * z ** 3 - 433 * z) / (4860 * Math.SQRT2 * df ** 1.5) +
    (12 * z ** 6 - 243 * z ** 4 - 923 * z ** 2 + 1472) / (25515 * df ** 2)
  );
}

/** Exact 95 % limits of a Poisson count: χ²(0.025, 2S)/2 and χ²(0.975, 2S+2)/2 (Garwood 1936). */
export function poissonLimits(count: number): [number, number] {
  return [count === 0 ? 0 : chiSquarePoint(0.025, 2 * count) / 2, chiSquarePoint(0.975, 2 * count + 2) / 2];
}

function betweenCv(rates: readonly number[]): number | null {
  if (rates.length < 2) return null;
  const mean = rates.reduce((sum, rate) => sum + rate, 0) / rates.length;
  if (mean <= 0) return null;
  const squares = rates.reduce((sum, rate) => sum + (rate - mean) ** 2, 0);
  return Math.sqrt(squares / (rates.length - 1)) / mean;
}

// One chamber holds every aliquot, so an error of its depth moves all of them together.
function sharedErrors(input: SampleInput, cells: number): Uncertain['shared'] {
  const aliquots = input.aliquots.filter((aliquot) => !isExcluded(aliquot));
  const sumVolume = aliquots.reduce((sum, aliquot) => sum + aliquot.volumeMl, 0);
  const sumVolumeSe = aliquots.reduce((sum, aliquot) => sum + (aliquot.volumeSe ?? 0), 0);
  return {
    ...NO_SHARED_ERRORS,
    suspensionVolume: (cells * (input.suspensionVolumeSe ?? 0)) / input.suspensionVolumeMl,
    dilution: (cells * (input.dilutionSe ?? 0)) / (input.dilution ?? 1),
    chamberVolume: (cells * sumVolumeSe) / sumVolume,
  };
}

/**
 * Aliquots in all that a wished CV of the mean needs: max(4, (CV/t)², 1/(t²·c̄)), rounded up.
 * Null where the target is missing or no nucleus was counted.
 */
export function aliquotsForCv(targetCv: number | null | undefined, pooled: PooledAliquots): number | null {
  if (targetCv === null || targetCv === undefined || !(targetCv > 0) || pooled.meanCount <= 0) return null;
  const byCv = pooled.aliquotCv === null ? 0 : (pooled.aliquotCv / targetCv) ** 2;
  const byCounting = 1 / (targetCv ** 2 * pooled.meanCount);
  // A whole number reached up to rounding error must not ask for one aliquot more.
  const total = Math.ceil(Math.max(4, byCv, byCounting) * (1 - 1e-12));
  return Number.isFinite(total) ? total : null;
}
