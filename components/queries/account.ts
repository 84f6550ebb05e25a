import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { meSchema, type Me } from '../../shared/contracts/account';
import type { Role } from '../../shared/contracts/vocabulary';
import { api } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

export interface Account {
  status: 'loading' | 'out' | 'in';
  id: string | null;
  name: string | null;
  orcid: string | null;
  roles: readonly Role[];
  labName: string | null;
  /** The register runs with invented data. */
  demo: boolean;
  currentVersion: string | null;
  waiting: { submissions?: number; review?: number; curate?: number };
  /** Notices not read yet. */
  notices: number;
}

const nobody: Account = { status: 'loading', id: null, name: null, orcid: null, roles: [], labName: null, demo: false, currentVersion: null, waiting: {}, notices: 0 };

/** The account of an answer of GET /me. */
export function accountFrom(me: Me | undefined, failed: boolean): Account {
  if (!me) return { ...nobody, status: failed ? 'out' : 'loading' };
  const { register, person, waiting } = me;
  const known = { demo: register.demo, currentVersion: register.currentVersion };
  if (!person) return { ...nobody, ...known, status: 'out' };
  return {
    ...known,
    status: 'in',
    id: person.id,
    name: person.name,
    orcid: person.orcid,
    roles: person.roles,
    labName: person.lab?.name ?? null,
    waiting: { submissions: waiting.submissions, review: waiting.review, curate: waiting.curate },
    notices: waiting.notices,
  };
}

/** Who is signed in, with roles, laboratory and what waits; and whether the register is a demonstration. */
export function useAccount(): Account {
  const { data, isError } = useQuery({
    queryKey: keys.me,
    queryFn: ({ signal }) => api.get('/me', meSchema, { signal }),
    staleTime: staleTimes.account,
    refetchOnWindowFocus: true,
  });
  return accountFrom(data, isError);
}

/** Ends the session; everything known of it is dropped. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => api.auth('/sign-out', {}),
    onSuccess: () => client.resetQueries(),
  });
}

/** Saves the own name and ORCID iD. */
export function useSaveProfile() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { name: string; orcid: string | null }) => api.send('PATCH', '/me', body, meSchema),
    onSuccess: (me) => client.setQueryData(keys.me, me),
  });
}
