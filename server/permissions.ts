import type { Role } from '../shared/contracts/vocabulary';

/**
 * Who may do what: a set of roles per act. `public` acts need no account; the limits by lab
 * (a reviewer never decides on their own laboratory's records) are rules of the services.
 */
export const permissions = {
  'read-published': 'public',
  /** Any signed-in person, whatever their roles: own profile and notices. */
  'own-account': 'account',
  draft: ['contributor'],
  'read-queue': ['reviewer', 'curator'],
  comment: ['contributor', 'reviewer', 'curator'],
  decide: ['reviewer'],
  'read-submission': ['contributor', 'reviewer', 'curator'],
  'read-rechecks': ['contributor', 'reviewer', 'curator'],
  'ask-recheck': ['reviewer', 'curator'],
  /** A curator answers for records of publications, which have no laboratory. */
  'answer-recheck': ['contributor', 'curator'],
  'close-recheck': ['reviewer', 'curator'],
  'propose-taxon': ['contributor', 'curator'],
  curate: ['curator'],
  'agree-to-freeze': ['curator', 'administrator'],
  'read-audit': ['curator', 'administrator'],
  administer: ['administrator'],
} as const satisfies Record<string, readonly Role[] | 'public' | 'account'>;
export type Action = keyof typeof permissions;

/** Whether a person with these roles (null: not signed in) may do the act at all. */
export function isPermitted(action: Action, roles: readonly Role[] | null): boolean {
  const needed: readonly Role[] | 'public' | 'account' = permissions[action];
  if (needed === 'public') return true;
  if (roles === null) return false;
  return needed === 'account' || needed.some((role) => roles.includes(role));
}

/** Sentence for a refusal: which role the act needs. */
export function neededRoles(action: Action): string {
  const needed: readonly Role[] | 'public' | 'account' = permissions[action];
  return typeof needed === 'string' ? 'Sign in first.' : `This needs the role of ${needed.join(' or ')}.`;
}
