import type { ScalingFitAnswer } from '../../shared/contracts/fits';
import type { Column } from './csv';
import { versionCell, type VersionFacts } from './versionFacts';

/** One contributing record of one species' mean for one pair of variables. */
export interface MeanRow {
  y: string;
  yStructure: string | null;
  x: string;
  xStructure: string | null;
  slug: string;
  species: string;
  meanX: number;
  meanY: number;
  n: number | null;
  record: string;
  weight: number;
  source: string;
  marks: readonly string[];
  setAside: string | null;
  demonstration: boolean;
}

/** One standing fit with the species that entered it and those that were set aside. */
export interface FitRow {
  slug: string;
  y: string;
  yStructure: string | null;
  x: string;
  xStructure: string | null;
  clade: string;
  cladeName: string;
  cladePath: string;
  method: string;
  fit: ScalingFitAnswer;
  species: readonly string[];
  setAside: readonly string[];
  demonstration: boolean;
}

type VersionMark = Pick<VersionFacts, 'label' | 'demonstration'>;

function questionColumns<Row extends Pick<MeanRow, 'y' | 'yStructure' | 'x' | 'xStructure'>>(version: VersionMark): Column<Row>[] {
  return [
    { name: 'version', type: 'string', description: 'Version of the dataset', value: () => versionCell(version) },
    { name: 'y', type: 'string', description: 'Variable on y', value: (row) => row.y },
    { name: 'y_structure', type: 'string', description: 'Structure of y; empty for body mass', value: (row) => row.yStructure },
    { name: 'x', type: 'string', description: 'Variable on x', value: (row) => row.x },
    { name: 'x_structure', type: 'string', description: 'Structure of x; empty for body mass', value: (row) => row.xStructure },
  ];
}

/** Columns of species_means.csv: one row a contributing record, the mean repeated on each. */
export function meanColumns(version: VersionMark): Column<MeanRow>[] {
  return [
    ...questionColumns<MeanRow>(version),
    { name: 'taxon', type: 'string', description: 'Address of the species', value: (row) => row.slug },
    { name: 'species', type: 'string', description: 'Species', value: (row) => row.species },
    { name: 'mean_y', type: 'number', description: 'Mean of y for this pair, in g or counts', fitted: true, value: (row) => row.meanY },
    { name: 'mean_x', type: 'number', description: 'Mean of x for this pair, in g or counts', fitted: true, value: (row) => row.meanX },
    { name: 'n', type: 'integer', description: 'Animals behind the mean; empty where a source does not say', value: (row) => row.n },
    { name: 'record', type: 'string', description: 'Contributing record, see records.csv', value: (row) => row.record },
    { name: 'weight', type: 'number', description: 'Weight of the record in the mean', fitted: true, value: (row) => row.weight },
    { name: 'source', type: 'string', description: 'Source of the record, see sources.csv', value: (row) => row.source },
    { name: 'marks', type: 'string', description: 'What a reader should know of the mean', value: (row) => row.marks.join('; ') },
    { name: 'set_aside', type: 'string', description: 'Reason, where the species is left out of the fits of this pair', value: (row) => row.setAside },
    { name: 'demonstration', type: 'boolean', description: 'True for an invented species of the demonstration', value: (row) => row.demonstration },
  ];
}

function fitted(name: string, description: string, value: (fit: ScalingFitAnswer) => number | null | undefined): Column<FitRow> {
  return { name, type: 'number', description, fitted: true, value: (row) => value(row.fit) ?? null };
}

/** Columns of standing_fits.csv: log10 y = log10 coefficient + exponent · log10 x over species means. */
export function fitColumns(version: VersionMark): Column<FitRow>[] {
  return [
    ...questionColumns<FitRow>(version),
    { name: 'fit', type: 'string', description: 'Permanent address of the standing fit', value: (row) => row.slug },
    { name: 'clade', type: 'string', description: 'Address of the clade', value: (row) => row.clade },
    { name: 'clade_path', type: 'string', description: 'Path of the clade from the root', value: (row) => row.cladePath },
    { name: 'method', type: 'string', description: 'ols: ordinary least squares; sma: standardised major axis', value: (row) => row.method },
    { name: 'n', type: 'integer', description: 'Species in the fit', value: (row) => row.fit.n },
    { name: 'df', type: 'integer', description: 'Degrees of freedom', value: (row) => row.fit.df },
    fitted('exponent', 'Exponent', (fit) => fit.exponent?.estimate),
    fitted('exponent_standard_error', 'Standard error of the exponent', (fit) => fit.exponent?.standardError),
    fitted('exponent_lower', 'Lower limit of the 95 % confidence interval', (fit) => fit.exponent?.lower),
    fitted('exponent_upper', 'Upper limit of the 95 % confidence interval', (fit) => fit.exponent?.upper),
    fitted('log10_coefficient', 'Logarithm to base 10 of the coefficient', (fit) => fit.log10Coefficient?.estimate),
    fitted('log10_coefficient_standard_error', 'Its standard error', (fit) => fit.log10Coefficient?.standardError),
    fitted('residual_sd', 'Residual standard deviation on log10 y', (fit) => fit.residualSd),
    fitted('r_squared', 'Share of the variance on log10 y', (fit) => fit.rSquared),
    fitted('x_lower', 'Least x of the fit', (fit) => fit.xRange?.lower),
    fitted('x_upper', 'Greatest x of the fit', (fit) => fit.xRange?.upper),
    fitted('exponent_leave_one_out_lower', 'Least exponent when any one species is left out', (fit) => fit.leaveOneOut?.lower),
    fitted('exponent_leave_one_out_upper', 'Greatest exponent when any one species is left out', (fit) => fit.leaveOneOut?.upper),
    { name: 'most_moving', type: 'string', description: 'Species whose leaving out moves the exponent most', value: (row) => row.fit.leaveOneOut?.mostMoving ?? null },
    { name: 'unfit', type: 'string', description: 'Why there is no fit', value: (row) => row.fit.unfit?.message ?? null },
    { name: 'species', type: 'string', description: 'Species in the fit', value: (row) => row.species.join('; ') },
    { name: 'set_aside', type: 'string', description: 'Species set aside from the fit', value: (row) => row.setAside.join('; ') },
    { name: 'demonstration', type: 'boolean', description: 'True where an invented species of the demonstration is in the fit', value: (row) => row.demonstration },
  ];
}
