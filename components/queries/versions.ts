import { useMutation, useQuery } from '@tanstack/react-query';
import { verifyAnswerSchema, versionListSchema, versionPageSchema } from '../../shared/contracts/versions';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

export function useVersions() {
  return useQuery({ queryKey: keys.versions.list, queryFn: ({ signal }) => api.get('/versions', versionListSchema, { signal }), staleTime: staleTimes.working });
}

export function useVersionPage(label: string) {
  return useQuery({ queryKey: keys.versions.page(label), queryFn: ({ signal }) => api.get(`/versions/${encodeURIComponent(label)}`, versionPageSchema, { signal }), staleTime: staleTimes.published });
}

/** Asks the server to read the stored files again and compare their checksums. */
export function useVerify(label: string) {
  return useMutation({ mutationFn: () => api.get(`/versions/${encodeURIComponent(label)}/verify`, verifyAnswerSchema) });
}

/** Citation of a version, or of some of its records with their primary sources. */
export function useCitation(label: string, style: 'text' | 'bibtex', records: readonly string[], enabled = true) {
  return useQuery({
    queryKey: keys.versions.citation({ label, style, records }),
    queryFn: ({ signal }) => api.text(`/versions/${encodeURIComponent(label)}/citation${queryString({ style, records })}`, { signal }),
    staleTime: staleTimes.frozen,
    enabled,
  });
}

export const fileHref = (label: string, name: string) => api.href(`/versions/${encodeURIComponent(label)}/files/${encodeURIComponent(name)}`);
export const bundleHref = (label: string) => api.href(`/versions/${encodeURIComponent(label)}/bundle`);
