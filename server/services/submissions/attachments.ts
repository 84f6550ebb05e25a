import { createHash } from 'node:crypto';
import { countAttachments, findAttachment, findAttachmentsOfRevision, insertAttachment, linkAttachment, unlinkAttachment } from '../../../db/queries/attachments';
import { findOpenRechecks } from '../../../db/queries/records';
import { findRevisions, lockSubmission } from '../../../db/queries/submissions';
import type { AttachmentView } from '../../../shared/contracts/submissions';
import type { Actor, Context } from '../../context';
import { AppError, notAllowed, notFound } from '../../errors';
import { knowSubmission, mayWrite, standingRevision, type KnownSubmission } from './access';
import { readEvidence } from './evidence/readEvidence';
import { safeFileName } from './evidence/fileName';

const mostFiles = 60;

export interface Upload {
  name: string;
  bytes: Buffer;
  fieldPath: string;
  caption: string;
}

/** Whether a re-check of the submission is open, which its laboratory may answer with evidence beside any draft. */
const awaitsEvidence = async (context: Context, submissionId: string): Promise<boolean> => (await findOpenRechecks(context.db, [submissionId])).some((recheck) => recheck.status === 'open');

/** @throws not-allowed where the person only reads the submission; wrong-state where it takes no evidence now */
export async function refuseUnlessTakesEvidence(context: Context, actor: Actor, known: KnownSubmission): Promise<void> {
  const asked = await awaitsEvidence(context, known.submission.id);
  const answersRecheck = asked || standingRevision(known.revisions).answersRecheckId !== null;
  if (!known.inside || !mayWrite(actor, known.submission, answersRecheck)) throw notAllowed('Only the person who entered it adds or takes away evidence.');
  if (standingRevision(known.revisions).status !== 'draft' && !asked) throw new AppError('wrong-state', 'Evidence is attached to a draft; start a new revision.');
}

/**
 * Stores a file as evidence of the newest draft, or of an open re-check where no draft stands.
 *
 * Type by content; location data taken out of images before anything is stored; the checksum is of what is stored.
 * @throws unsupported-type, too-large, wrong-state
 */
export async function addAttachment(context: Context, actor: Actor, submissionId: string, upload: Upload): Promise<AttachmentView> {
  await refuseUnlessTakesEvidence(context, actor, await knowSubmission(context.db, actor, submissionId));
  if (upload.bytes.length === 0) throw new AppError('unsupported-type', 'The file is empty.');
  const { mediaType, bytes } = await readEvidence(upload.bytes);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const storageKey = `attachments/${sha256}`;
  // Stored before it is noted: a crash in between leaves an object that nothing names, never a name without its object.
  await context.storage.put(storageKey, bytes, { contentType: mediaType });
  const createdAt = context.clock();
  const name = safeFileName(upload.name, mediaType);
  const id = await context.db.transaction(async (tx) => {
    await lockSubmission(tx, submissionId);
    const revision = standingRevision(await findRevisions(tx, [submissionId]));
    const attachmentId = await insertAttachment(tx, { submissionId, fieldPath: upload.fieldPath, name, caption: upload.caption, mediaType, bytes: bytes.length, sha256, storageKey, uploadedBy: actor.id, createdAt });
    if (revision.status === 'draft') {
      if ((await countAttachments(tx, [revision.id])) >= mostFiles) throw new AppError('wrong-state', `A revision holds at most ${mostFiles} files.`);
      await linkAttachment(tx, revision.id, attachmentId);
    }
    return attachmentId;
  });
  return { id, name, caption: upload.caption, mediaType, bytes: bytes.length, sha256, fieldPath: upload.fieldPath, uploadedBy: actor.name, createdAt: createdAt.toISOString() };
}

/** Takes a file from the newest draft; revisions that were submitted with it keep it. */
export async function detachAttachment(context: Context, actor: Actor, submissionId: string, attachmentId: string): Promise<void> {
  await refuseUnlessTakesEvidence(context, actor, await knowSubmission(context.db, actor, submissionId));
  await context.db.transaction(async (tx) => {
    await lockSubmission(tx, submissionId);
    const revision = standingRevision(await findRevisions(tx, [submissionId]));
    if (revision.status !== 'draft') throw new AppError('wrong-state', 'The evidence of a submitted revision never changes.');
    if (!(await unlinkAttachment(tx, revision.id, attachmentId))) throw notFound('This file');
  });
}

/** Files of the revision that the person is shown. */
export async function listAttachments(context: Context, known: KnownSubmission): Promise<AttachmentView[]> {
  const files = await findAttachmentsOfRevision(context.db, standingRevision(known.revisions).id);
  return files.map((file) => ({ ...file, createdAt: file.createdAt.toISOString() }));
}

export interface StoredFile {
  name: string;
  mediaType: string;
  sha256: string;
  content: Buffer;
}

/**
 * Reads a stored file as far as the person may know of it: people outside the laboratory see what was submitted, or
 * given in answer to a re-check.
 * @throws not-found; an object that is absent or differs from its checksum is an error of ours
 */
export async function readAttachment(context: Context, known: KnownSubmission, attachmentId: string): Promise<StoredFile> {
  const file = await findAttachment(context.db, known.submission.id, attachmentId);
  if (file === null || (!known.inside && !file.wasSubmitted && !file.answersRecheck)) throw notFound('This file');
  const stored = await context.storage.get(file.storageKey);
  if (stored === undefined) throw new Error(`The storage lacks ${file.storageKey}.`);
  if (createHash('sha256').update(stored.content).digest('hex') !== file.sha256) throw new Error(`The object ${file.storageKey} differs from its checksum.`);
  return { name: file.name, mediaType: file.mediaType, sha256: file.sha256, content: stored.content };
}
