import { insertAudit } from '../../../db/queries/audit';
import { findRecheck, insertRecheckEvent, lockRecheck, setRecheckStatus } from '../../../db/queries/rechecks';
import { findRevisions, findSubmission, insertDecision, insertSubmissionEvent, lockSubmission, setRevisionStatus, type RevisionRow } from '../../../db/queries/submissions';
import { findTaxaInPlace } from '../../../db/queries/recordVocabulary';
import type { Transaction } from '../../../db/client';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import type { DecisionKind } from '../../../shared/contracts/vocabulary';
import { diffContent } from '../../../shared/domain/diffContent';
import { nextRecheckStatus, nextRevisionStatus } from '../../../shared/domain/reviewState';
import { findActor } from '../../../db/queries/people';
import { today, type Actor, type Context } from '../../context';
import { AppError } from '../../errors';
import { requestFitRefresh } from '../dataset/fitRefresh';
import { enqueueMails } from '../notify';
import { tellAnswered } from '../rechecks/tellings';
import { knowSubmission, whyNotDecide } from './access';
import { headingOf, taxonSlugsOf } from './contentFacts';
import { describeSubmission } from './describe';
import { makeRecords } from './makeRecords';
import { tellDecided } from './tellings';

export interface Decision {
  /** The revision that the reviewer read. */
  revision: number;
  decision: DecisionKind;
  comment: string;
  checklist: Record<string, boolean>;
}

const eventOf = { approve: 'approved', decline: 'declined', 'request-changes': 'changes-requested' } as const satisfies Record<DecisionKind, string>;

/** Thrown inside the transaction; outside it becomes a 409 with the newer state and what changed. */
class StaleRevision extends Error {
  readonly read: RevisionRow | undefined;
  readonly newest: RevisionRow;
  constructor(read: RevisionRow | undefined, newest: RevisionRow) {
    super('stale revision');
    this.read = read;
    this.newest = newest;
  }
}

/** The revision to decide on: the one that was read, if it still waits. */
function waitingRevision(revisions: readonly RevisionRow[], number: number): RevisionRow {
  const read = revisions.find((revision) => revision.revision === number);
  const newest = revisions.findLast((revision) => revision.submittedAt !== null);
  if (newest === undefined) throw new AppError('wrong-state', 'Nothing of it was submitted.');
  if (read === undefined || read.revision !== newest.revision) throw new StaleRevision(read, newest);
  if (read.status === 'withdrawn') throw new AppError('wrong-state', 'It was withdrawn.');
  if (read.status !== 'submitted') throw new AppError('already-decided', `Revision ${number} has already been decided.`);
  return read;
}

/** A re-check that the approved revision was begun for is answered by it, where its laboratory has not said so already. */
async function answerRecheckByCorrection(context: Context, tx: Transaction, revision: RevisionRow): Promise<string[]> {
  if (revision.answersRecheckId === null || revision.submittedBy === null) return [];
  const recheck = await findRecheck(tx, revision.answersRecheckId);
  const status = await lockRecheck(tx, revision.answersRecheckId);
  const next = status === null ? null : nextRecheckStatus(status, 'answer');
  const submitter = await findActor(tx, revision.submittedBy, today(context));
  if (recheck === null || next === null || submitter === null) return [];
  const text = `Corrected by revision ${revision.revision}.`;
  const eventId = await insertRecheckEvent(tx, { recheckId: recheck.id, kind: 'answered', answer: 'corrected', text, actorId: submitter.id, submissionRevisionId: revision.id, createdAt: context.clock() });
  await setRecheckStatus(tx, recheck.id, next, null);
  return tellAnswered(context, tx, submitter, recheck, 'corrected', text, eventId);
}

export interface DecisionOutcome {
  mails: string[];
  runId: string | null;
}

/**
 * Decides inside a transaction: decision, event and status together, and for an approval the records that follow.
 * The submission's row is held, so that of two reviewers one comes second and finds it decided.
 */
