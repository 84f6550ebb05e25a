import { findAttachmentsOfRevision } from '../../../db/queries/attachments';
import { findOpenRechecks, findRecheckOfSubmission, findRecordsOfSubmission, findRowsOfTaxon } from '../../../db/queries/records';
import { findComments, findDecisions, findPersonRefs, findSubmissionEvents, type RevisionRow } from '../../../db/queries/submissions';
import type { Queryable } from '../../../db/client';
import type { Preview, ReviewView, SubmissionDetail } from '../../../shared/contracts/submissions';
import { diffContent } from '../../../shared/domain/diffContent';
import { recordNumber } from '../../../shared/domain/identifiers';
import { nextRevisionStatus } from '../../../shared/domain/reviewState';
import { today, type Actor, type Context } from '../../context';
import { etagOf, isJudge, knowSubmission, mayDraftSuccessor, mayWrite, standingRevision, whyNotDecide, type KnownSubmission } from './access';
import { taxonSlugsOf } from './contentFacts';
import { evaluateContent } from './evaluate';
import { itemOf } from './items';
import type { ContentVocabulary } from './vocabulary';
import { contributorView, reviewerView } from './viewpoint';

/** The revision a person is shown: the newest they may know of, unless it ended above one that stays in force. */
const shownRevision = (known: KnownSubmission): RevisionRow => standingRevision(known.revisions);

function mayOf(actor: Actor, known: KnownSubmission, shown: RevisionRow, answersRecheck: boolean): SubmissionDetail['may'] {
  const { submission, revisions, inside } = known;
  const writes = inside && mayWrite(actor, submission, answersRecheck);
  const refusal = whyNotDecide(actor, submission, revisions.map((revision) => revision.submittedBy));
  const waits = shown.status === 'submitted';
  return {
    edit: writes && shown.status === 'draft',
    submit: writes && shown.status === 'draft',
    withdraw: writes && nextRevisionStatus(shown.status, 'withdraw') !== null,
    revise: writes && mayDraftSuccessor(revisions),
    comment: isJudge(actor) || writes,
    decide: waits && refusal === null,
    whyNotDecide: waits ? (refusal?.text ?? null) : 'No revision of it waits for a decision.',
  };
}

async function recheckOf(db: Queryable, submissionId: string, shown: RevisionRow): Promise<SubmissionDetail['recheck']> {
  const answered = shown.answersRecheckId === null ? null : await findRecheckOfSubmission(db, shown.answersRecheckId);
  const recheck = answered ?? (await findOpenRechecks(db, [submissionId]))[0] ?? null;
  return recheck === null ? null : { id: recheck.id, question: recheck.question, status: recheck.status };
}

async function compose(context: Context, db: Queryable, actor: Actor, known: KnownSubmission, shown: RevisionRow, evaluated: Preview & { vocabulary: ContentVocabulary }): Promise<SubmissionDetail> {
  const { submission, revisions } = known;
  const seen = new Set(revisions.map((revision) => revision.id));
  const decisions = await findDecisions(db, submission.id);
  const comments = (await findComments(db, submission.id)).filter((comment) => revisions.some((revision) => revision.revision === comment.revision));
  const events = (await findSubmissionEvents(db, submission.id)).filter((event) => seen.has(event.revisionId));
  const people = await findPersonRefs(db, [submission.createdBy, ...revisions.flatMap((revision) => revision.submittedBy ?? []), ...decisions.map((one) => one.decidedBy), ...comments.map((one) => one.authorId), ...events.map((one) => one.actorId)], today(context));
  const person = (id: string) => people.get(id) ?? { id, name: 'Unknown', lab: null };
  const recheck = await recheckOf(db, submission.id, shown);
  const before = revisions.findLast((revision) => revision.revision < shown.revision);
  const files = await findAttachmentsOfRevision(db, shown.id);
  return {
    ...itemOf(submission, revisions, shown, { taxa: evaluated.vocabulary.taxa, people, openRecheck: recheck?.status === 'open' ? recheck.id : null }),
    content: shown.content,
    etag: etagOf(shown),
    // Checks of a submitted revision are those it was submitted with.
    preview: { structures: evaluated.structures, checks: shown.checks ?? evaluated.checks },
    revisions: revisions.map(({ revision, status, submittedAt }) => ({ revision, status, submittedAt: submittedAt?.toISOString() ?? null })),
    changes: before === undefined ? [] : diffContent(before.content, shown.content),
    attachments: files.map((file) => ({ ...file, createdAt: file.createdAt.toISOString() })),
    comments: comments.map(({ id, revision, fieldPath, authorId, text, createdAt }) => ({ id, revision, fieldPath, author: person(authorId), text, createdAt: createdAt.toISOString() })),
    decisions: decisions.map(({ revision, kind, comment, checklist, decidedBy, createdAt }) => ({ revision, decision: kind, comment, checklist, by: person(decidedBy), at: createdAt.toISOString() })),
    events: events.map(({ kind, revision, actorId, reason, createdAt }) => ({ kind, revision, by: person(actorId), reason, at: createdAt.toISOString() })),
    records: (await findRecordsOfSubmission(db, submission.id)).map(({ number, structure }) => ({ number: recordNumber(number), structure })),
    recheck,
    may: mayOf(actor, known, shown, recheck !== null),
  };
}

/**
 * A submission in full, as far as the person may know of it: newest revision, what it changes, evidence, comments,
 * decisions, events, records, and what the person may do now.
 * @throws not-found where the person may not know of it
 */
export async function describeSubmission(context: Context, actor: Actor, submissionId: string): Promise<SubmissionDetail> {
  return describeKnown(context, actor, await knowSubmission(context.db, actor, submissionId));
}

/** The same for a submission that was found already. */
export async function describeKnown(context: Context, actor: Actor, known: KnownSubmission): Promise<SubmissionDetail> {
  const shown = shownRevision(known);
  const view = known.inside ? await contributorView(context, context.db, actor, known.submission) : await reviewerView(context, context.db, known.submission);
  return compose(context, context.db, actor, known, shown, await evaluateContent(context.db, shown.content, view));
}

/**
 * What a reviewer sees: the submission with its place on the working set's lines, and what the register holds for
 * its species.
 * @param known as found by `knowReviewed`
 */
export async function describeReview(context: Context, actor: Actor, known: KnownSubmission): Promise<ReviewView> {
  const { db } = context;
  const shown = shownRevision(known);
  const evaluated = await evaluateContent(db, shown.content, await reviewerView(context, db, known.submission));
  const taxa = taxonSlugsOf(shown.content).flatMap((slug) => evaluated.vocabulary.taxa.get(slug) ?? []);
  const held: ReviewView['held'] = [];
  for (const taxon of taxa) {
    for (const { row } of await findRowsOfTaxon(db, taxon.id, { exceptSubmissionId: known.submission.id, day: today(context), workingOf: 'all' })) {
      const { number, structure, structureMassG, neurons, neuronsError, cells } = row;
      held.push({ number, structure, source: row.specimen === null ? row.sourceCitation : `${row.lab ?? row.sourceCitation}, ${row.specimen}`, structureMassG, neurons, neuronsError, cells });
    }
  }
  return { ...(await compose(context, db, actor, known, shown, evaluated)), held };
}

/** As `knowSubmission`, for the review view: only what was submitted, also of the reviewer's own laboratory. */
export async function knowReviewed(context: Context, actor: Actor, submissionId: string): Promise<KnownSubmission> {
  const known = await knowSubmission(context.db, actor, submissionId);
  return { ...known, revisions: known.revisions.filter((revision) => revision.submittedAt !== null) };
}
