import type { FieldError } from '../../../shared/contracts/problems';
import { recordNumber, recordSerial } from '../../../shared/domain/identifiers';
import type { RecordRow } from '../../../shared/contracts/records';
import type { Context } from '../../context';
import { AppError } from '../../errors';
import { sourceBibtex, versionBibtex } from '../../export/bibtex';
import { citationText } from '../../export/citationText';
import { loadVersionRows } from '../dataset/rows';
import { versionFacts } from './facts';
import { addressOf, type FrozenVersion } from './readVersions';

/** The rows of the record numbers asked for, each once; every unknown number is named. */
function rowsOf(rows: readonly RecordRow[], numbers: readonly string[], label: string): RecordRow[] {
  const byNumber = new Map(rows.map((row) => [row.number, row]));
  const errors: FieldError[] = [];
  const found = numbers.flatMap((text) => {
    const serial = recordSerial(text);
    const row = serial === null ? undefined : byNumber.get(recordNumber(serial));
    if (row === undefined) errors.push({ path: 'records', message: `A record of version ${label} was expected, such as AK-000012; found "${text.slice(0, 40)}"` });
    return row === undefined ? [] : [row];
  });
  if (errors.length > 0) throw new AppError('invalid-input', `${errors.length === 1 ? 'One record is' : `${errors.length} records are`} not in version ${label}.`, { errors });
  return [...new Set(found)];
}

/** Primary sources of rows, each once, by year and then by citation. */
function sourcesOf(rows: readonly RecordRow[]) {
  const found = new Map<string, { key: string; citation: string; doi: string | null; year: number | null; demonstration: boolean }>();
  for (const { sourceKey, sourceCitation, sourceDoi, sourceYear, demonstration } of rows) found.set(sourceKey, { key: sourceKey, citation: sourceCitation, doi: sourceDoi, year: sourceYear, demonstration });
  return [...found.values()].sort((a, b) => (a.year ?? 9999) - (b.year ?? 9999) || (a.citation < b.citation ? -1 : 1));
}

/**
 * How to cite a version, or some of its records: then the primary sources of exactly these rows follow.
 * @param records record numbers; null for the whole version
 * @throws invalid-input naming every number that is not in the version
 */
export async function citeVersion(context: Context, version: FrozenVersion, style: 'text' | 'bibtex', records: readonly string[] | null): Promise<string> {
  const { row, summary, frozenAt, sha256 } = version;
  const label = String(row.number);
  const facts = versionFacts(row, summary.contributors, frozenAt);
  const address = addressOf(context, label);
  const rows = records === null ? null : rowsOf((await loadVersionRows(context.db, row.number)).map((one) => one.row), records, label);
  const sources = rows === null ? null : sourcesOf(rows);
  if (style === 'bibtex') return [versionBibtex(facts, address, sha256), ...(sources ?? []).map(sourceBibtex)].join('\n');
  return citationText(facts, address, sources?.map(({ citation, doi }) => (doi === null || citation.includes(doi) ? citation : `${citation}. https://doi.org/${doi}`)) ?? null);
}
