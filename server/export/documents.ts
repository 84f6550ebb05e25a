import type { VersionPage } from '../../shared/contracts/versions';
import { scopeText } from './recordsFile';
import { datasetName, dayOf, demonstrationSentence, type VersionFacts } from './versionFacts';

type Summary = Pick<VersionPage, 'counts' | 'changes' | 'setAside' | 'standingFits'>;

const paragraph = (...lines: string[]): string => `${lines.join('\n')}\n`;
const joined = (...paragraphs: readonly (string | null)[]): string => paragraphs.filter((text) => text !== null).join('\n');
const demonstrationParagraph = (version: VersionFacts): string | null => (version.demonstration ? paragraph(`**${demonstrationSentence}**`) : null);
const doiText = (version: VersionFacts): string => version.doi ?? 'not minted';

/** README.md of a version. */
export function readmeText(version: VersionFacts, summary: Summary): string {
  const { counts } = summary;
  return joined(
    paragraph(`# ${version.title}`),
    demonstrationParagraph(version),
    paragraph(
      `Frozen ${version.frozenAt} (UTC). DOI: ${doiText(version)}. Licence: see LICENSE.`,
      `${counts.records} records of ${counts.species} species, ${counts.structures} structures, ${counts.specimens} specimens and ${counts.sources} sources.`,
    ),
    version.note === '' ? null : paragraph(version.note),
    paragraph(
      '## Files',
      '- records.csv: one row a record, masses in g, counts scaled up to the whole structure, per-mg values those of the tissue counted',
      '- species_means.csv: the means that entered the standing fits, with every contributing record and its weight',
      '- standing_fits.csv: log10 y = log10 coefficient + exponent · log10 x over species means, a row a standing fit',
      '- sources.csv, sources.bib: the primary sources of the rows',
      '- datapackage.json: types, units and keys of the tables (Data Package 2.0)',
      '- CITATION.cff, CHANGES.md, LICENSE',
      '- CHECKSUMS.sha256: SHA-256 of every other file; its own SHA-256 names the version',
    ),
    paragraph(
      '## Reading the tables',
      'CSV by RFC 4180, UTF-8, lines ended by LF. An empty cell is a missing value. Entered and derived numbers stand in the shortest form',
      'that reads back the same, fitted ones at 12 significant digits. A text that a spreadsheet would take for a formula has an apostrophe before it.',
      'A record that is set aside stays listed: `set_aside` says from which fits it is left out, and why.',
    ),
  );
}

export function licenceText(version: VersionFacts): string {
  return joined(
    paragraph(version.title),
    version.demonstration ? paragraph(demonstrationSentence) : null,
    paragraph(
      'Contributions of laboratories and the compilation are licensed under the Creative Commons Attribution 4.0 International licence (CC BY 4.0),',
      'https://creativecommons.org/licenses/by/4.0/legalcode',
    ),
    paragraph('Values of publications are facts; each carries its source, and no claim is made to them. Cite the sources of the rows you use (sources.bib).'),
  );
}

const changeLines = (title: string, lines: readonly string[]): string => paragraph(`## ${title}: ${lines.length}`, ...(lines.length === 0 ? [] : ['', ...lines.map((line) => `- ${line}`)]));

/** A number as a table of exponents prints it; two versions are subtracted as printed. */
const threeDecimals = (value: number): string => value.toFixed(3);

function exponentLine(fit: Summary['standingFits'][number]): string {
  const now = fit.exponent === null ? `no fit (${fit.unfit ?? 'too few species'})` : threeDecimals(fit.exponent);
  return `${fit.title}: ${fit.previous === null ? '' : `${threeDecimals(fit.previous)} (n = ${fit.previousN ?? 0}) → `}${now} (n = ${fit.n})`;
}

/** CHANGES.md: what came, changed and went since the previous version, and how each standing exponent moved. */
export function changesText(version: VersionFacts, { changes, setAside, standingFits }: Summary): string {
  const since = changes.previous === null ? 'This is the first version.' : `Since version ${changes.previous}.`;
  const row = ({ number, species, structure }: { number: string; species: string; structure: string }) => `${number} ${species}, ${structure}`;
  return joined(
    paragraph(`# Changes of ${version.title}`),
    demonstrationParagraph(version),
    paragraph(since),
    changeLines('Came', changes.came.map(row)),
    changeLines('Changed by a new revision', changes.revised.map((item) => `${row(item)}: revision ${item.from} → ${item.to}`)),
    changeLines('Went', changes.went.map((item) => `${row(item)}: ${item.reason}`)),
    changeLines('Set aside since then', changes.setAside.map((item) => `${row(item)}: ${item.reason}`)),
    changeLines('Set aside in this version', setAside.map((item) => `${row(item)}, ${scopeText(item.scope)}: ${item.reason}`)),
    changeLines('Standing exponents', standingFits.map(exponentLine)),
  );
}

/** A YAML text in double quotes, which JSON's form is. */
const yaml = (text: string): string => JSON.stringify(text);

function cffAuthor({ name, orcid }: VersionFacts['contributors'][number]): string {
  const words = name.trim().split(/\s+/);
  const family = words.at(-1) ?? name;
  const given = words.slice(0, -1).join(' ');
  const lines = given === '' ? [`  - name: ${yaml(name)}`] : [`  - family-names: ${yaml(family)}`, `    given-names: ${yaml(given)}`];
  // An entity is written without an ORCID iD; whoever has one is a person with two names in practice.
  if (given !== '' && orcid !== null) lines.push(`    orcid: ${yaml(`https://orcid.org/${orcid}`)}`);
  return lines.join('\n');
}

/** CITATION.cff, Citation File Format 1.2.0. */
export function citationCff(version: VersionFacts): string {
  const authors = version.contributors.length === 0 ? `  - name: ${yaml('Allokarya register')}` : version.contributors.map(cffAuthor).join('\n');
  const lines = [
    ...(version.demonstration ? [`# ${demonstrationSentence}`] : []),
    'cff-version: 1.2.0',
    `message: ${yaml(version.demonstration ? demonstrationSentence : 'Cite this version, and the primary sources of the rows you use.')}`,
    'type: dataset',
    `title: ${yaml(version.demonstration ? version.title : datasetName)}`,
    `version: ${yaml(version.label)}`,
    `date-released: ${yaml(dayOf(version.frozenAt))}`,
    'license: CC-BY-4.0',
    ...(version.doi === null ? [] : [`doi: ${yaml(version.doi)}`]),
    'authors:',
    authors,
  ];
  return paragraph(...lines);
}

/** CHECKSUMS.sha256, in the form that sha256sum checks; a line that begins with # is a comment to it. */
export function checksumsText(version: VersionFacts, files: readonly { name: string; sha256: string }[]): string {
  const head = [`# ${version.title}`, ...(version.demonstration ? [`# ${demonstrationSentence}`] : [])];
  const sorted = [...files].sort((a, b) => (a.name < b.name ? -1 : 1));
  return paragraph(...head, ...sorted.map(({ name, sha256 }) => `${sha256}  ${name}`));
}
