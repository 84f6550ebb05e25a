import { readFileSync } from 'node:fs';
import Papa from 'papaparse';
import type { FitPoint } from '../../../shared/stats/types';

type Row = Record<string, string>;

/** One subset of a reference file, as far as these tests read it. */
export interface ReferenceFit {
  x: string;
  y: string;
  n: number;
  df: number;
  ols: Record<'slope' | 'intercept' | 'se_slope' | 'se_intercept' | 't_slope' | 'p_slope' | 'r2' | 'resid_sd' | 'logLik' | 'AIC', number>
    & { slope_ci95: [number, number]; intercept_ci95: [number, number] };
  slope_tests: { b0: number; t: number; df: number; p: number }[];
  predictions: Record<'x_raw' | 'log10_x' | 'fit_log10' | 'conf_lo' | 'conf_hi' | 'pred_lo' | 'pred_hi', number[]>;
  duan_smearing: number;
  outlier_test_top5: { name: string[]; rstudent: number[]; p: number[]; bonf_p: number[] };
  sma: Record<'slope' | 'slope_lo' | 'slope_hi' | 'intercept' | 'intercept_lo' | 'intercept_hi' | 'r2' | 'n' | 'df', number>;
  sma_tests: { b0: number; r: number; F: number; df1: number; df2: number; p: number }[];
  theil_sen: { slope: number; intercept_median_y_minus_b_median_x: number; intercept_median_residual: number; n_pairs: number };
  points: { label: string[] } & Record<'x_raw' | 'y_raw' | 'fitted_log10' | 'residual' | 'hat' | 'rstandard' | 'rstudent' | 'cooks' | 'dffits', number[]>;
}

function readText(name: string): string {
  return readFileSync(new URL(`../../reference/${name}`, import.meta.url), 'utf8');
}

/** Every subset of a reference file by its name. */
export function referenceFits(dataset: string): [string, ReferenceFit][] {
  const file = JSON.parse(readText(`ref_${dataset}.json`)) as { fits: Record<string, ReferenceFit> };
  return Object.entries(file.fits);
}

/** The rows of a reference CSV, every value as text. */
export function csvRows(name: string): Row[] {
  return Papa.parse<Row>(readText(name), { header: true, skipEmptyLines: true }).data;
}

/** The points that a reference fit was made from. */
export function referencePoints(fit: ReferenceFit): FitPoint[] {
  return fit.points.label.map((id, i) => ({ id, x: fit.points.x_raw[i]!, y: fit.points.y_raw[i]! }));
}

/** A column pair of a dataset as points. */
export function datasetPoints(name: string, id: string, x: string, y: string): FitPoint[] {
  return csvRows(name).map((row) => ({ id: row[id]!, x: Number(row[x]), y: Number(row[y]) }));
}

/** Structure mass on neurons for the species below a node of the classification. */
export function cladePoints(clade: string, structure: string, without: readonly string[] = []): FitPoint[] {
  const lineages = new Map(csvRows('classification.csv')
    .filter((row) => row.species)
    .map((row) => [row.species!, row.lineage!.split(' > ')]));
  return csvRows('cell_counts.csv')
    .filter((row) => row.structure === structure && row.structure_mass_g && row.neurons)
    .filter((row) => lineages.get(row.species!)?.includes(clade) && !without.includes(row.species!))
    .map((row) => ({ id: row.species!, x: Number(row.neurons), y: Number(row.structure_mass_g) }));
}

/** Relative distance of two numbers (absolute where the expected one is 0). */
export function relativeError(found: number | null | undefined, expected: number): number {
  if (found === null || found === undefined) return Infinity;
  return Math.abs(found - expected) / (expected === 0 ? 1 : Math.abs(expected));
}
