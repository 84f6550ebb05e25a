import { pipeline } from 'node:stream/promises';
import { z } from 'zod';
import { pageQuery } from '../../shared/contracts/common';
import { citationQuerySchema, freezeProgressSchema, freezeRequestSchema, verifyAnswerSchema, versionListSchema, versionPageSchema } from '../../shared/contracts/versions';
import type { Context } from '../context';
import { entityTag, markFrozen } from '../frozenAnswer';
import { decodeCursor, encodeCursor } from '../paging';
import { isPermitted } from '../permissions';
import { defineRoute } from '../routing';
import { agreeToFreeze } from '../services/versions/agreement';
import { citeVersion } from '../services/versions/cite';
import { startFreeze } from '../services/versions/freeze';
import { listVersions, loadFreezeProgress, loadFrozen, loadPreparing, loadVersionPage } from '../services/versions/readVersions';
import { bundleVersion, loadVersionFile, verifyVersion } from '../services/versions/storedFiles';

const labelParams = z.object({ label: z.string().max(20) });
const fileParams = labelParams.extend({ name: z.string().max(120) });
const placeSchema = z.object({ number: z.number().int() });
const loadLabel = ({ context, params }: { context: Context; params: { label: string } }) => loadFrozen(context, params.label);

const splitRecords = (text: string): string[] => text.split(',').map((part) => part.trim()).filter((part) => part !== '');
const withCharset = (mediaType: string): string => (mediaType.startsWith('text/') || mediaType.endsWith('bibtex') ? `${mediaType}; charset=utf-8` : mediaType);

export const versionRoutes = [
  defineRoute({
    method: 'get',
    path: '/versions',
    action: 'read-published',
    summary: 'Frozen versions, newest first',
    query: z.object(pageQuery),
    answer: versionListSchema,
    handle: async ({ context, query, visitor }) => {
      const below = query.cursor === undefined ? null : decodeCursor(query.cursor, placeSchema).number;
      const found = await listVersions(context, below, query.limit + 1);
      const items = found.slice(0, query.limit);
      const last = items.at(-1);
      // Who freezes what is for those who may freeze; the public sees versions, never their making.
      const preparing = isPermitted('agree-to-freeze', visitor?.roles ?? null) ? await loadPreparing(context) : null;
      return { items, nextCursor: found.length > items.length && last !== undefined ? encodeCursor({ number: Number(last.label) }) : null, preparing };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/versions',
    action: 'curate',
    summary: 'Begins to freeze the next version; its number is typed as confirmation',
    body: freezeRequestSchema,
    answer: freezeProgressSchema,
    status: 202,
    handle: async ({ context, actor, body }) => {
      await startFreeze(context, actor, body);
      return loadFreezeProgress(context);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/versions/preparing/agree',
    action: 'agree-to-freeze',
    summary: 'A second person’s agreement to the version being prepared, where the setting asks for two',
    answer: freezeProgressSchema,
    status: 202,
    handle: async ({ context, actor }) => {
      await agreeToFreeze(context, actor);
      return loadFreezeProgress(context);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/versions/:label',
    action: 'read-published',
    summary: 'A version with its files, standing fits, changes and citation',
    params: labelParams,
    answer: versionPageSchema,
    load: loadLabel,
    handle: async ({ context, loaded, response }) => {
      const page = await loadVersionPage(context, loaded);
      // The page also says which versions stand beside it, so it is asked for again; rows and files never change.
      markFrozen(response, entityTag(page), { explicit: false });
      return page;
    },
  }),
  defineRoute({
    method: 'get',
    path: '/versions/:label/files/:name',
    action: 'read-published',
    summary: 'One file of a version, byte for byte as frozen',
    params: fileParams,
    load: async ({ context, params }) => {
      const version = await loadFrozen(context, params.label);
      return loadVersionFile(context, version, params.name);
    },
    handle: async ({ loaded: { file, content }, params, response }) => {
      markFrozen(response, `"${file.sha256}"`, { explicit: true });
      response.setHeader('Content-Type', withCharset(file.mediaType));
      if (file.mediaType === 'text/csv') response.setHeader('Content-Disposition', `attachment; filename="allokarya-version-${params.label}-${file.name}"`);
      response.send(content);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/versions/:label/verify',
    action: 'read-published',
    summary: 'Reads the stored files again and compares size and SHA-256',
    params: labelParams,
    answer: verifyAnswerSchema,
    load: loadLabel,
    handle: ({ context, loaded }) => verifyVersion(context, loaded),
  }),
  defineRoute({
    method: 'get',
    path: '/versions/:label/bundle',
    action: 'read-published',
    summary: 'All files of a version as a zip, the same bytes on each download',
    params: labelParams,
    load: loadLabel,
    handle: async ({ context, loaded, request, response, params }) => {
      markFrozen(response, `"bundle-${loaded.sha256}"`, { explicit: true });
      response.setHeader('Content-Type', 'application/zip');
      response.setHeader('Content-Disposition', `attachment; filename="allokarya-version-${params.label}.zip"`);
      if (request.fresh) {
        response.status(304).end();
        return;
      }
      // Once bytes are on their way a failure can only cut the answer off, so the reader sees a broken zip and not a wrong one.
      await pipeline(await bundleVersion(context, loaded), response);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/versions/:label/citation',
    action: 'read-published',
    summary: 'Citation of a version, or of some of its records with their primary sources',
    params: labelParams,
    query: citationQuerySchema,
    load: loadLabel,
    handle: async ({ context, loaded, query, response }) => {
      const text = await citeVersion(context, loaded, query.style, query.records === undefined ? null : splitRecords(query.records));
      markFrozen(response, entityTag(text), { explicit: false });
      response.setHeader('Content-Type', query.style === 'bibtex' ? 'application/x-bibtex; charset=utf-8' : 'text/plain; charset=utf-8');
      response.send(text);
    },
  }),
];
