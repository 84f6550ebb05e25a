import { keepPreviousData, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { pageOf } from '../../shared/contracts/common';
import { taxonSchema } from '../../shared/contracts/register';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

/** Taxa whose name, synonym or common name holds the text. */
export function useTaxa(query: { query?: string; rank?: string; status?: string }, enabled = true) {
  return useQuery({
    queryKey: keys.taxa.search(query),
    queryFn: ({ signal }) => api.get(`/taxa${queryString({ ...query, limit: 50 })}`, pageOf(taxonSchema), { signal }),
    placeholderData: keepPreviousData,
    staleTime: staleTimes.working,
    enabled,
  });
}

export function useTaxon(id: string) {
  return useQuery({ queryKey: keys.taxa.one(id), queryFn: ({ signal }) => api.get(`/taxa/${encodeURIComponent(id)}`, taxonSchema, { signal }), staleTime: staleTimes.working, enabled: id !== '' });
}

export function useProposeTaxon() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { name: string; rank: string; parent: string; authority: string; demonstration?: boolean }) => api.send('POST', '/taxa', body, taxonSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.taxa.all }),
  });
}

export function useDecideTaxon() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, ...body }: { id: string; decision: 'accept' | 'refuse'; reason: string }) => api.send('POST', `/taxa/${encodeURIComponent(id)}/decisions`, body, taxonSchema),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: keys.taxa.all }), client.invalidateQueries({ queryKey: keys.curate.all })]),
  });
}