export async function decideWithin(context: Context, tx: Transaction, actor: Pick<Actor, 'id' | 'name'>, submissionId: string, decision: Decision): Promise<DecisionOutcome> {
  await lockSubmission(tx, submissionId);
  const submission = (await findSubmission(tx, submissionId))!;
  const revision = waitingRevision(await findRevisions(tx, [submissionId]), decision.revision);
  const status = nextRevisionStatus(revision.status, decision.decision);
  if (status === null) throw new AppError('wrong-state', `Revision ${revision.revision} is ${revision.status}.`);
  const now = context.clock();
  await insertDecision(tx, { revisionId: revision.id, kind: decision.decision, comment: decision.comment, checklist: decision.checklist, decidedBy: actor.id, createdAt: now });
  await setRevisionStatus(tx, revision.id, status, now, true);
  await insertSubmissionEvent(tx, { submissionId, revisionId: revision.id, kind: eventOf[decision.decision], actorId: actor.id, reason: decision.comment, createdAt: now });
  context.killPoint('decide:decision-written');

  const isSystem = submission.creatorKind === 'system';
  let runId: string | null = null;
  const mails: string[] = [];
  if (decision.decision === 'approve') {
    const { changedRecordIds } = await makeRecords(tx, submission, revision, { at: now, by: actor.name });
    mails.push(...(await answerRecheckByCorrection(context, tx, revision)));
    // The loader's tables come in by the dozen; whoever loads them asks once, at the end.
    if (!isSystem && changedRecordIds.length > 0) runId = await requestFitRefresh(tx, changedRecordIds, 'records approved');
    context.killPoint('decide:records-written');
  }
  if (isSystem) return { mails: [], runId };
  await insertAudit(tx, { actorId: actor.id, action: `submission-${eventOf[decision.decision]}`, targetType: 'submission', targetId: submissionId, detail: { revision: revision.revision, comment: decision.comment } });
  const taxa = await findTaxaInPlace(tx, taxonSlugsOf(revision.content));
  mails.push(...(await tellDecided(context, tx, { submission, revision, title: headingOf(revision.content, taxa).title, decision: decision.decision, comment: decision.comment, by: actor.name })));
  return { mails, runId };
}

/** @throws own-lab or not-allowed where the person may not decide on this submission */
export async function refuseUnlessMayDecide(context: Context, actor: Actor, submissionId: string): Promise<void> {
  const { submission, revisions } = await knowSubmission(context.db, actor, submissionId);
  const refusal = whyNotDecide(actor, submission, revisions.map((revision) => revision.submittedBy));
  if (refusal !== null) throw new AppError(refusal.code, refusal.text);
}

/**
 * A reviewer's decision on a submitted revision.
 * @throws own-lab for the reviewer's own submission or laboratory, stale-revision (with `current` and `changes`) where a
 *   newer revision stands, already-decided where somebody was first
 */
export async function decideRevision(context: Context, actor: Actor, submissionId: string, decision: Decision): Promise<SubmissionDetail> {
  await refuseUnlessMayDecide(context, actor, submissionId);
  let outcome: DecisionOutcome;
  try {
    outcome = await context.db.transaction((tx) => decideWithin(context, tx, actor, submissionId, decision));
  } catch (error) {
    if (!(error instanceof StaleRevision)) throw error;
    const current = await describeSubmission(context, actor, submissionId);
    const changes = error.read === undefined ? [] : diffContent(error.read.content, error.newest.content);
    throw new AppError('stale-revision', `Revision ${error.newest.revision} stands now; you read revision ${decision.revision}.`, { extra: { current, changes } });
  }
  await enqueueMails(context, outcome.mails);
  if (outcome.runId !== null) await context.jobs.enqueue('refresh-fits', { runId: outcome.runId }, outcome.runId);
  return describeSubmission(context, actor, submissionId);
}
