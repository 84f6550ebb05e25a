import { z } from 'zod';

/** Every error code a client can meet, with its HTTP status and title. Clients match codes, never text. */
export const problemCodes = {
  'invalid-input': { status: 400, title: 'The input is not valid' },
  'malformed-request': { status: 400, title: 'The request cannot be read' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'wrong-credentials': { status: 401, title: 'Address or password is wrong' },
  'not-allowed': { status: 403, title: 'Your roles do not allow this' },
  'own-lab': { status: 403, title: 'Your own laboratory\'s records are decided by others' },
  'not-found': { status: 404, title: 'There is nothing at this address' },
  'stale-revision': { status: 409, title: 'It has changed since you opened it' },
  'already-decided': { status: 409, title: 'It has already been decided' },
  'wrong-state': { status: 409, title: 'Its state does not allow this' },
  'freeze-under-way': { status: 409, title: 'A version is being frozen' },
  'nothing-to-freeze': { status: 409, title: 'Nothing has changed since the current version' },
  'duplicate': { status: 409, title: 'It exists already' },
  'checks-block': { status: 422, title: 'Some entries cannot be submitted' },
  'sealed': { status: 410, title: 'This file is sealed' },
  'too-large': { status: 413, title: 'It is larger than allowed' },
  'unsupported-type': { status: 415, title: 'This kind of file is not accepted' },
  'precondition-required': { status: 428, title: 'Say which state you are changing (If-Match)' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  'internal': { status: 500, title: 'Something failed on our side' },
  'unavailable': { status: 503, title: 'The register is not ready' },
} as const;
export type ProblemCode = keyof typeof problemCodes;

export const fieldErrorSchema = z.object({ path: z.string(), message: z.string() });
export type FieldError = z.infer<typeof fieldErrorSchema>;

/** RFC 9457 problem details, with our code, every problem of the input at once, and the request's id. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.string(),
  detail: z.string(),
  errors: z.array(fieldErrorSchema),
  requestId: z.string(),
});
export type Problem = z.infer<typeof problemSchema>;
