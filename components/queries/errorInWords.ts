import type { FieldError } from '../../shared/contracts/problems';
import { ApiError } from '../api/problem';

/** Title and sentence for whatever a query or mutation threw; screens take it from here and never speak to the client. */
export { errorInWords, isPassing, problemInWords } from '../api/problem';
export type { ApiProblem } from '../api/problem';
export type { ApiError };

/** The code the server gave (shared/contracts/problems), or null where no such answer came. */
export function problemCode(error: unknown): string | null {
  return error instanceof ApiError && error.problem.kind === 'problem' ? error.problem.code : null;
}

/** What the server found at each field, by path. */
export function fieldErrorsOf(error: unknown): readonly FieldError[] {
  return error instanceof ApiError && error.problem.kind === 'problem' ? error.problem.errors : [];
}
