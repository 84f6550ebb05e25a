import { findSubmission } from '../../../db/queries/submissions';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { Preview } from '../../../shared/contracts/submissions';
import type { Actor, Context } from '../../context';
import { isInside } from './access';
import { evaluateContent } from './evaluate';
import { contributorView } from './viewpoint';

/**
 * Derived values, checks and places of a content that is not saved, as they would be at submission today.
 * @param submissionId the submission it belongs to, so that its own code and records are not held against it; one the
 *   actor does not belong to counts as none
 */
export async function previewContent(context: Context, actor: Actor, content: SubmissionContent, submissionId: string | null = null): Promise<Preview> {
  const found = submissionId === null ? null : await findSubmission(context.db, submissionId);
  const own = found !== null && isInside(actor, found) ? found : null;
  const { structures, checks } = await evaluateContent(context.db, content, await contributorView(context, context.db, actor, own));
  return { structures, checks };
}
