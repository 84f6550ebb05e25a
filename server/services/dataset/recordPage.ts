import { findFrozenRowsOf, findRechecksOf, findRecord, findRecordRevisions, findSamplesOf, type RecordHead } from '../../../db/queries/recordPages';
import { findPersonRefs, findRevisions, findSubmission, findSubmitters } from '../../../db/queries/submissions';
import type { Place } from '../../../shared/contracts/fits';
import type { RecordPage } from '../../../shared/contracts/register';
import type { RecordRow } from '../../../shared/contracts/records';
import { recordSerial } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { notFound } from '../../errors';
import { isInside, isJudge, mayDraftSuccessor, mayWrite } from '../submissions/access';
import { loadFlagViews } from './flagViews';
import { placeRecord } from './places';
import { findPublished } from './publishedData';
import { recordTrail } from './recordTrail';
import { loadWorkingRows, type DatasetRow } from './rows';
import { loadTaxonomy } from './taxonomy';

/** A record as one person may know it. */
export interface KnownRecord {
  record: RecordHead;
  /** The row shown, with the revision that made it. */
  row: RecordRow;
  recordRevisionId: string;
  /** Label of the version that the row is taken from; null for the working set. */
  version: number | null;
  /** Judges and the record's own laboratory see beyond the published row. */
  insight: boolean;
}

async function hasInsight(context: Context, actor: Actor, record: RecordHead): Promise<boolean> {
  if (isJudge(actor)) return true;
  const submission = await findSubmission(context.db, record.submissionId);
  return submission !== null && isInside(actor, submission);
}

/**
 * Finds a record as far as the person may know of it: everybody the newest published row, or that of the version
 * named; judges and its own laboratory the row in force, where no version holds it yet.
 * @throws not-found for an unknown number, a record that is in no version (to others), an unknown version
 */
export async function knowRecord(context: Context, actor: Actor, number: string, label?: string): Promise<KnownRecord> {
  const missing = notFound('This record');
  const serial = recordSerial(number);
  const record = serial === null ? null : await findRecord(context.db, serial);
  if (record === null) throw missing;
  const insight = await hasInsight(context, actor, record);
  const frozen = await findFrozenRowsOf(context.db, record.id);
  if (label === undefined && insight) {
    const working = (await loadWorkingRows(context.db, { embargoedToo: true, today: today(context) })).find(({ recordId }) => recordId === record.id);
    if (working !== undefined && !frozen.some(({ recordRevisionId }) => recordRevisionId === working.recordRevisionId)) {
      return { record, row: working.row, recordRevisionId: working.recordRevisionId, version: null, insight };
    }
  }
  const held = label === undefined ? frozen[0] : frozen.find((one) => String(one.number) === label);
  if (held === undefined) throw missing;
  return { record, row: held.row, recordRevisionId: held.recordRevisionId, version: held.number, insight };
}

async function datasetOf(context: Context, version: number | null): Promise<readonly DatasetRow[]> {
  if (version === null) return loadWorkingRows(context.db, { today: today(context) });
  return (await findPublished(context, String(version)))?.rows ?? [];
}

async function placesOf(context: Context, { row, version }: KnownRecord): Promise<Place[]> {
  const { place } = placeRecord(await datasetOf(context, version), { ...row, isSingleSpecimen: row.kind === 'specimen' && row.pooledWith.length === 0 });
  return place === null ? [] : [place];
}

async function mayOf(context: Context, actor: Actor, { record }: KnownRecord, hasOpenRecheck: boolean): Promise<RecordPage['may']> {
  const stands = record.withdrawnAt === null;
  const otherLab = actor.labId === null || actor.labId !== record.labId;
  const submission = await findSubmission(context.db, record.submissionId);
  const revises = submission !== null && isInside(actor, submission) && mayWrite(actor, submission, hasOpenRecheck);
  return {
    askRecheck: stands && isJudge(actor) && !hasOpenRecheck,
    setAside: stands && actor.roles.includes('curator') && otherLab,
    revise: stands && revises && mayDraftSuccessor(await findRevisions(context.db, [record.submissionId])) ? record.submissionId : null,
  };
}

/**
 * The page of one record: its row, raw counts, flags, place on the line, trail, and what the person may do.
 * @param known as found by `knowRecord`
 */
export async function describeRecord(context: Context, actor: Actor, known: KnownRecord): Promise<RecordPage> {
  const { db } = context;
  const { record, row, version, insight } = known;
  const taxonomy = await loadTaxonomy(db);
  const frozen = await findFrozenRowsOf(db, record.id);
  const revisions = await findRecordRevisions(db, record.id);
  const own = revisions.find(({ id }) => id === known.recordRevisionId);
  const current = await findPublished(context, undefined);
  const inCurrent = frozen.some(({ number }) => number === current?.version.number);
  const checks = await findRechecksOf(db, record.id);
  const open = checks.some(({ status }) => status !== 'closed');
  const submitters = await findSubmitters(db, record.submissionId);
  const people = await findPersonRefs(db, submitters.map(({ id }) => id), today(context));
  const flags = [
    ...(version === null ? [] : await loadFlagViews(db, { set: 'version', version, recordIds: [record.id] })),
    ...(insight ? await loadFlagViews(db, { set: 'working', recordIds: [record.id] }) : []),
  ];
  return {
    id: record.id,
    row,
    version: version === null ? null : String(version),
    working: version === null,
    // What was withdrawn since the current version is public from the next one on.
    withdrawn: record.withdrawnAt !== null && (insight || !inCurrent) ? record.withdrawnReason : null,
    structureName: record.structureName,
    cladeName: taxonomy.cladeOf(row.lineage).name,
    inVersions: frozen.map(({ number }) => String(number)),
    revisions: revisions.filter(({ id }) => insight || frozen.some(({ recordRevisionId }) => recordRevisionId === id)).map(({ revision, at }) => ({ revision, at: at.toISOString() })),
    trail: await recordTrail(context, record, version, insight),
    flags,
    places: await placesOf(context, known),
    setAside: row.setAside,
    rechecks: insight ? checks.map(({ id, status, question, at }) => ({ id, status, question, at: at.toISOString() })) : [],
    may: await mayOf(context, actor, known, open),
    samples: own === undefined ? [] : await findSamplesOf(db, own.submissionRevisionId, record.entryId),
    contributors: submitters.flatMap(({ id }) => people.get(id) ?? []),
  };
}
