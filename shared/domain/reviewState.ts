import type { RecheckStatus, RevisionStatus } from '../contracts/vocabulary';

export const revisionEvents = ['submit', 'request-changes', 'approve', 'decline', 'withdraw'] as const;
export type RevisionEvent = (typeof revisionEvents)[number];

const revisionTransitions: Record<RevisionStatus, Partial<Record<RevisionEvent, RevisionStatus>>> = {
  draft: { submit: 'submitted', withdraw: 'withdrawn' },
  submitted: { 'request-changes': 'changes-requested', approve: 'approved', decline: 'declined', withdraw: 'withdrawn' },
  'changes-requested': { withdraw: 'withdrawn' },
  approved: { withdraw: 'withdrawn' },
  declined: {},
  withdrawn: {},
};

/**
 * Life of one revision: (state, event) → state.
 * @returns the next state, or null where the state does not allow the event; nothing else changes a status.
 */
export function nextRevisionStatus(status: RevisionStatus, event: RevisionEvent): RevisionStatus | null {
  return revisionTransitions[status][event] ?? null;
}

/** A new revision follows one that was sent back or approved; never while another is drafted or under review. */
export function mayRevise(latest: RevisionStatus): boolean {
  return latest === 'changes-requested' || latest === 'approved';
}

export const recheckEvents = ['answer', 'reopen', 'close'] as const;
export type RecheckEvent = (typeof recheckEvents)[number];

const recheckTransitions: Record<RecheckStatus, Partial<Record<RecheckEvent, RecheckStatus>>> = {
  open: { answer: 'answered' },
  answered: { close: 'closed', reopen: 'open' },
  closed: {},
};

/** Life of a re-check: open → answered → closed, or back to open where the answer does not settle it. */
export function nextRecheckStatus(status: RecheckStatus, event: RecheckEvent): RecheckStatus | null {
  return recheckTransitions[status][event] ?? null;
}
