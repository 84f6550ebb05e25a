import { describe, expect, it } from 'vitest';
import { bandAt, lineOf } from '../../../shared/stats/bands';
import { fitScaling } from '../../../shared/stats/fit';
import { fitOls, testOlsExponent } from '../../../shared/stats/leastSquares';
import { logPoints } from '../../../shared/stats/points';
import { fitTheilSen } from '../../../shared/stats/theilSen';
import type { ScalingFit } from '../../../shared/stats/types';
import { datasetPoints, referenceFits, referencePoints, relativeError } from './reference';
import type { ReferenceFit } from './reference';

/** R printed 15 digits; sums in another order cost the last few. */
const EXACT = 1e-9;
/** Quantiles of t and F come from different libraries. */
const LIMIT = 1e-7;

const cases = ['animals28', 'carnivora112', 'mammals62'].flatMap((dataset) =>
  referenceFits(dataset).map(([subset, reference]) => ({ dataset, subset, reference })));

/** Every figure whose relative error exceeds its tolerance, by name. */
function disagreements(pairs: [name: string, found: number | null | undefined, expected: number, tolerance: number][]): string[] {
  return pairs
    .filter(([, found, expected, tolerance]) => !(relativeError(found, expected) <= tolerance))
    .map(([name, found, expected]) => `${name}: found ${found}, expected ${expected}`);
}

function fitOf(reference: ReferenceFit, method: 'ols' | 'sma'): ScalingFit {
  const tests = method === 'ols' ? reference.slope_tests : reference.sma_tests;
  const { fits } = fitScaling({
    points: referencePoints(reference), method, against: tests.map(({ b0 }) => b0), predictAt: reference.predictions.x_raw,
  });
  return fits[0]!;
}

