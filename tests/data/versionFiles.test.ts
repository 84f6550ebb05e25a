import { describe, expect, it } from 'vitest';
import { csvText, type Column } from '../../server/export/csv';
import { versionTitle, type VersionFacts } from '../../server/export/versionFacts';
import { buildVersionFiles } from '../../server/services/versions/buildFiles';
import { compareRows } from '../../server/services/versions/changes';
import { contributorsOf, countRows, setAsidesOf } from '../../server/services/versions/summary';
import type { RecordRow } from '../../shared/contracts/records';

const row: RecordRow = {
  number: 'AK-000300', revision: 1, kind: 'specimen', taxonSlug: 'inventus-exemplum', species: 'Inventus exemplum', nameAsEntered: 'Inventus exemplum', qualifier: 'none', named: true,
  lineage: ['Mammalia', 'Rodentia'], origin: 'captive', demonstration: true, structure: 'cerebellum', definitionVersion: 1, composition: '', delineation: [], specimen: 'X-1', pooledWith: ['X-2'], sex: 'female',
  ageClass: 'adult', sourceKey: 'lab:1', sourceCitation: 'Invented laboratory, unpublished specimens', sourceDoi: null, sourceYear: null, sourcePlace: '', sharesAnimalsWith: [], lab: 'Invented laboratory',
  contributors: [{ name: 'Ines Okonkwo', orcid: null }], n: 2, centre: 'arithmetic', spreadKind: 'SE', bodyMassG: 20, bodyMassError: null, bodyMassKind: 'measured', structureMassG: 0.1 + 0.2, structureMassError: null,
  cells: 1e7, cellsError: 1, neurons: 5e6, neuronsError: 1, otherCells: 5e6, otherCellsError: 1, cellsPerMg: 33333, neuronsPerMg: 16666, otherToNeuronRatio: 1, massState: 'fixed', fixation: 'perfused',
  method: 'isotropic fractionation, by eye', scaledUp: '', printedDifferently: '', note: '=1+1', approval: '', setAside: [], openRecheck: false, approvedAt: '2031-01-01T00:00:00.000Z', approvedBy: 'Somebody',
};

function filesOf(demonstration: boolean) {
  const rows = [{ ...row, demonstration }];
  const contributors = contributorsOf(rows);
  const version: VersionFacts = { label: '2', title: versionTitle('2', demonstration), demonstration, frozenAt: '2031-02-03T23:30:00.000Z', licence: 'CC BY 4.0', note: '', doi: null, contributors };
  const summary = { counts: countRows(rows), changes: compareRows(null, rows, new Map()), contributors, setAside: setAsidesOf(rows), standingFits: [], previous: null };
  const source = { key: 'lab:1', kind: 'lab', citation: row.sourceCitation, doi: null, year: null, carrier: '', licence: '', demonstration };
  return buildVersionFiles(version, summary, rows, [], [source]);
}

describe('the files of a version', () => {
  it('say in every one of them that it holds demonstration records', () => {
    for (const { name, content, rows } of filesOf(true)) {
      // A table without rows has nothing to mistake; its header names the column.
      expect(content.toString('utf8'), name).toMatch(rows === 0 ? /demonstration/ : /demonstration records/);
    }
  });

  it('say nothing of demonstration records where there are none', () => {
    for (const { name, content } of filesOf(false)) expect(content.toString('utf8'), name).not.toMatch(/demonstration records/);
  });

  it('list every other file with its checksum in the manifest', () => {
    const files = filesOf(true);
    const manifest = files.at(-1)?.content.toString('utf8') ?? '';
    for (const { name, sha256 } of files.slice(0, -1)) expect(manifest).toContain(`${sha256}  ${name}\n`);
  });

  it('count an animal pooled with another as two, and name its contributor in the citation file', () => {
    expect(countRows([row]).specimens).toBe(2);
    expect(filesOf(true).find(({ name }) => name === 'CITATION.cff')?.content.toString('utf8')).toContain('family-names: "Okonkwo"\n    given-names: "Ines"');
  });
});

describe('a table', () => {
  const columns: Column<string | number>[] = [
    { name: 'entered', type: 'string', description: '', value: (value) => value },
    { name: 'fitted', type: 'number', description: '', fitted: true, value: (value) => (typeof value === 'number' ? value : null) },
  ];

  it.each(['=1+1', '+1', '-1', '@a', '\ta'])('keeps the text %j from being run as a formula', (text) => {
    expect(csvText(columns, [text]).split('\n')[1]).toBe(`'${text},`);
  });

  it('quotes commas, quotes and line breaks, and makes every line break LF', () => {
    expect(csvText(columns, ['a,"b"\r\nc'])).toBe('entered,fitted\n"a,""b""\nc",\n');
  });

  it('writes numbers shortest, negative ones as they are, fitted ones at 12 digits', () => {
    expect(csvText(columns, [0.1 + 0.2, -0.5])).toBe('entered,fitted\n0.30000000000000004,0.3\n-0.5,-0.5\n');
  });
});
