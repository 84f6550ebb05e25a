import { datasetName, dayOf, demonstrationSentence, type VersionFacts } from './versionFacts';

/** How many people a text citation names before it counts the others. */
const namesShown = 4;

/** "Ines Maria Okonkwo" → "Okonkwo IM": the last word is taken for the family name. */
export function shortName(name: string): string {
  const words = name.trim().split(/\s+/);
  const family = words.at(-1) ?? '';
  const initials = words.slice(0, -1).map((word) => [...word][0]?.toUpperCase() ?? '').join('');
  return initials === '' ? family : `${family} ${initials}`;
}

function authorsText(contributors: VersionFacts['contributors']): string {
  if (contributors.length === 0) return 'Allokarya register';
  const shown = contributors.slice(0, namesShown).map(({ name }) => shortName(name));
  const others = contributors.length - shown.length;
  if (others > 0) return `${shown.join(', ')}, and ${others} ${others === 1 ? 'other' : 'others'}`;
  return shown.join(', ');
}

/**
 * A version's citation in plain text: contributors, year, title, version, DOI, date, address.
 * @param sources citations of the primary sources, where a subset is cited; they follow, one a line
 */
export function citationText(version: VersionFacts, address: string, sources: readonly string[] | null): string {
  const doi = version.doi === null ? 'DOI not minted' : `https://doi.org/${version.doi}`;
  const whole = `${authorsText(version.contributors)} (${version.frozenAt.slice(0, 4)}). ${datasetName}, version ${version.label}. ${doi}. Frozen ${dayOf(version.frozenAt)}. ${address}`;
  const parts = [version.demonstration ? `${whole}\n${demonstrationSentence}` : whole];
  if (sources !== null) parts.push(`Primary sources of the rows used:\n${sources.join('\n')}`);
  return `${parts.join('\n\n')}\n`;
}
