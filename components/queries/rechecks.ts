import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { pageOf } from '../../shared/contracts/common';
import { recheckSchema } from '../../shared/contracts/rechecks';
import type { RecheckAnswerKind, RecheckStatus } from '../../shared/contracts/vocabulary';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

export function useRechecks(query: { status?: RecheckStatus } = {}) {
  return useQuery({ queryKey: keys.rechecks.list(query), queryFn: ({ signal }) => api.get(`/rechecks${queryString({ ...query, limit: 200 })}`, pageOf(recheckSchema), { signal }), staleTime: staleTimes.working });
}

export function useRecheck(id: string) {
  return useQuery({ queryKey: keys.rechecks.one(id), queryFn: ({ signal }) => api.get(`/rechecks/${encodeURIComponent(id)}`, recheckSchema, { signal }), staleTime: staleTimes.working });
}

function useSettled() {
  const client = useQueryClient();
  return () => Promise.all([keys.rechecks.all, keys.records.all, keys.submissions.all, keys.curate.all, keys.register, keys.me].map((queryKey) => client.invalidateQueries({ queryKey })));
}

/** Asks for a re-check of a record (`AK-…`), from a flag or by hand. */
export function useAskRecheck(record: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { question: string; flagId?: string | null; fieldPath?: string }) => api.send('POST', `/records/${encodeURIComponent(record)}/rechecks`, body, recheckSchema), onSuccess: settle });
}

export function useAnswerRecheck(id: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { answer: RecheckAnswerKind; text: string; attachmentId?: string | null }) => api.send('POST', `/rechecks/${encodeURIComponent(id)}/answers`, body, recheckSchema), onSuccess: settle });
}

export function useCloseRecheck(id: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { outcome: 'close' | 'reopen'; text: string }) => api.send('POST', `/rechecks/${encodeURIComponent(id)}/close`, body, recheckSchema), onSuccess: settle });
}
