import { findStructureNames } from '../../../db/queries/species';
import type { ScalingAnswer, ScalingFitAnswer } from '../../../shared/contracts/fits';
import { formatExponent } from '../../../shared/domain/quantityText';
import { fitScaling } from '../../../shared/stats/fit';
import { unfitGroup } from '../../../shared/stats/scalingAnswer';
import { exponentSentence } from '../../../shared/stats/sentences';
import { today, type Context } from '../../context';
import { toFitAnswer } from './fitAnswer';
import { speciesMeansFor, type MeanPoint } from './means';
import { keepAnswer, requirePublished } from './publishedData';
import { exponentWords, isMadeFromTheOther, questionTitle } from './questions';
import { loadWorkingRows, type DatasetRow } from './rows';
import { readScalingQuery, type ScalingQuery, type ScalingQuestion } from './scalingQuestion';
import { scalingRemarks } from './scalingRemarks';
import { leastStandingSpecies, statedExponents, toFitPoint } from './standingFits';
import { liesIn, loadTaxonomy, type Taxonomy } from './taxonomy';

type Clade = { slug: string; name: string; path: string };
const leastSpecies = 3;
const leftOutOnRequest = 'left out by this question.';

function fitClade(clade: Clade, points: readonly MeanPoint[], question: ScalingQuestion, emptyReason: string | null): ScalingFitAnswer {
  const fitPoints = points.map(toFitPoint(clade.slug));
  if (fitPoints.length === 0) {
    const message = emptyReason ?? `No species of ${clade.name} holds both values of the same animals.`;
    return toFitAnswer(unfitGroup(clade.slug, question.method, [], question.level, { code: 'too-few-points', message }));
  }
  const [fit] = fitScaling({ points: fitPoints, method: question.method, level: question.level, against: statedExponents }).fits;
  if (fit === undefined) throw new Error('A fit of points gave no answer.');
  const answer = toFitAnswer(fit);
  return isMadeFromTheOther(question) ? { ...answer, rSquared: null } : answer;
}

function sentenceOf(clade: Clade, fit: ScalingFitAnswer, question: ScalingQuestion): string {
  if (fit.unfit !== null || fit.exponent === null) return `${clade.name}: ${fit.unfit?.message ?? 'no line.'}`;
  const { estimate, lower, upper } = fit.exponent;
  const range = lower === null || upper === null ? '' : ` (${formatExponent(lower)} to ${formatExponent(upper)})`;
  const words = exponentWords(question);
  if (words === null || lower === null || upper === null || isMadeFromTheOther(question)) {
    return `In ${clade.name}, ${questionTitle(question)} has an exponent of ${formatExponent(estimate)}${range}.`;
  }
  const against = fit.tests.find(({ exponent }) => exponent === 1)?.p ?? null;
  return `In ${clade.name}, ${exponentSentence(words, { lower, upper }, against)}.`;
}

/** Clades with standing fits and five species; of nested ones the lower. */
function defaultClades(taxonomy: Taxonomy, points: readonly MeanPoint[]): Clade[] {
  const able = (least: number) => taxonomy.standing.filter((node) => points.filter(({ lineage }) => liesIn(lineage, node)).length >= least);
  const nodes = able(leastStandingSpecies).length > 0 ? able(leastStandingSpecies) : able(leastSpecies);
  return nodes.filter((node) => !nodes.some((other) => other.path.startsWith(`${node.path} > `)));
}

/**
 * Answers a scaling question from rows.
 * @param label the version's label, or `working`
 * @param rows rows of that dataset
 * @returns one fit a clade with species means, sentences and remarks; what gives no line says why
 */
