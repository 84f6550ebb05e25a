import { keepPreviousData, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { pageOf } from '../../shared/contracts/common';
import type { SubmissionContent } from '../../shared/contracts/content';
import { attachmentSchema, previewSchema, submissionDetailSchema, submissionItemSchema, type SubmissionDetail } from '../../shared/contracts/submissions';
import type { RevisionStatus } from '../../shared/contracts/vocabulary';
import { z } from 'zod';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

const path = (id: string, rest = '') => `/submissions/${encodeURIComponent(id)}${rest}`;

export function useSubmissions(query: { status?: RevisionStatus } = {}) {
  return useQuery({
    queryKey: keys.submissions.list(query),
    queryFn: ({ signal }) => api.get(`/submissions${queryString({ ...query, limit: 200 })}`, pageOf(submissionItemSchema), { signal }),
    staleTime: staleTimes.working,
  });
}

export function useSubmission(id: string) {
  return useQuery({ queryKey: keys.submissions.one(id), queryFn: ({ signal }) => api.get(path(id), submissionDetailSchema, { signal }), staleTime: staleTimes.working });
}

/** Derived values, checks and places of a content that is not saved yet, with the content they are of. */
export function usePreview(content: SubmissionContent | null, submissionId: string | null = null) {
  return useQuery({
    queryKey: keys.submissions.preview(content),
    queryFn: async ({ signal }) => ({ content, preview: await api.send('POST', '/submissions/preview', { content, submissionId }, previewSchema, { signal }) }),
    placeholderData: keepPreviousData,
    enabled: content !== null,
    gcTime: 60_000,
  });
}

/** After an act the answered state is the truth: it replaces what is known, and lists are asked anew. */
function useSettled() {
  const client = useQueryClient();
  return async (detail: SubmissionDetail): Promise<void> => {
    client.setQueryData(keys.submissions.one(detail.id), detail);
    await Promise.all([
      client.invalidateQueries({ queryKey: [...keys.submissions.all, 'list'] }),
      client.invalidateQueries({ queryKey: keys.review.all }),
      client.invalidateQueries({ queryKey: keys.rechecks.all }),
      client.invalidateQueries({ queryKey: keys.records.all }),
      client.invalidateQueries({ queryKey: keys.curate.all }),
      client.invalidateQueries({ queryKey: keys.register }),
      client.invalidateQueries({ queryKey: keys.me }),
    ]);
  };
}

export function useCreateSubmission() {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { kind: 'specimen' | 'literature' }) => api.send('POST', '/submissions', body, submissionDetailSchema), onSuccess: settle });
}

/** Saves a draft; a stale `etag` fails with the code `stale-revision` and leaves the server's state untouched. */
export function useSaveDraft(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ content, etag }: { content: SubmissionContent; etag: string }) => api.send('PATCH', path(id), { content }, submissionDetailSchema, { headers: { 'If-Match': etag } }),
    onSuccess: (detail) => client.setQueryData(keys.submissions.one(id), detail),
  });
}

/** Asks for the newest state of a submission, past what is known of it. */
export function useReloadSubmission(id: string) {
  const client = useQueryClient();
  return () => client.fetchQuery({ queryKey: keys.submissions.one(id), queryFn: () => api.get(path(id), submissionDetailSchema), staleTime: 0 });
}

export function useSubmit(id: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: () => api.send('POST', path(id, '/submit'), {}, submissionDetailSchema), onSuccess: settle });
}

export function useWithdraw(id: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (reason: string) => api.send('POST', path(id, '/withdraw'), { reason }, submissionDetailSchema), onSuccess: settle });
}

/** Opens the next revision as a draft that begins with the newest one's content. */
export function useRevise(id: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { recheckId?: string }) => api.send('POST', path(id, '/revisions'), body, submissionDetailSchema), onSuccess: settle });
}

export function useComment(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { revision: number; fieldPath: string; text: string }) => api.send('POST', path(id, '/comments'), body, submissionDetailSchema),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: keys.submissions.one(id) }), client.invalidateQueries({ queryKey: keys.review.one(id) })]),
  });
}

export function useAttach(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, fieldPath, caption }: { file: File; fieldPath: string; caption: string }) => {
      const form = new FormData();
      form.set('fieldPath', fieldPath);
      form.set('caption', caption);
      form.set('file', file);
      return api.send('POST', path(id, '/attachments'), form, attachmentSchema, { timeoutMs: 300_000 });
    },
    onSuccess: () => client.invalidateQueries({ queryKey: keys.submissions.one(id) }),
  });
}

export function useDetach(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (attachmentId: string) => api.send('DELETE', path(id, `/attachments/${encodeURIComponent(attachmentId)}`), undefined, z.unknown()),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.submissions.one(id) }),
  });
}

export const attachmentHref = (id: string, attachmentId: string) => api.href(path(id, `/attachments/${encodeURIComponent(attachmentId)}`));
