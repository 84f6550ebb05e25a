import type { SourceRow } from './sourcesFile';
import { dayOf, demonstrationSentence, type VersionFacts } from './versionFacts';

const special: Record<string, string> = { '\\': '\\textbackslash{}', '{': '\\{', '}': '\\}', '&': '\\&', '%': '\\%', $: '\\$', '#': '\\#', _: '\\_', '~': '\\textasciitilde{}', '^': '\\textasciicircum{}' };
const escaped = (text: string): string => text.replace(/[\\{}&%$#_~^]/g, (character) => special[character] ?? character).replace(/\s+/g, ' ');
/** Keys hold letters, digits and hyphens only. */
export const bibtexKey = (text: string): string => text.normalize('NFD').replace(/[^A-Za-z0-9]+/g, '-').replace(/^-+|-+$/g, '') || 'source';

type Field = readonly [name: string, value: string];

function entryText(kind: string, key: string, fields: readonly (Field | null)[]): string {
  const lines = fields.filter((field): field is Field => field !== null).map(([name, value]) => `  ${name} = {${value}}`);
  return `@${kind}{${key},\n${lines.join(',\n')}\n}\n`;
}

/** DOI and address are read by programs as they are and are not escaped. */
const doiField = (doi: string | null): Field | null => (doi === null ? null : ['doi', doi]);

/** "Kazu RS et al. 2014 Front Neuroanat 8:128" in its parts; null for a citation of another form. */
function journalArticle(citation: string) {
  const match = /^(.+?) (\d{4})[a-z]? (.+?) (\d+):([A-Za-z]?\d+(?:-\d+)?)$/.exec(citation.trim());
  if (match === null) return null;
  const [, authors = '', year = '', journal = '', volume = '', pages = ''] = match;
  const names = authors.split(/, | et al\.?$/).map((name) => name.trim()).filter((name) => name !== '');
  const bibtexNames = names.map((name) => name.replace(/^(.*) (\S+)$/, '$1, $2'));
  if (/ et al\.?$/.test(authors)) bibtexNames.push('others');
  return { authors: bibtexNames.map(escaped).join(' and '), year, journal: escaped(journal), volume, pages: pages.replace('-', '--') };
}

export function sourceBibtex({ key, citation, doi, year, demonstration }: Pick<SourceRow, 'key' | 'citation' | 'doi' | 'year' | 'demonstration'>): string {
  const mark: Field | null = demonstration ? ['note', 'Invented for the demonstration'] : null;
  const article = journalArticle(citation);
  if (article === null) return entryText('misc', bibtexKey(key), [['title', escaped(citation)], year === null ? null : ['year', String(year)], doiField(doi), mark]);
  return entryText('article', bibtexKey(key), [['author', article.authors], ['journal', article.journal], ['year', article.year], ['volume', article.volume], ['pages', article.pages], doiField(doi), mark]);
}

/** sources.bib: the primary sources of the rows. */
export function bibliographyText(version: VersionFacts, sources: readonly SourceRow[]): string {
  const head = [`Primary sources of ${version.title}`, ...(version.demonstration ? [demonstrationSentence] : [])];
  return `${head.map((line) => `% ${line}\n`).join('')}\n${sources.map(sourceBibtex).join('\n')}`;
}

/** One entry for the version itself. `address` is where it can be read, `sha256` that of its manifest. */
export function versionBibtex(version: VersionFacts, address: string, sha256: string): string {
  const authors = version.contributors.length === 0 ? '{Allokarya register}' : version.contributors.map(({ name }) => escaped(name)).join(' and ');
  const notes = [`Version ${version.label}`, `frozen ${dayOf(version.frozenAt)}`, ...(version.doi === null ? ['DOI not minted'] : []), `SHA-256 of the manifest ${sha256}`, ...(version.demonstration ? [demonstrationSentence] : [])];
  return entryText('misc', `allokarya-version-${version.label}`, [
    ['author', authors],
    ['title', escaped(version.title)],
    ['year', version.frozenAt.slice(0, 4)],
    ['month', String(Number(version.frozenAt.slice(5, 7)))],
    ['version', version.label],
    ['note', escaped(notes.join('; '))],
    doiField(version.doi),
    ['url', address],
  ]);
}