export function answerScaling(label: string, rows: readonly DatasetRow[], taxonomy: Taxonomy, question: ScalingQuestion): ScalingAnswer {
  const means = speciesMeansFor(rows, question);
  const onRequest = new Set(question.without);
  const inFit = means.points.filter(({ slug }) => !onRequest.has(slug));
  const hollow = [...means.aside, ...means.points.filter(({ slug }) => onRequest.has(slug)).map((point) => ({ ...point, setAside: leftOutOnRequest }))];
  const clades: Clade[] = question.clades ?? defaultClades(taxonomy, means.points);
  const isDrawn = ({ lineage, species }: MeanPoint) => clades.some((clade) => liesIn(lineage, clade, species));
  const fits = clades.map((clade) => fitClade(clade, inFit.filter(({ lineage, species }) => liesIn(lineage, clade, species)), question, means.emptyReason));
  const fitted = inFit.filter(isDrawn);
  const aside = hollow.filter(isDrawn).sort((a, b) => (a.slug < b.slug ? -1 : 1));
  const held = [...means.points, ...means.aside];
  const standing = new Set(taxonomy.standing.map(({ slug }) => slug));
  const counts = taxonomy.nodes
    .filter(({ rank }) => rank !== 'species')
    .map((node) => ({ slug: node.slug, name: node.name, rank: node.rank, species: held.filter(({ lineage }) => liesIn(lineage, node)).length, standing: standing.has(node.slug) }));
  const lineages = new Map(rows.map(({ row }) => [row.taxonSlug, row.lineage]));
  return {
    version: label,
    question: { y: question.y, yStructure: question.yStructure, x: question.x, xStructure: question.xStructure, method: question.method, level: question.level },
    clades: clades.map(({ slug, name }, index) => ({ slug, name, species: fits[index]?.n ?? 0 })),
    available: counts.filter(({ species }) => species >= leastSpecies).sort((a, b) => Number(b.standing) - Number(a.standing)),
    fits,
    comparison: null,
    match: null,
    species: [...fitted, ...aside].map((point) => ({
      slug: point.slug, species: point.species, clade: taxonomy.cladeOf(point.lineage).slug, x: point.x, y: point.y, n: point.n,
      marks: point.marks, demonstration: point.demonstration, contributions: point.contributions, setAside: point.setAside,
    })),
    sentences: clades.flatMap((clade, index) => (fits[index] === undefined ? [] : [{ clade: clade.slug, text: sentenceOf(clade, fits[index], question) }])),
    remarks: scalingRemarks({ question, clades, fits, fitted, aside, means, taxonomy }, lineages),
    demonstration: [...fitted, ...aside].some(({ demonstration }) => demonstration),
  };
}

async function read(context: Context, rows: readonly DatasetRow[], query: ScalingQuery): Promise<{ question: ScalingQuestion; taxonomy: Taxonomy }> {
  const taxonomy = await loadTaxonomy(context.db);
  const structures = new Set((await findStructureNames(context.db)).map(({ key }) => key));
  return { question: readScalingQuery(query, { structures, taxonomy, rows }), taxonomy };
}

/**
 * A scaling question put to a frozen version, the current one unless another is named; kept in memory.
 * @throws not-found for a version that is not frozen, invalid-input with every problem of the query
 */
export async function readPublishedScaling(context: Context, query: ScalingQuery): Promise<{ answer: ScalingAnswer; tag: string; explicit: boolean }> {
  const published = await requirePublished(context, query.version);
  const { version: _version, ...asked } = query;
  const kept = await keepAnswer(context, published, `scaling ${JSON.stringify(asked)}`, async () => {
    const { question, taxonomy } = await read(context, published.rows, query);
    return answerScaling(published.label, published.rows, taxonomy, question);
  });
  return { ...kept, explicit: published.explicit };
}

/** The same question put to the working set: approved, unembargoed, not yet frozen. For reviewers and curators. */
export async function readWorkingScaling(context: Context, query: ScalingQuery): Promise<ScalingAnswer> {
  const rows = await loadWorkingRows(context.db, { today: today(context) });
  const { question, taxonomy } = await read(context, rows, query);
  return answerScaling('working', rows, taxonomy, question);
}
