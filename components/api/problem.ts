import type { FieldError } from '../../shared/contracts/problems';

/** All ways a request can fail, as seen by the client. */
export type ApiProblem =
  /** No answer: no network, or the server is not there. */
  | { kind: 'network' }
  | { kind: 'timeout'; afterMs: number }
  /** The server said what is wrong (RFC 9457). `code` is one of shared/contracts/problems. */
  | { kind: 'problem'; status: number; code: string; title: string; detail: string; errors: FieldError[]; requestId: string }
  /** An answer came that does not fit the contract. */
  | { kind: 'invalid-answer'; status: number; path: string };

/** Thrown by the client; queries and mutations have it as their error type. */
export class ApiError extends Error {
  readonly problem: ApiProblem;
  constructor(problem: ApiProblem) {
    super(problemInWords(problem).title);
    this.name = 'ApiError';
    this.problem = problem;
  }
}

/** Worth another try: the network or the server may have recovered. */
export function isPassing(error: unknown): boolean {
  if (!(error instanceof ApiError)) return false;
  const { problem } = error;
  return problem.kind === 'network' || problem.kind === 'timeout' || (problem.kind === 'problem' && problem.status >= 500);
}

/** Title and sentence for a failed request; what was typed is kept by the forms. */
export function problemInWords(problem: ApiProblem): { title: string; text: string } {
  switch (problem.kind) {
    case 'network':
      return { title: 'No answer came.', text: 'The network or the register is not reachable; nothing you entered is lost.' };
    case 'timeout':
      return { title: 'No answer came in time.', text: `The register gave no answer in ${Math.round(problem.afterMs / 1000)} s.` };
    case 'problem':
      return { title: `${problem.title}.`, text: problem.status >= 500 ? `${problem.detail} Request ${problem.requestId}.` : problem.detail };
    case 'invalid-answer':
      return { title: 'The answer cannot be read.', text: 'Page and register may be of different versions; load the page again.' };
  }
}

/** Like `problemInWords`, for whatever was thrown. */
export function errorInWords(error: unknown): { title: string; text: string } {
  return problemInWords(error instanceof ApiError ? error.problem : { kind: 'network' });
}
