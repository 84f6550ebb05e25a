import { keepPreviousData, useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { pageOf } from '../../shared/contracts/common';
import { recordPageSchema, registerSchema, speciesItemSchema, speciesPageSchema, structureSchema } from '../../shared/contracts/register';
import { z } from 'zod';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

/** What the first screen shows. */
export function useRegister() {
  return useQuery({ queryKey: keys.register, queryFn: ({ signal }) => api.get('/register', registerSchema, { signal }), staleTime: staleTimes.working });
}

export function useStructures() {
  return useQuery({
    queryKey: keys.structures,
    queryFn: async ({ signal }) => (await api.get('/structures', z.object({ items: z.array(structureSchema) }), { signal })).items,
    staleTime: staleTimes.published,
  });
}

export interface SpeciesListQuery {
  query?: string;
  clade?: string;
  structure?: string;
  version?: string;
  sort?: string;
}

/** Species of a version, page after page. */
export function useSpeciesList(query: SpeciesListQuery) {
  return useInfiniteQuery({
    queryKey: keys.species.list(query),
    queryFn: ({ pageParam, signal }) => api.get(`/species${queryString({ ...query, limit: 200, cursor: pageParam })}`, pageOf(speciesItemSchema), { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
    placeholderData: keepPreviousData,
    staleTime: staleTimes.published,
  });
}

export function useSpeciesPage(slug: string, version: string | null) {
  return useQuery({
    queryKey: keys.species.page(slug, version),
    queryFn: ({ signal }) => api.get(`/species/${encodeURIComponent(slug)}${queryString({ version })}`, speciesPageSchema, { signal }),
    staleTime: staleTimes.published,
  });
}

export function useRecordPage(number: string) {
  return useQuery({
    queryKey: keys.records.page(number),
    queryFn: ({ signal }) => api.get(`/records/${encodeURIComponent(number)}`, recordPageSchema, { signal }),
    staleTime: staleTimes.working,
  });
}

/** Address of a version's records as CSV. */
export const recordsCsvHref = (query: { version?: string; clade?: string; structure?: string; species?: string }) => api.href(`/records${queryString({ ...query, limit: 200 })}`);
