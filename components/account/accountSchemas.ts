import { z } from 'zod';

const email = z.string().trim().min(1, 'Enter your mail address.').pipe(z.email('This is not a mail address.'));
/** The server asks for the same least length. */
const newPassword = z.string().min(10, 'At least 10 characters.').max(200, 'At most 200 characters.');

export const signInSchema = z.object({ email, password: z.string().min(1, 'Enter your password.') });
export const signUpSchema = z.object({ name: z.string().trim().min(1, 'Enter your name as it should stand in citations.').max(120, 'At most 120 characters.'), email, password: newPassword });
export const forgottenSchema = z.object({ email });
export const newPasswordSchema = z
  .object({ password: newPassword, again: z.string() })
  .refine((value) => value.password === value.again, { path: ['again'], message: 'The two are not the same.' });
export const firstAdministratorSchema = z.object({
  name: z.string().trim().min(1, 'Enter your name.').max(120, 'At most 120 characters.'),
  email,
  password: z.string().min(12, 'At least 12 characters.').max(200, 'At most 200 characters.'),
});
