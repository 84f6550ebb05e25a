import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { noticeSchema } from '../../shared/contracts/account';
import { pageOf } from '../../shared/contracts/common';
import { auditEntrySchema, labSchema, outboxMailSchema, personSchema } from '../../shared/contracts/people';
import type { Role } from '../../shared/contracts/vocabulary';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

export function usePeople(query: string) {
  return useQuery({ queryKey: keys.people.list({ query }), queryFn: ({ signal }) => api.get(`/people${queryString({ query, limit: 200 })}`, pageOf(personSchema), { signal }), staleTime: staleTimes.working });
}

export function useLabs() {
  return useQuery({ queryKey: keys.people.labs, queryFn: async ({ signal }) => (await api.get('/labs', z.object({ items: z.array(labSchema) }), { signal })).items, staleTime: staleTimes.working });
}

function useSettled() {
  const client = useQueryClient();
  return () => Promise.all([keys.people.all, keys.me].map((queryKey) => client.invalidateQueries({ queryKey })));
}

export function useSetRoles() {
  const settle = useSettled();
  return useMutation({ mutationFn: ({ id, roles }: { id: string; roles: Role[] }) => api.send('PUT', `/people/${encodeURIComponent(id)}/roles`, { roles }, personSchema), onSuccess: settle });
}

export function useAddMembership() {
  const settle = useSettled();
  return useMutation({ mutationFn: ({ id, labId, fromDay }: { id: string; labId: string; fromDay: string }) => api.send('POST', `/people/${encodeURIComponent(id)}/memberships`, { labId, fromDay }, personSchema), onSuccess: settle });
}

export function useEndMembership() {
  const settle = useSettled();
  return useMutation({ mutationFn: ({ id, untilDay }: { id: string; untilDay: string }) => api.send('PATCH', `/memberships/${encodeURIComponent(id)}`, { untilDay }, personSchema), onSuccess: settle });
}

export function useDisablePerson() {
  const settle = useSettled();
  return useMutation({ mutationFn: ({ id, disabled }: { id: string; disabled: boolean }) => api.send('PATCH', `/people/${encodeURIComponent(id)}`, { disabled }, personSchema), onSuccess: settle });
}

export function useCreateLab() {
  const settle = useSettled();
  return useMutation({ mutationFn: (body: { name: string; place: string }) => api.send('POST', '/labs', body, labSchema), onSuccess: settle });
}

export function useAudit() {
  return useQuery({ queryKey: keys.people.audit({}), queryFn: ({ signal }) => api.get('/audit?limit=200', pageOf(auditEntrySchema), { signal }), staleTime: staleTimes.working });
}

export function useOutbox() {
  return useQuery({ queryKey: keys.people.outbox, queryFn: async ({ signal }) => (await api.get('/outbox', z.object({ items: z.array(outboxMailSchema) }), { signal })).items, staleTime: 0 });
}

export function useNotices(enabled: boolean) {
  return useQuery({ queryKey: keys.notices, queryFn: ({ signal }) => api.get('/notices?limit=100', pageOf(noticeSchema), { signal }), staleTime: staleTimes.working, enabled });
}

export function useMarkNoticesRead() {
  const client = useQueryClient();
  return useMutation({ mutationFn: () => api.send('POST', '/notices/read', {}, z.unknown()), onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: keys.notices }), client.invalidateQueries({ queryKey: keys.me })]) });
}
