import { findRecordsOfSubmission, insertRecordRevisions, insertRecords, putRevisionInForce, withdrawRecords, type StoredRow } from '../../../db/queries/records';
import { findSubmitters, type RevisionRow, type SubmissionRow } from '../../../db/queries/submissions';
import type { Transaction } from '../../../db/client';
import { canonicalJson } from '../../../shared/domain/canonicalJson';
import { recordNumber } from '../../../shared/domain/identifiers';
import { recordRowsOf, type RowDraft, type RowFrame } from './recordRows';
import { ensureSourceOf, sharedAnimalsOf } from './sourceOf';
import { readVocabulary } from './vocabulary';

/** What an approval changes in every row without changing the record: left out of the comparison. */
const beside = ['number', 'revision', 'approvedAt', 'approvedBy', 'contributors'] as const satisfies readonly (keyof StoredRow)[];

function comparable(row: Omit<StoredRow, 'number' | 'revision'> | StoredRow): string {
  const rest: Record<string, unknown> = { ...row };
  for (const key of beside) delete rest[key];
  return canonicalJson(rest);
}

export interface MadeRecords {
  /** Records that are new, changed or gone with this revision. */
  changedRecordIds: string[];
  records: { id: string; number: string; structure: string }[];
}

async function frameOf(tx: Transaction, submission: SubmissionRow, revision: RevisionRow, approval: { at: Date; by: string }, demonstration: boolean): Promise<{ frame: RowFrame; sourceId: string }> {
  const source = await ensureSourceOf(tx, revision.content, submission, demonstration);
  const people = (await findSubmitters(tx, submission.id)).filter((person) => person.kind === 'person');
  return {
    sourceId: source.id,
    frame: {
      source: { key: source.key, citation: source.citation, doi: source.doi, year: source.year },
      sharesAnimalsWith: sharedAnimalsOf(revision.content),
      lab: submission.labName,
      contributors: people.map(({ name, orcid }) => ({ name, orcid })),
      demonstration,
      approvedAt: approval.at.toISOString(),
      approvedBy: approval.by,
    },
  };
}

/**
 * Turns an approved revision into records: new ones get the next number, those whose row changed a new revision in
 * force, those that stay as they are nothing. A record whose entry the revision no longer holds is withdrawn and says
 * so. Runs inside the transaction of the decision.
 *
 * @param approval when and by whom (name) it was approved
 */
export async function makeRecords(tx: Transaction, submission: SubmissionRow, revision: RevisionRow, approval: { at: Date; by: string }): Promise<MadeRecords> {
  const vocabulary = await readVocabulary(tx, [revision.content]);
  const { frame, sourceId } = await frameOf(tx, submission, revision, approval, submission.demonstration);
  const drafts = recordRowsOf(revision.content, vocabulary, frame);
  const existing = new Map((await findRecordsOfSubmission(tx, submission.id)).map((record) => [record.entryId, record]));

  const fresh = drafts.filter((draft) => !existing.has(draft.entryId));
  const inserted = await insertRecords(
    tx,
    fresh.map((draft) => ({ submissionId: submission.id, entryId: draft.entryId, taxonId: draft.taxon.id, structureId: draft.structure.id, sourceId, labId: submission.labId, demonstration: draft.row.demonstration, createdAt: approval.at })),
  );
  const insertedByEntry = new Map(inserted.map((record) => [record.entryId, record]));
  const made: MadeRecords = { changedRecordIds: [], records: [] };
  const revisions: Parameters<typeof insertRecordRevisions>[1] = [];
  const write = (recordId: string, serial: number, draft: RowDraft, number: number): void => {
    const row = { ...draft.row, number: recordNumber(serial), revision: number };
    revisions.push({ recordId, revision: number, submissionRevisionId: revision.id, row, embargoUntil: revision.embargoUntil, createdAt: approval.at });
    made.changedRecordIds.push(recordId);
  };
  for (const draft of drafts) {
    const held = existing.get(draft.entryId);
    const id = held?.id ?? insertedByEntry.get(draft.entryId)!.id;
    const serial = held?.number ?? insertedByEntry.get(draft.entryId)!.number;
    made.records.push({ id, number: recordNumber(serial), structure: draft.structure.key });
    if (held === undefined) {
      write(id, serial, draft, 1);
    } else if (held.withdrawnAt !== null || held.embargoUntil !== revision.embargoUntil || comparable(held.row) !== comparable(draft.row)) {
      const number = held.currentRevision + 1;
      write(id, serial, draft, number);
      await putRevisionInForce(tx, id, { currentRevision: number, taxonId: draft.taxon.id, structureId: draft.structure.id, sourceId, demonstration: draft.row.demonstration });
    }
  }
  await insertRecordRevisions(tx, revisions);
  const gone = [...existing.values()].filter((record) => record.withdrawnAt === null && !drafts.some((draft) => draft.entryId === record.entryId));
  await withdrawRecords(tx, gone.map((record) => record.id), `Revision ${revision.revision} of its submission no longer holds it.`, approval.at);
  made.changedRecordIds.push(...gone.map((record) => record.id));
  return made;
}
