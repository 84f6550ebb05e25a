import { findOrMakeSystemActor } from '../../../db/queries/seed';
import { insertRevision, insertSubmission, insertSubmissionEvent } from '../../../db/queries/submissions';
import type { LiteratureContent } from '../../../shared/contracts/content';
import type { Actor, Context } from '../../context';
import { decideWithin } from './decideRevision';
import { submitWithin } from './submitRevision';

const reason = 'Published values, entered from the register’s own tables and checked against them by its tests.';

/**
 * Loads one source's published values as a literature submission, made, submitted and decided by the register's named
 * system actor in one transaction, through the same functions, checks and events as a person's. It belongs to no
 * laboratory, tells nobody and asks for no standing fits: whoever loads asks once, when all tables are in.
 * @throws checks-block where a value cannot be right or a doubtful one lacks its word
 */
export async function loadAsSystem(context: Context, content: LiteratureContent): Promise<{ submissionId: string }> {
  const found = await findOrMakeSystemActor(context.db);
  const actor: Actor = { ...found, emailVerified: false, orcid: null, roles: [], labId: null, labName: null, demonstration: false };
  const now = context.clock();
  return context.db.transaction(async (tx) => {
    const submissionId = await insertSubmission(tx, { kind: 'literature', labId: null, createdBy: actor.id, demonstration: false, createdAt: now });
    const revisionId = await insertRevision(tx, { submissionId, revision: 1, content, createdAt: now, updatedAt: now });
    await insertSubmissionEvent(tx, { submissionId, revisionId, kind: 'drafted', actorId: actor.id, createdAt: now });
    await submitWithin(context, tx, actor, submissionId, { places: false });
    await decideWithin(context, tx, actor, submissionId, { revision: 1, decision: 'approve', comment: reason, checklist: {} });
    return { submissionId };
  });
}
