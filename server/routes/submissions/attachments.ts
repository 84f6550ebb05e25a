import type { RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { z } from 'zod';
import { idParams } from '../../../shared/contracts/common';
import { attachmentSchema } from '../../../shared/contracts/submissions';
import { AppError } from '../../errors';
import { defineRoute } from '../../routing';
import { knowSubmission } from '../../services/submissions/access';
import { addAttachment, detachAttachment, listAttachments, readAttachment, refuseUnlessTakesEvidence } from '../../services/submissions/attachments';
import { contentDisposition } from '../../services/submissions/evidence/fileName';

const mostBytes = 25 * 1024 * 1024;
const receive = multer({
  storage: multer.memoryStorage(),
  defParamCharset: 'utf8',
  limits: { fileSize: mostBytes, files: 1, fields: 4, parts: 6, fieldSize: 10_000, fieldNameSize: 100 },
}).single('file');

/** One file in the field "file". What busboy cannot read is the sender's error, not ours. */
const oneFile: RequestHandler = (request, response, next) => {
  void receive(request, response, (error?: unknown) => {
    if (error == null || error instanceof MulterError) next(error);
    else next(new AppError('malformed-request', 'The upload cannot be read: send one file in the field "file" as multipart/form-data.'));
  });
};

const fileParams = z.object({ id: z.uuid(), attachmentId: z.uuid() });
const uploadFields = z.object({ fieldPath: z.string().max(300).default(''), caption: z.string().trim().max(500).default('') });

export const attachmentRoutes = [
  defineRoute({
    method: 'get',
    path: '/submissions/:id/attachments',
    action: 'read-submission',
    summary: 'The evidence of the revision that stands',
    params: idParams,
    answer: z.object({ items: z.array(attachmentSchema) }),
    load: ({ context, actor, params }) => knowSubmission(context.db, actor, params.id),
    handle: async ({ context, loaded }) => ({ items: await listAttachments(context, loaded) }),
  }),
  defineRoute({
    method: 'post',
    path: '/submissions/:id/attachments',
    action: 'draft',
    summary: 'Attach a PDF, PNG, JPEG, TIFF or CSV file of up to 25 MB; location data are taken out of images first',
    params: idParams,
    body: uploadFields,
    answer: attachmentSchema,
    status: 201,
    load: ({ context, actor, params }) => knowSubmission(context.db, actor, params.id),
    authorize: ({ context, actor, loaded }) => refuseUnlessTakesEvidence(context, actor, loaded),
    before: oneFile,
    handle: async ({ context, actor, params, body, request }) => {
      if (request.file === undefined) throw new AppError('malformed-request', 'The upload holds no file: send one in the field "file".');
      return addAttachment(context, actor, params.id, { name: request.file.originalname, bytes: request.file.buffer, fieldPath: body.fieldPath, caption: body.caption });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/submissions/:id/attachments/:attachmentId',
    action: 'read-submission',
    summary: 'Download a file of evidence, byte for byte as stored',
    params: fileParams,
    load: async ({ context, actor, params }) => readAttachment(context, await knowSubmission(context.db, actor, params.id), params.attachmentId),
    handle: async ({ loaded, response }) => {
      response
        .status(200)
        .setHeader('Content-Type', loaded.mediaType)
        .setHeader('Content-Disposition', contentDisposition(loaded.name))
        .setHeader('X-Content-Type-Options', 'nosniff')
        .setHeader('Content-Security-Policy', "default-src 'none'; sandbox")
        .setHeader('Cache-Control', 'private, no-store, no-transform')
        .end(loaded.content);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/submissions/:id/attachments/:attachmentId',
    action: 'draft',
    summary: 'Take a file from the draft; revisions submitted with it keep it',
    params: fileParams,
    load: ({ context, actor, params }) => knowSubmission(context.db, actor, params.id),
    authorize: ({ context, actor, loaded }) => refuseUnlessTakesEvidence(context, actor, loaded),
    handle: ({ context, actor, params }) => detachAttachment(context, actor, params.id, params.attachmentId),
  }),
];
