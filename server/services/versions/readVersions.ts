import { findCurrentVersionNumber, findFrozenVersion, findFrozenVersionsBelow, findNewestVersion, findPreparingVersion, findVersionEvents, findVersionFiles, type VersionRow } from '../../../db/queries/versions';
import type { FreezeProgress, VersionItem, VersionPage } from '../../../shared/contracts/versions';
import type { Context } from '../../context';
import { notFound } from '../../errors';
import { versionBibtex } from '../../export/bibtex';
import { citationText } from '../../export/citationText';
import { versionFacts } from './facts';
import { versionSummarySchema, type VersionSummary } from './summary';

/** A frozen version with what is kept beside it; every member that is empty only while it is prepared is there. */
export interface FrozenVersion {
  row: VersionRow;
  summary: VersionSummary;
  frozenAt: Date;
  sha256: string;
}

function toFrozen(row: VersionRow): FrozenVersion {
  if (row.frozenAt === null || row.manifestSha256 === null) throw new Error(`Version ${row.number} is frozen without its date or manifest.`);
  return { row, summary: versionSummarySchema.parse(row.summary), frozenAt: row.frozenAt, sha256: row.manifestSha256 };
}

const numberOf = (label: string): number | null => (/^[1-9]\d{0,8}$/.test(label) ? Number(label) : null);

/**
 * A frozen version by its label.
 * @throws not-found for another label, one still being prepared too
 */
export async function loadFrozen(context: Context, label: string): Promise<FrozenVersion> {
  const number = numberOf(label);
  const row = number === null ? null : await findFrozenVersion(context.db, number);
  if (row === null) throw notFound(`Version ${label.slice(0, 20)}`);
  return toFrozen(row);
}

function toItem({ row, summary, frozenAt, sha256 }: FrozenVersion, current: number | null): VersionItem {
  const { title, demonstration, doi } = row;
  return { label: String(row.number), title, doi, frozenAt: frozenAt.toISOString(), records: summary.counts.records, species: summary.counts.species, current: row.number === current, sha256, demonstration };
}

/** Frozen versions below a number, newest first; the caller asks for one more than it shows. */
export async function listVersions(context: Context, below: number | null, limit: number): Promise<VersionItem[]> {
  const current = await findCurrentVersionNumber(context.db);
  return (await findFrozenVersionsBelow(context.db, below, limit)).map((row) => toItem(toFrozen(row), current));
}

/** The version being prepared, with who began it and when; null where none is. */
export async function loadPreparing(context: Context): Promise<{ label: string; by: string; since: string } | null> {
  const row = await findPreparingVersion(context.db);
  return row === null ? null : { label: String(row.number), by: row.startedBy, since: row.createdAt.toISOString() };
}

export const addressOf = (context: Context, label: string): string => `${context.config.appUrl}/versions/${label}`;

/** Everything that the page of a version shows. */
export async function loadVersionPage(context: Context, version: FrozenVersion): Promise<VersionPage> {
  const { row, summary, frozenAt, sha256 } = version;
  const label = String(row.number);
  const facts = versionFacts(row, summary.contributors, frozenAt);
  const address = addressOf(context, label);
  const files = await findVersionFiles(context.db, row.id);
  const all = await findFrozenVersionsBelow(context.db, null, 1_000);
  return {
    ...toItem(version, await findCurrentVersionNumber(context.db)),
    ...summary,
    licence: row.licence,
    note: row.note,
    files: files.map(({ name, bytes, sha256: fileSha256, mediaType, rows }) => ({ name, bytes, sha256: fileSha256, mediaType, rows })),
    citation: { text: citationText(facts, address, null), bibtex: versionBibtex(facts, address, sha256) },
    labels: all.map(({ number }) => String(number)).reverse(),
  };
}

/** Steps taken by the newest version; not-found where no version was ever begun. */
export async function loadFreezeProgress(context: Context): Promise<FreezeProgress> {
  const row = await findNewestVersion(context.db);
  if (row === null) throw notFound('A version');
  const events = await findVersionEvents(context.db, row.id);
  return { label: String(row.number), status: row.status, steps: events.map(({ step, detail, at }) => ({ step, detail, at: at.toISOString() })) };
}
