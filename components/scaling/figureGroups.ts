import type { ScalingAnswer, ScalingFitAnswer } from '../../shared/contracts/fits';
import { lineOf } from '../../shared/stats/bands';
import type { FigureGroup, FigurePoint } from '../charts/figureTypes';
import type { StoredFit } from '../charts/geometry';

export type SpeciesPoint = ScalingAnswer['species'][number];
export type FittedPoint = ScalingFitAnswer['points'][number];

/** A clade of the answer with its fit, the species that made it and those listed but left out of it. */
export interface CladeResult {
  slug: string;
  name: string;
  fit: ScalingFitAnswer;
  fitted: readonly { species: SpeciesPoint; point: FittedPoint }[];
  aside: readonly SpeciesPoint[];
}

/** A stored fit as the figure draws it: its bands where the method has them, else the line alone. */
function storedFit(fit: ScalingFitAnswer): StoredFit | null {
  const { exponent, log10Coefficient, xRange, n } = fit;
  if (exponent === null || log10Coefficient === null || xRange === null) return null;
  const line = lineOf(fit);
  if (line) return { ...line, xRange };
  return { exponent: exponent.estimate, log10Coefficient: log10Coefficient.estimate, residualSd: null, tCritical: null, n, meanLog10X: 0, sxx: 0, xRange };
}

/**
 * Joins fits and species by clade. A species that is left out carries only the lowest clade it belongs to:
 * it goes to the group that holds others of that clade.
 */
export function cladeResults(answer: ScalingAnswer): CladeResult[] {
  const bySlug = new Map(answer.species.map((species) => [species.slug, species]));
  const groups = answer.clades.flatMap(({ slug, name }) => {
    const fit = answer.fits.find(({ group }) => group === slug);
    if (!fit) return [];
    const fitted = fit.points.flatMap((point) => {
      const species = bySlug.get(point.id);
      return species ? [{ species, point }] : [];
    });
    return [{ slug, name, fit, fitted, members: new Set([slug, ...fitted.map(({ species }) => species.clade)]) }];
  });
  const aside = answer.species.filter(({ setAside }) => setAside !== null);
  const homeOf = (species: SpeciesPoint) =>
    groups.find(({ slug }) => slug === species.clade) ?? groups.find(({ members }) => members.has(species.clade)) ?? groups[0];
  return groups.map(({ members: _members, ...group }) => ({ ...group, aside: aside.filter((species) => homeOf(species)?.slug === group.slug) }));
}

/** "flagged, t = 3.24": what stands beside the name of a flagged point. */
export function flagNote(point: FittedPoint): string {
  const word = point.flags.filter((flag) => flag !== 'none').join(', ') || 'flagged';
  return point.studentised === null ? word : `${word}, t = ${point.studentised.toFixed(2).replace('-', '−')}`;
}

export function figureGroups(results: readonly CladeResult[]): FigureGroup[] {
  return results.map(({ slug, name, fit, fitted, aside }) => ({
    key: slug,
    label: name,
    fit: storedFit(fit),
    points: [
      ...fitted.map(({ species, point }): FigurePoint => ({ ...place(species), flag: point.flag !== 'none', note: point.flag === 'none' ? undefined : flagNote(point), setAside: false })),
      ...aside.map((species): FigurePoint => ({ ...place(species), flag: false, setAside: true })),
    ],
  }));
}

function place({ slug, species, x, y }: SpeciesPoint): Pick<FigurePoint, 'id' | 'label' | 'x' | 'y' | 'href'> {
  return { id: slug, label: species, x, y, href: `/species/${slug}` };
}

/** Where a species stands in the answer. */
export interface FoundSpecies {
  result: CladeResult;
  species: SpeciesPoint;
  /** Null where it is left out of the fit. */
  point: FittedPoint | null;
}

export function findSpecies(results: readonly CladeResult[], slug: string | null): FoundSpecies | null {
  for (const result of results) {
    const fitted = result.fitted.find(({ species }) => species.slug === slug);
    if (fitted) return { result, ...fitted };
    const species = result.aside.find((other) => other.slug === slug);
    if (species) return { result, species, point: null };
  }
  return null;
}

/** Flagged species over all clades, the furthest off the line first. */
export function flaggedSpecies(results: readonly CladeResult[]): (FoundSpecies & { point: FittedPoint })[] {
  return results
    .flatMap((result) => result.fitted.filter(({ point }) => point.flag !== 'none').map((found) => ({ result, ...found })))
    .sort((a, b) => Math.abs(b.point.studentised ?? 0) - Math.abs(a.point.studentised ?? 0));
}

/** Records that entered the fits shown, each once. */
export function recordsUsed(results: readonly CladeResult[]): string[] {
  return [...new Set(results.flatMap(({ fitted }) => fitted.flatMap(({ species }) => species.contributions.map(({ record }) => record))))].sort();
}
