import type { ScalingFitAnswer } from '../../../shared/contracts/fits';
import type { MeanPoint, SpeciesMeans } from './means';
import { isMadeFromTheOther, type Question } from './questions';
import type { Taxonomy } from './taxonomy';
import { liesIn } from './taxonomy';

interface Drawn {
  question: Question;
  clades: readonly { slug: string; name: string; path: string }[];
  fits: readonly ScalingFitAnswer[];
  /** Species in any of the fits. */
  fitted: readonly MeanPoint[];
  aside: readonly MeanPoint[];
  means: SpeciesMeans;
  taxonomy: Taxonomy;
}

const speciesCount = (n: number) => (n === 1 ? '1 species' : `${n} species`);
const listed = (names: readonly string[]) => [...names].sort().join(', ');

/** "Mass states are mixed: fixed (9 species), fresh (1 species)." or nothing where one alone is stated. */
function mixed(what: string, points: readonly MeanPoint[], pick: (point: MeanPoint) => readonly string[]): string[] {
  const counts = new Map<string, number>();
  for (const point of points) for (const value of pick(point)) counts.set(value, (counts.get(value) ?? 0) + 1);
  if (counts.size < 2) return [];
  const parts = [...counts].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1)).map(([value, n]) => `${value} (${speciesCount(n)})`);
  return [`${what} are mixed: ${parts.join(', ')}.`];
}

function marked(points: readonly MeanPoint[], mark: string, sentence: (names: string) => string): string[] {
  const names = points.filter(({ marks }) => marks.includes(mark)).map(({ species }) => species);
  return names.length === 0 ? [] : [sentence(listed(names))];
}

/** Leverage above 4/n: one species far out in x, which a small fit hangs on. */
function farOut({ fits, clades, fitted }: Drawn): string[] {
  return fits.flatMap((fit) =>
    fit.points
      .filter(({ leverage }) => leverage !== null && leverage > 4 / fit.n)
      .map(({ id, leverage }) => {
        const clade = clades.find(({ slug }) => slug === fit.group)?.name ?? 'the fit';
        return `${fitted.find(({ slug }) => slug === id)?.species ?? id} lies far out in x among ${fit.n} ${clade} (leverage ${leverage?.toFixed(2)}): the line hangs on it.`;
      }),
  );
}

/** Nodes above several clades that have lines of their own. */
function pooledGrades({ clades, taxonomy, fitted }: Drawn): string[] {
  return clades.flatMap((clade) => {
    const below = taxonomy.standing.filter((node) => node.path.startsWith(`${clade.path} > `) && fitted.some((point) => liesIn(point.lineage, node)));
    const apart = below.filter((node) => !below.some((other) => node.path.startsWith(`${other.path} > `)));
    return apart.length < 2 ? [] : [`${clade.name} pools clades with lines of their own: ${apart.map(({ name }) => name).join(', ')}.`];
  });
}

/** What was left out of the means, by reason; set-asides are said species by species. */
function leftOut({ means, clades }: Drawn, lineages: ReadonlyMap<string, readonly string[]>): string[] {
  const byReason = new Map<string, Set<string>>();
  for (const { reason, recordNumber, taxonSlug } of means.leftOut) {
    const lineage = lineages.get(taxonSlug);
    if (reason.startsWith('Set aside: ') || (lineage !== undefined && !clades.some((clade) => liesIn(lineage, clade)))) continue;
    byReason.set(reason, (byReason.get(reason) ?? new Set()).add(recordNumber));
  }
  return [...byReason].map(([reason, numbers]) => {
    const some = [...numbers].sort();
    const shown = some.length > 5 ? `${some.slice(0, 5).join(', ')} and ${some.length - 5} more` : some.join(', ');
    return `Left out: ${shown}. ${reason}`;
  });
}

/**
 * Remarks on what a set of fits mixes, leaves out or hangs on, for all to read beside the figure.
 * @param lineages lineage of every species of the dataset, by slug
 * @returns plain sentences, the set-asides first; none where there is nothing to say
 */
export function scalingRemarks(drawn: Drawn, lineages: ReadonlyMap<string, readonly string[]>): string[] {
  const { question, fitted, aside } = drawn;
  const open = [...new Set(fitted.flatMap(({ rows }) => rows.filter((row) => row.openRecheck).map((row) => row.number)))];
  return [
    ...aside.map(({ species, setAside }) => `${species} is set aside: ${setAside}`),
    ...(isMadeFromTheOther(question) ? ['One of the two is made from the other: part of the exponent holds by construction, and R² is not given.'] : []),
    ...mixed('Mass states', fitted, ({ massStates }) => massStates),
    ...mixed('Methods of counting', fitted, ({ countingMethods }) => countingMethods),
    ...mixed('Delineations', fitted, ({ delineations }) => delineations),
    ...marked(fitted, 'demonstration', (names) => `Demonstration data, invented: ${names}.`),
    ...marked(fitted, 'domestic', (names) => `Domestic animals: ${names}.`),
    ...marked(fitted, 'strain', (names) => `Laboratory strains: ${names}.`),
    ...marked(fitted, 'hybrid', (names) => `Hybrids: ${names}.`),
    ...marked(fitted, 'name at genus level', (names) => `Named at genus level only: ${names}.`),
    ...farOut(drawn),
    ...pooledGrades(drawn),
    ...leftOut(drawn, lineages),
    ...(open.length === 0 ? [] : [`A re-check is open on ${listed(open)}.`]),
  ];
}
