import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { pageOf } from '../../shared/contracts/common';
import { type decisionCreateSchema, reviewViewSchema, submissionDetailSchema, submissionItemSchema } from '../../shared/contracts/submissions';
import { api } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

/** What waits for a decision: answered first, then oldest. */
export function useReviewQueue() {
  return useQuery({ queryKey: keys.review.queue, queryFn: ({ signal }) => api.get('/review/queue?limit=200', pageOf(submissionItemSchema), { signal }), staleTime: staleTimes.working });
}

export function useReview(id: string) {
  return useQuery({ queryKey: keys.review.one(id), queryFn: ({ signal }) => api.get(`/review/submissions/${encodeURIComponent(id)}`, reviewViewSchema, { signal }), staleTime: staleTimes.working });
}

export type DecisionInput = z.input<typeof decisionCreateSchema>;

export function useDecide(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (decision: DecisionInput) => api.send('POST', `/submissions/${encodeURIComponent(id)}/decisions`, decision, submissionDetailSchema),
    onSettled: () => Promise.all([keys.review.all, keys.submissions.all, keys.curate.all, keys.records.all, keys.register, keys.me].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}
