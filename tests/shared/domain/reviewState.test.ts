import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { RecheckStatus, RevisionStatus } from '../../../shared/contracts/vocabulary';
import { mayRevise, nextRecheckStatus, nextRevisionStatus, recheckEvents, revisionEvents, type RecheckEvent, type RevisionEvent } from '../../../shared/domain/reviewState';

/** The life of a revision, written out by hand: state × event → state, null where it is refused. */
const revisions: Record<RevisionStatus, Record<RevisionEvent, RevisionStatus | null>> = {
  draft: { submit: 'submitted', 'request-changes': null, approve: null, decline: null, withdraw: 'withdrawn' },
  submitted: { submit: null, 'request-changes': 'changes-requested', approve: 'approved', decline: 'declined', withdraw: 'withdrawn' },
  'changes-requested': { submit: null, 'request-changes': null, approve: null, decline: null, withdraw: 'withdrawn' },
  approved: { submit: null, 'request-changes': null, approve: null, decline: null, withdraw: 'withdrawn' },
  declined: { submit: null, 'request-changes': null, approve: null, decline: null, withdraw: null },
  withdrawn: { submit: null, 'request-changes': null, approve: null, decline: null, withdraw: null },
};

const rechecks: Record<RecheckStatus, Record<RecheckEvent, RecheckStatus | null>> = {
  open: { answer: 'answered', reopen: null, close: null },
  answered: { answer: null, reopen: 'open', close: 'closed' },
  closed: { answer: null, reopen: null, close: null },
};

const statuses = Object.keys(revisions) as RevisionStatus[];
const recheckStatuses = Object.keys(rechecks) as RecheckStatus[];

describe('the life of a revision', () => {
  it.each(statuses.flatMap((status) => revisionEvents.map((event) => [status, event, revisions[status][event]] as const)))('from %s, %s leads to %s', (status, event, next) => {
    expect(nextRevisionStatus(status, event)).toBe(next);
  });

  it.each(statuses.map((status) => [status, status === 'changes-requested' || status === 'approved'] as const))('a new revision after %s: %s', (status, allowed) => {
    expect(mayRevise(status)).toBe(allowed);
  });

  it('is never decided before it was submitted, and never decided twice, whatever happens to it', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...revisionEvents), { maxLength: 40 }), (events) => {
        let status: RevisionStatus = 'draft';
        const taken: RevisionEvent[] = [];
        for (const event of events) {
          const next = nextRevisionStatus(status, event);
          if (next === null) continue;
          status = next;
          taken.push(event);
        }
        const decisions = taken.filter((event) => event === 'approve' || event === 'decline' || event === 'request-changes');
        expect(decisions.length).toBeLessThanOrEqual(1);
        if (decisions.length === 1) expect(taken[0]).toBe('submit');
        expect(taken.filter((event) => event === 'submit').length).toBeLessThanOrEqual(1);
        // Withdrawn and declined are ends.
        if (taken.includes('withdraw')) expect([taken.at(-1), status]).toEqual(['withdraw', 'withdrawn']);
        if (taken.includes('decline')) expect(taken.at(-1)).toBe('decline');
      }),
    );
  });
});

describe('the life of a re-check', () => {
  it.each(recheckStatuses.flatMap((status) => recheckEvents.map((event) => [status, event, rechecks[status][event]] as const)))('from %s, %s leads to %s', (status, event, next) => {
    expect(nextRecheckStatus(status, event)).toBe(next);
  });

  it('is closed only after an answer, and then for good', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...recheckEvents), { maxLength: 40 }), (events) => {
        let status: RecheckStatus = 'open';
        const taken: RecheckEvent[] = [];
        for (const event of events) {
          const next = nextRecheckStatus(status, event);
          if (next === null) continue;
          status = next;
          taken.push(event);
        }
        if (taken.includes('close')) expect(taken.slice(-2)).toEqual(['answer', 'close']);
        expect(status).toBe(taken.length === 0 ? 'open' : { answer: 'answered', reopen: 'open', close: 'closed' }[taken.at(-1) ?? 'reopen']);
      }),
    );
  });
});
