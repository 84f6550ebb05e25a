import { useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import type { firstAccountSchema } from '../../shared/contracts/people';
import { api } from '../api/client';
import { keys } from './keys';

/** What sign-in and its kin answer, in words; `ok` where it worked. */
export type AuthOutcome = { ok: true } | { ok: false; status: number; message: string };

const sentences: Record<string, string> = {
  INVALID_EMAIL_OR_PASSWORD: 'Address or password is wrong.',
  EMAIL_NOT_VERIFIED: 'This address is not confirmed yet. A new mail with the link is on its way.',
  INVALID_TOKEN: 'This link is used or out of date. Ask for a new one.',
  TOKEN_EXPIRED: 'This link is out of date. Ask for a new one.',
  PASSWORD_TOO_SHORT: 'The password needs at least 10 characters.',
  PASSWORD_TOO_LONG: 'The password may have 200 characters.',
  INVALID_EMAIL: 'This is not a mail address.',
};

function outcomeOf({ status, body }: { status: number; body: unknown }): AuthOutcome {
  if (status < 400) return { ok: true };
  const parsed = z.object({ code: z.string().optional(), detail: z.string().optional() }).safeParse(body);
  const code = parsed.success ? (parsed.data.code ?? '') : '';
  if (status === 429) return { ok: false, status, message: 'Too many attempts. Wait a minute, then try again.' };
  return { ok: false, status, message: sentences[code] ?? (parsed.success ? parsed.data.detail : undefined) ?? 'It did not work. Try again.' };
}

function useAuthCall<Input>(path: string, bodyOf: (input: Input) => unknown, refresh: boolean) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (input: Input): Promise<AuthOutcome> => outcomeOf(await api.auth(path, bodyOf(input))),
    onSuccess: async (outcome) => {
      if (refresh && outcome.ok) await client.resetQueries();
    },
  });
}

export const useSignIn = () => useAuthCall<{ email: string; password: string }>('/sign-in/email', (input) => ({ ...input, callbackURL: '/verified' }), true);
export const useSignUp = () => useAuthCall<{ name: string; email: string; password: string }>('/sign-up/email', (input) => ({ ...input, callbackURL: '/verified' }), false);
export const useRequestPasswordReset = () => useAuthCall<{ email: string }>('/request-password-reset', (input) => ({ ...input, redirectTo: '/reset-password' }), false);
export const useResetPassword = () => useAuthCall<{ token: string; newPassword: string }>('/reset-password', (input) => input, false);

/** Makes the first administrator from the printed one-time link. */
export function useFirstAccount() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: z.input<typeof firstAccountSchema>) => api.send('POST', '/first-account', input, z.unknown()),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.me }),
  });
}
