import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { pageOf } from '../../shared/contracts/common';
import type { SetAsideScope } from '../../shared/contracts/records';
import { freezePreviewSchema, freezeProgressSchema, setAsideViewSchema, waitsSchema } from '../../shared/contracts/versions';
import { api } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

/** What waits for a curator: approved records in no version, open re-checks, flags of the working set. */
export function useWaits() {
  return useQuery({ queryKey: keys.curate.waits, queryFn: ({ signal }) => api.get('/curate/waits', waitsSchema, { signal }), staleTime: staleTimes.working });
}

export function useSetAsides() {
  return useQuery({ queryKey: keys.curate.setAsides, queryFn: ({ signal }) => api.get('/set-asides?limit=200', pageOf(setAsideViewSchema), { signal }), staleTime: staleTimes.working });
}

function useSettled() {
  const client = useQueryClient();
  return () => Promise.all([keys.curate.all, keys.records.all, keys.scaling.all, keys.register, keys.me].map((queryKey) => client.invalidateQueries({ queryKey })));
}

export function useSetAside(record: string) {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { scope: SetAsideScope; reason: string }) => api.send('POST', `/records/${encodeURIComponent(record)}/set-asides`, body, setAsideViewSchema), onSuccess: settle });
}

export function useLiftSetAside() {
  const settle = useSettled();
  return useMutation({ mutationFn: ({ id, reason }: { id: string; reason: string }) => api.send('POST', `/set-asides/${encodeURIComponent(id)}/lift`, { reason }, setAsideViewSchema), onSuccess: settle });
}

/** What a freeze would bring, change and move. */
export function useFreezePreview() {
  return useQuery({ queryKey: keys.curate.preview, queryFn: ({ signal }) => api.get('/freeze/preview', freezePreviewSchema, { signal }), staleTime: 0 });
}

export function useFreeze() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { label: string; note: string }) => api.send('POST', '/versions', body, freezeProgressSchema),
    onSuccess: (progress) => client.setQueryData(keys.curate.progress, progress),
  });
}

const pollMs = 700;

/** Progress of a freeze; asked again until it is done, then every page asks for the new version. */
export function useFreezeProgress(enabled: boolean) {
  const client = useQueryClient();
  return useQuery({
    queryKey: keys.curate.progress,
    queryFn: async ({ signal }) => {
      const progress = await api.get('/freeze/progress', freezeProgressSchema, { signal });
      if (progress.status === 'frozen') await client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'curate' || query.queryKey[1] !== 'progress' });
      return progress;
    },
    enabled,
    refetchInterval: (query) => (query.state.data?.status === 'frozen' ? false : pollMs),
    staleTime: 0,
  });
}
