import { findFrozenVersionsBelow } from '../../../db/queries/versions';
import type { Register } from '../../../shared/contracts/register';
import type { RecordRow } from '../../../shared/contracts/records';
import type { Actor, Context } from '../../context';
import { standingExponents } from '../versions/standingExponents';
import { countRows, versionSummarySchema } from '../versions/summary';
import { loadVersionFits, type StoredFit } from '../versions/versionFits';
import { placeRecord } from './places';
import { findPublished, type Published } from './publishedData';
import { loadTaxonomy, type Taxonomy } from './taxonomy';
import { listWaiting } from './waitingList';

const newestShown = 6;
const versionsShown = 50;

/** The question of the first screen: mass of the cerebral cortex on its neurons, by least squares. */
const isShown = ({ definition }: StoredFit): boolean =>
  definition.method === 'ols' && definition.y === 'structureMassG' && definition.x === 'neurons' && definition.yStructure === 'cerebral_cortex' && definition.xStructure === 'cerebral_cortex';

async function exponentsOf(context: Context, published: Published): Promise<Register['exponents']> {
  const fits = (await loadVersionFits(context.db, published.version.number)).filter(isShown);
  const before = published.previous === null ? [] : await loadVersionFits(context.db, published.previous.number);
  const rows = standingExponents(fits, new Map(before.map(({ definition, result }) => [definition.slug, result])));
  return rows.map((row, index) => {
    const fit = fits[index];
    const old = before.find(({ definition }) => definition.slug === row.slug);
    const known = new Set((old === undefined ? [] : [...old.inputs, ...old.exclusions]).map(({ slug }) => slug));
    const stroke = (setAside: boolean) => ({ species, slug, x }: StoredFit['inputs'][number]) => ({ species, slug, x, isNew: published.previous !== null && !known.has(slug), setAside });
    return { ...row, strokes: fit === undefined ? [] : [...fit.inputs.map(stroke(false)), ...fit.exclusions.map(stroke(true))] };
  });
}

function newestOf(published: Published, taxonomy: Taxonomy): Register['newest'] {
  const newest = [...published.rows].sort((a, b) => (a.row.approvedAt < b.row.approvedAt ? 1 : a.row.approvedAt > b.row.approvedAt ? -1 : 0)).slice(0, newestShown);
  return newest.map(({ row }) => ({
    number: row.number,
    species: row.species,
    slug: row.taxonSlug,
    structure: row.structure,
    neurons: row.neurons,
    neuronsError: row.neuronsError,
    structureMassG: row.structureMassG,
    place: placeRecord(published.rows, { ...row, isSingleSpecimen: row.kind === 'specimen' && row.pooledWith.length === 0 }).place,
    clade: taxonomy.cladeOf(row.lineage).slug,
    source: sourceText(row),
    at: row.approvedAt,
    demonstration: row.demonstration,
  }));
}

const sourceText = (row: RecordRow): string => (row.specimen === null ? row.sourceCitation : [row.lab, row.specimen].filter((part) => part !== null).join(', '));

/**
 * What the first screen shows: the current version with its counts and exponents, the newest records, what waits for
 * the person, and what changed since the version before. Of unpublished records it shows nothing but what waits.
 * @param visitor null without a session: nothing waits
 */
export async function describeRegister(context: Context, visitor: Actor | null): Promise<Register> {
  const { db } = context;
  const published = await findPublished(context, undefined);
  const waiting = visitor === null ? [] : await listWaiting(context, visitor);
  if (published === null) {
    return { version: null, counts: { species: 0, records: 0, specimens: 0, structures: 0, sources: 0, labs: 0 }, exponents: [], newest: [], waiting, since: null, versions: [] };
  }
  const versions = (await findFrozenVersionsBelow(db, null, versionsShown)).map((version) => ({ ...version, parts: versionSummarySchema.parse(version.summary) }));
  const current = versions.find(({ number }) => number === published.version.number);
  const rows = published.rows.map(({ row }) => row);
  const { label, version } = published;
  const changes = current?.parts.changes ?? null;
  return {
    version: { label, title: version.title, doi: current?.doi ?? null, frozenAt: version.frozenAt.toISOString(), sha256: version.manifestSha256, demonstration: version.demonstration },
    counts: { ...countRows(rows), labs: new Set(rows.flatMap(({ lab }) => lab ?? [])).size },
    exponents: await exponentsOf(context, published),
    newest: newestOf(published, await loadTaxonomy(db)),
    waiting,
    since: changes === null ? null : { previous: changes.previous, speciesCame: changes.speciesCame, recordsCame: changes.came.length, recordsRevised: changes.revised.length, setAside: changes.setAside.length, withdrawn: changes.went.length },
    versions: versions.map(({ number, frozenAt, parts }) => ({ label: String(number), frozenAt: (frozenAt ?? version.frozenAt).toISOString(), records: parts.counts.records, species: parts.counts.species })),
  };
}