describe.each(cases)('$dataset, $subset, against R', ({ reference }) => {
  it('gives the least-squares line with its errors, limits and likelihood', () => {
    const fit = fitOf(reference, 'ols');
    const { ols } = reference;
    expect(fit).toMatchObject({ group: null, n: reference.n, df: reference.df, method: 'ols', unfit: null });
    expect(disagreements([
      ['slope', fit.exponent?.estimate, ols.slope, EXACT],
      ['slope SE', fit.exponent?.standardError, ols.se_slope, EXACT],
      ['slope lower', fit.exponent?.lower, ols.slope_ci95[0], LIMIT],
      ['slope upper', fit.exponent?.upper, ols.slope_ci95[1], LIMIT],
      ['intercept', fit.log10Coefficient?.estimate, ols.intercept, EXACT],
      ['intercept SE', fit.log10Coefficient?.standardError, ols.se_intercept, EXACT],
      ['intercept lower', fit.log10Coefficient?.lower, ols.intercept_ci95[0], LIMIT],
      ['intercept upper', fit.log10Coefficient?.upper, ols.intercept_ci95[1], LIMIT],
      ['R²', fit.rSquared, ols.r2, EXACT],
      ['residual SD', fit.residualSd, ols.resid_sd, EXACT],
      ['log-likelihood', fit.logLikelihood, ols.logLik, EXACT],
      ['AIC', fit.aic, ols.AIC, EXACT],
      ['smearing factor', fit.smearingFactor, reference.duan_smearing, EXACT],
    ])).toEqual([]);
  });

  it('tests stated exponents by least squares', () => {
    const fit = fitOf(reference, 'ols');
    expect(fit.tests).toHaveLength(reference.slope_tests.length);
    expect(disagreements(reference.slope_tests.flatMap(({ b0, t, df, p }, i) => [
      [`t of ${b0}`, fit.tests[i]?.statistic, t, EXACT],
      [`df of ${b0}`, fit.tests[i]?.df, df, 0],
      [`p of ${b0}`, fit.tests[i]?.p, p, EXACT],
    ]))).toEqual([]);
    const { log10X, log10Y } = logPoints(referencePoints(reference));
    const line = fitOls(log10X, log10Y);
    if (line.kind === 'unfit') throw new Error(line.unfit.message);
    const zero = testOlsExponent(line, 0);
    expect(disagreements([
      ['t of 0', zero.statistic, reference.ols.t_slope, EXACT],
      ['p of 0', zero.p, reference.ols.p_slope, EXACT],
    ])).toEqual([]);
  });

  it('predicts with confidence and prediction bands', () => {
    const fit = fitOf(reference, 'ols');
    const { predictions } = reference;
    expect(predictions.log10_x).toHaveLength(5);
    expect(disagreements(predictions.log10_x.flatMap((log10X, i) => {
      const band = bandAt(lineOf(fit)!, log10X);
      const predicted = fit.predictions![i]!;
      // Limits that pass through 0 on log10 are compared on the size of the band.
      const near = (found: number, expected: number): [number, number] => [found - expected + 1, 1];
      return [
        [`line at ${log10X}`, ...near(band.log10Estimate, predictions.fit_log10[i]!), EXACT],
        [`confidence lower at ${log10X}`, ...near(band.confidence.lower, predictions.conf_lo[i]!), LIMIT],
        [`confidence upper at ${log10X}`, ...near(band.confidence.upper, predictions.conf_hi[i]!), LIMIT],
        [`prediction lower at ${log10X}`, ...near(band.prediction.lower, predictions.pred_lo[i]!), LIMIT],
        [`prediction upper at ${log10X}`, ...near(band.prediction.upper, predictions.pred_hi[i]!), LIMIT],
        [`estimate at ${log10X}`, predicted.estimate, 10 ** predictions.fit_log10[i]!, EXACT * 10],
        [`raw confidence lower at ${log10X}`, predicted.confidence.lower, 10 ** predictions.conf_lo[i]!, LIMIT],
        [`raw confidence upper at ${log10X}`, predicted.confidence.upper, 10 ** predictions.conf_hi[i]!, LIMIT],
        [`raw prediction lower at ${log10X}`, predicted.prediction.lower, 10 ** predictions.pred_lo[i]!, LIMIT],
        [`raw prediction upper at ${log10X}`, predicted.prediction.upper, 10 ** predictions.pred_hi[i]!, LIMIT],
      ] as [string, number, number, number][];
    }))).toEqual([]);
  });

  it('diagnoses every point in the order given', () => {
    const fit = fitOf(reference, 'ols');
    const { points } = reference;
    expect(fit.points.map(({ id }) => id)).toEqual(points.label);
    expect(disagreements(fit.points.flatMap((point, i) => [
      [`fitted of ${point.id}`, point.fittedLog10, points.fitted_log10[i]!, EXACT],
      [`residual of ${point.id}`, point.residual, points.residual[i]!, EXACT],
      [`leverage of ${point.id}`, point.leverage, points.hat[i]!, EXACT],
      [`internal of ${point.id}`, point.internallyStudentised, points.rstandard[i]!, EXACT],
      [`external of ${point.id}`, point.studentised, points.rstudent[i]!, EXACT],
      [`Cook of ${point.id}`, point.cooksDistance, points.cooks[i]!, EXACT],
      [`DFFITS of ${point.id}`, point.dffits, points.dffits[i]!, EXACT],
    ]))).toEqual([]);
  });

  it('carries the Bonferroni p of the classical outlier test', () => {
    const fit = fitOf(reference, 'ols');
    const { name, bonf_p: bonferroni } = reference.outlier_test_top5;
    expect(name).toHaveLength(5);
    expect(disagreements(name.map((id, i) => [
      id, fit.points.find((point) => point.id === id)?.bonferroniP, bonferroni[i]!, EXACT,
    ]))).toEqual([]);
  });

  it('gives the standardised major axis with its limits and tests', () => {
    const fit = fitOf(reference, 'sma');
    const { sma } = reference;
    expect(fit).toMatchObject({ n: sma.n, df: sma.df, method: 'sma', unfit: null });
    expect(disagreements([
      ['slope', fit.exponent?.estimate, sma.slope, EXACT],
      ['slope lower', fit.exponent?.lower, sma.slope_lo, LIMIT],
      ['slope upper', fit.exponent?.upper, sma.slope_hi, LIMIT],
      ['intercept', fit.log10Coefficient?.estimate, sma.intercept, EXACT],
      ['intercept lower', fit.log10Coefficient?.lower, sma.intercept_lo, LIMIT],
      ['intercept upper', fit.log10Coefficient?.upper, sma.intercept_hi, LIMIT],
      ['R²', fit.rSquared, sma.r2, EXACT],
      ...reference.sma_tests.flatMap(({ b0, F, df2, p }, i) => [
        [`F of ${b0}`, fit.tests[i]?.statistic, F, EXACT],
        [`df of ${b0}`, fit.tests[i]?.df, df2, 0],
        [`p of ${b0}`, fit.tests[i]?.p, p, EXACT],
      ] as [string, number | null | undefined, number, number][]),
    ])).toEqual([]);
  });

  it('gives the Theil–Sen line', () => {
    const { log10X, log10Y } = logPoints(referencePoints(reference));
    const line = fitTheilSen(log10X, log10Y);
    expect(line?.pairs).toBe(reference.theil_sen.n_pairs);
    expect(disagreements([
      ['slope', line?.exponent, reference.theil_sen.slope, EXACT],
      ['coefficient', line?.log10Coefficient, reference.theil_sen.intercept_median_y_minus_b_median_x, EXACT],
      ['coefficient of residuals', line?.log10CoefficientOfResiduals, reference.theil_sen.intercept_median_residual, EXACT],
    ])).toEqual([]);
  });
});

describe('the reference files and the tables they came from', () => {
  it.each([
    ['animals28', 'species_common'], ['carnivora112', 'species'], ['mammals62', 'species_common'],
  ])('hold the same values (%s)', (dataset, id) => {
    const [, reference] = referenceFits(dataset)[0]!;
    expect(referencePoints(reference)).toEqual(datasetPoints(`${dataset}.csv`, id, reference.x, reference.y));
  });
});
