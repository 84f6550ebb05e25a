import { findFrozenRowsOf, findRecheckEventsOf, findRecordRevisions, findSetAsideHistory, type RecordHead } from '../../../db/queries/recordPages';
import { findDecisions, findPersonRefs, findSubmissionEvents } from '../../../db/queries/submissions';
import type { TrailItem } from '../../../shared/contracts/register';
import { today, type Context } from '../../context';
import { scopeWords } from './questions';

const eventWords: Record<string, string> = { submit: 'submitted', submitted: 'submitted', withdraw: 'withdrawn', withdrawn: 'withdrawn' };
const decisionWords: Record<string, string> = { approve: 'approved', 'request-changes': 'changes requested', decline: 'declined' };
const recheckWords: Record<string, string> = { asked: 're-check asked', answered: 're-check answered', reopened: 're-check opened again', closed: 're-check closed' };

type Item = Omit<TrailItem, 'at'> & { at: Date };

/**
 * What happened to a record, oldest first: submissions, decisions, re-checks, set-asides and versions.
 * @param shown the version whose row is shown, or null for the working set: its item is the current one
 * @param insight true for those who judge and for the record's laboratory; the public reads what made the published
 *   row, without the words that reviewers and contributors exchange
 */
export async function recordTrail(context: Context, record: RecordHead, shown: number | null, insight: boolean): Promise<TrailItem[]> {
  const { db } = context;
  const revisions = await findRecordRevisions(db, record.id);
  const frozen = await findFrozenRowsOf(db, record.id);
  const publicRevisions = new Set(revisions.filter(({ id }) => frozen.some((row) => row.recordRevisionId === id)).map(({ submissionRevision }) => submissionRevision));
  const isOpen = (revision: number) => insight || publicRevisions.has(revision);
  const events = (await findSubmissionEvents(db, record.submissionId)).filter(({ kind, revision }) => kind in eventWords && isOpen(revision));
  const decisions = (await findDecisions(db, record.submissionId)).filter(({ kind, revision }) => (insight || kind === 'approve') && isOpen(revision));
  const checks = insight ? await findRecheckEventsOf(db, record.id) : [];
  const aside = insight ? await findSetAsideHistory(db, record.id) : [];
  const people = await findPersonRefs(db, [...events, ...checks].map(({ actorId }) => actorId).concat(decisions.map(({ decidedBy }) => decidedBy), aside.flatMap(({ liftedBy }) => liftedBy ?? [])), today(context));
  const who = (id: string) => people.get(id)?.name ?? 'Unknown';
  const public_ = insight ? [] : (frozen.find(({ number }) => number === shown)?.row.setAside ?? []);
  const items: Item[] = [
    ...events.map(({ kind, revision, actorId, reason, createdAt }) => ({ at: createdAt, what: `revision ${revision} ${eventWords[kind] ?? kind}`, who: who(actorId), why: insight ? reason : '', current: false })),
    ...decisions.map(({ kind, revision, decidedBy, comment, createdAt }) => ({ at: createdAt, what: `revision ${revision} ${decisionWords[kind] ?? kind}`, who: who(decidedBy), why: insight ? comment : '', current: false })),
    ...checks.map(({ kind, answer, actorId, text, at }) => ({ at, what: answer === null ? (recheckWords[kind] ?? kind) : `${recheckWords[kind] ?? kind}: ${answer}`, who: who(actorId), why: text, current: false })),
    ...aside.map(({ scope, reason, by, at }) => ({ at, what: `set aside from ${scopeWords(scope)}`, who: by, why: reason, current: false })),
    ...aside.flatMap(({ scope, liftedAt, liftedBy, liftedReason }) => (liftedAt === null ? [] : [{ at: liftedAt, what: `no longer set aside from ${scopeWords(scope)}`, who: liftedBy === null ? '' : who(liftedBy), why: liftedReason, current: false }])),
    ...public_.map(({ scope, reason, by, at }) => ({ at: new Date(at), what: `set aside from ${scopeWords(scope)}`, who: by, why: reason, current: false })),
    ...frozen.flatMap(({ number, frozenAt, startedBy }) => (frozenAt === null ? [] : [{ at: frozenAt, what: `frozen in version ${number}`, who: startedBy, why: '', current: number === shown }])),
    ...(insight && record.withdrawnAt !== null ? [{ at: record.withdrawnAt, what: 'record withdrawn', who: '', why: record.withdrawnReason, current: false }] : []),
  ];
  return items.sort((a, b) => a.at.getTime() - b.at.getTime()).map((item) => ({ ...item, at: item.at.toISOString() }));
}
