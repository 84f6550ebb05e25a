import Papa from 'papaparse';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import type { CladeResult } from './figureGroups';

/** The numbers of the figure as CSV, one row a species and clade; a cell that a spreadsheet would run as a formula is escaped. */
export function pointsCsv(answer: ScalingAnswer, results: readonly CladeResult[]): string {
  const { question, version } = answer;
  const rows = results.flatMap(({ slug, fit, fitted, aside }) => {
    const shared = (species: CladeResult['aside'][number]) => ({
      version,
      clade: slug,
      species: species.species,
      y: species.y,
      x: species.x,
      animals: species.n ?? '',
    });
    const rest = (species: CladeResult['aside'][number]) => ({
      marks: species.marks.join('; '),
      records: species.contributions.map(({ record, weight }) => `${record} ${weight}`).join('; '),
      y_variable: question.y,
      y_structure: question.yStructure ?? '',
      x_variable: question.x,
      x_structure: question.xStructure ?? '',
      method: fit.method,
      exponent: fit.exponent?.estimate ?? '',
      demonstration: species.demonstration,
    });
    return [
      ...fitted.map(({ species, point }) => ({
        ...shared(species),
        in_fit: true,
        residual_log10: point.residual ?? '',
        studentised_residual: point.studentised ?? '',
        leverage: point.leverage ?? '',
        cooks_distance: point.cooksDistance ?? '',
        flag: point.flags.join('; '),
        reason: point.reasons.join(' '),
        ...rest(species),
      })),
      ...aside.map((species) => ({
        ...shared(species),
        in_fit: false,
        residual_log10: '',
        studentised_residual: '',
        leverage: '',
        cooks_distance: '',
        flag: '',
        reason: species.setAside ?? '',
        ...rest(species),
      })),
    ];
  });
  return Papa.unparse(rows, { escapeFormulae: true, newline: '\n' });
}
